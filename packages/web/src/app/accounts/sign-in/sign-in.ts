import { DOCUMENT, ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { localPath } from '../../platform/session/address';
import { PageLoad } from '../../platform/session/page-load';
import { EntryFrame } from '../entry-frame/entry-frame';
import { SignInForm } from '../sign-in-form/sign-in-form';

@Component({
  selector: 'bm-sign-in',
  imports: [EntryFrame, RouterLink, SignInForm],
  template: `
    <bm-entry-frame heading="Sign in">
      @if (reset() !== undefined) {
        <p class="told" role="status">Your new password is set. Sign in with it.</p>
      }
      <bm-sign-in-form (done)="goOn()" />
      <ng-container bmEntryFoot>
        <a routerLink="/forgot-password">Forgot your password?</a>
        <span>New here? <a routerLink="/sign-up">Open a shop</a></span>
      </ng-container>
    </bm-entry-frame>
  `,
  styles: '.told { margin-bottom: 16px; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignIn {
  /** From the address: where the person wanted to go. */
  readonly return = input<string>();
  /** From the address: the person comes from choosing a new password. */
  readonly reset = input<string>();

  private readonly page = inject(PageLoad);
  private readonly origin = inject(DOCUMENT).location.origin;

  protected goOn(): void {
    this.page.go(localPath(this.return(), '/', this.origin));
  }
}
