import { ChangeDetectionStrategy, Component, effect, inject, input, untracked } from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { Link } from '@bookmatch/common/customer-page/links-contract';
import type { Estimate } from '@bookmatch/common/estimates/estimates-contract';
import { Store } from '@ngrx/store';
import { injectCan } from '../../platform/session/ability';
import { Confirm } from '../../ui/confirm/confirm';
import { CopyText } from '../../ui/copy-text/copy-text';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { Panel } from '../../ui/panel/panel';
import { EstimatesPage } from '../state/estimates.actions';
import { selectLinks, selectNewLinkUrl } from '../state/estimates.selectors';

/** Where the estimate went, and the links by which its customer reads it. */
@Component({
  selector: 'bm-links-panel',
  imports: [CopyText, DateTextPipe, MatButton, Panel],
  templateUrl: './links-panel.html',
  styleUrl: './links-panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LinksPanel {
  readonly estimate = input.required<Estimate>();
  private readonly store = inject(Store);
  private readonly confirm = inject(Confirm);
  protected readonly can = injectCan();
  protected readonly links = this.store.selectSignal(selectLinks);
  protected readonly newUrl = this.store.selectSignal(selectNewLinkUrl);

  constructor() {
    effect(() => {
      const estimateId = this.estimate().id;
      untracked(() => this.store.dispatch(EstimatesPage.linksOpened({ estimateId })));
    });
  }

  protected make(): void {
    this.store.dispatch(EstimatesPage.linkAsked({ estimateId: this.estimate().id }));
  }

  protected end({ id }: Link): void {
    const question = {
      title: 'End this link?',
      text: 'Whoever opens it is told that it no longer works. Other links to the estimate stay.',
      action: 'End link',
      tone: 'harm',
    } as const;
    this.confirm.ask(question).subscribe((answer) => {
      if (answer) this.store.dispatch(EstimatesPage.linkRevoked({ id }));
    });
  }
}
