import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  ElementRef,
  inject,
  Injector,
  input,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import type { CustomerEstimate, ShopIdentity } from '@bookmatch/common/customer-page/customer-page-contract';
import { Store } from '@ngrx/store';
import { addressLines } from '../../customers/customers-public';
import { Confirm } from '../../ui/confirm/confirm';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { Panel } from '../../ui/panel/panel';
import { AcceptForm } from '../accept-form/accept-form';
import { CustomerPageApiClient } from '../customer-page-api';
import { OfferView } from '../offer-view/offer-view';
import { QuestionBox } from '../question-box/question-box';
import { CustomerScreen } from '../state/customer-page.actions';
import { customerPageFeature } from '../state/customer-page.state';

/** The estimate behind a link: read it, ask about it, say yes or no. */
@Component({
  selector: 'bm-customer-estimate',
  imports: [AcceptForm, DateTextPipe, MatButton, MatIcon, MoneyPipe, OfferView, Panel, QuestionBox],
  templateUrl: './customer-estimate.html',
  styleUrl: './customer-estimate.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CustomerEstimatePart {
  readonly shop = input.required<ShopIdentity>();
  readonly estimate = input.required<CustomerEstimate>();
  readonly token = input.required<string>();

  private readonly store = inject(Store);
  private readonly confirm = inject(Confirm);
  private readonly api = inject(CustomerPageApiClient);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  protected readonly document = computed(() => this.estimate().document);
  protected readonly pdfUrl = computed(() => this.api.estimatePdfUrl(this.token()));
  protected readonly place = computed(() => {
    const { site } = this.document();
    return site ? [site.name, ...addressLines(site.address)].join(', ') : '';
  });
  /** What is asked for at once when the customer says yes. */
  protected readonly first = computed(() =>
    this.document().billingSchedule.filter(({ due }) => due === 'on-acceptance'),
  );

  constructor() {
    const answer = this.store.selectSignal(customerPageFeature.selectAnswer);
    const injector = inject(Injector);
    effect(() => {
      if (answer().status === 'saved') afterNextRender(() => this.toNote(), { injector });
    });
  }

  /** From the top of a long page straight to the form. */
  protected toForm(): void {
    const form = this.host.querySelector('bm-accept-form');
    form?.scrollIntoView({ block: 'center' });
    form?.querySelector<HTMLInputElement>('input')?.focus({ preventScroll: true });
  }

  /** The thanks stand at the top of the page, the form was at its foot. */
  private toNote(): void {
    const note = this.host.querySelector<HTMLElement>('.note');
    note?.scrollIntoView?.({ block: 'center' });
    note?.focus({ preventScroll: true });
  }

  protected reload(): void {
    this.store.dispatch(CustomerScreen.opened({ token: this.token() }));
  }

  protected decline(): void {
    const question = {
      title: 'Decline this estimate?',
      text: `${this.shop().name} is told. It may write you another one.`,
      action: 'Decline',
      reason: { label: 'Why, if you like to say', required: false },
    };
    const { revisionId } = this.document();
    this.confirm.ask(question).subscribe((answer) => {
      if (answer)
        this.store.dispatch(
          CustomerScreen.declined({ token: this.token(), refusal: { revisionId, reason: answer.reason } }),
        );
    });
  }
}
