import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialogActions, MatDialogContent, MatDialogRef, MatDialogTitle } from '@angular/material/dialog';
import { Store } from '@ngrx/store';
import { PageLoad } from '../../platform/session/page-load';
import { sessionFeature } from '../../platform/session/session.state';
import { SignInForm } from '../sign-in-form/sign-in-form';

/** Opens over the screen when the session ended, so that nothing typed there is lost. */
@Component({
  selector: 'bm-sign-in-again',
  imports: [MatButton, MatDialogActions, MatDialogContent, MatDialogTitle, SignInForm],
  template: `
    <h2 mat-dialog-title>Sign in again</h2>
    <mat-dialog-content>
      <p class="why">
        Your session has ended. What you typed is still here and goes on once you are signed in.
      </p>
      <bm-sign-in-form [email]="person()?.email ?? ''" (done)="dialog.close(true)" />
    </mat-dialog-content>
    <mat-dialog-actions>
      <button matButton type="button" (click)="page.go('/sign-in')">Leave this page instead</button>
    </mat-dialog-actions>
  `,
  styles: '.why { margin-bottom: 16px; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignInAgain {
  protected readonly dialog = inject<MatDialogRef<SignInAgain, boolean>>(MatDialogRef);
  protected readonly page = inject(PageLoad);
  protected readonly person = inject(Store).selectSignal(sessionFeature.selectPerson);
}
