import { ChangeDetectionStrategy, Component, inject, input, type OnInit } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatProgressBar } from '@angular/material/progress-bar';
import { RouterLink } from '@angular/router';
import { PageLoad } from '../../platform/session/page-load';
import { Submission } from '../../platform/forms/submission';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { AccountsApiClient } from '../accounts-api';
import { EntryFrame } from '../entry-frame/entry-frame';

/** Where the letter's link leads: confirms the address, signs in, and opens the shop. */
@Component({
  selector: 'bm-confirm-email',
  imports: [EntryFrame, MatButton, MatProgressBar, ProblemNote, RouterLink],
  template: `
    <bm-entry-frame heading="Confirm your e-mail address">
      @if (submission.problem(); as problem) {
        <bm-problem-note [problem]="problem" />
        <a matButton="outlined" class="on" routerLink="/sign-in">Go to sign in</a>
      } @else {
        <mat-progress-bar mode="indeterminate" aria-label="Confirming" />
      }
    </bm-entry-frame>
  `,
  styles: '.on { margin-top: 16px; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConfirmEmail implements OnInit {
  /** From the address. */
  readonly token = input('');

  private readonly accounts = inject(AccountsApiClient);
  private readonly page = inject(PageLoad);
  protected readonly submission = new Submission();

  ngOnInit(): void {
    this.submission.run(this.accounts.confirmEmail({ token: this.token() }), () => this.page.go('/'));
  }
}
