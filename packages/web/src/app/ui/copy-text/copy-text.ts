import { Clipboard } from '@angular/cdk/clipboard';
import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { Notices } from '../../platform/page/notices';

/** A button that copies a text and says so. */
@Component({
  selector: 'bm-copy-text',
  imports: [MatIconButton, MatIcon],
  template: `
    <button matIconButton type="button" [attr.aria-label]="'Copy ' + what()" (click)="copy()">
      <mat-icon svgIcon="copy" />
    </button>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CopyText {
  readonly text = input.required<string>();
  /** What is copied, in words: "the link". */
  readonly what = input.required<string>();
  private readonly clipboard = inject(Clipboard);
  private readonly notices = inject(Notices);

  protected copy(): void {
    this.notices.say(this.clipboard.copy(this.text()) ? 'Copied.' : 'This browser does not allow copying.');
  }
}
