import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import {
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import type { Role } from '@bookmatch/common/access/roles';
import { inviteSchema } from '@bookmatch/common/shops/members-contract';
import { Store } from '@ngrx/store';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { MembersPage } from '../state/members.actions';
import { membersFeature } from '../state/members.state';
import { RoleChoice } from './role-choice';

/** Holds a place in the shop for somebody at an address. */
@Component({
  selector: 'bm-invite-dialog',
  imports: [
    ErrorOf,
    FormErrors,
    MatButton,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    ReactiveFormsModule,
    RoleChoice,
  ],
  template: `
    <h2 mat-dialog-title>Invite somebody</h2>
    <form #element novalidate [formGroup]="form" (ngSubmit)="submit(element)">
      <mat-dialog-content>
        <bm-form-errors [form]="form" [problem]="save().problem" />
        <div class="bm-entry">
          <mat-form-field>
            <mat-label>E-mail</mat-label>
            <input matInput type="email" autocomplete="off" formControlName="email" required />
            <mat-error [bmErrorOf]="form.controls.email" />
          </mat-form-field>
          <bm-role-choice [control]="form.controls.role" />
        </div>
      </mat-dialog-content>
      <mat-dialog-actions>
        <button matButton type="button" mat-dialog-close>Cancel</button>
        <button matButton="filled" type="submit" [disabled]="save().status === 'saving'">
          Send the invitation
        </button>
      </mat-dialog-actions>
    </form>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InviteDialog {
  private readonly store = inject(Store);
  private readonly dialog = inject<MatDialogRef<InviteDialog>>(MatDialogRef);
  protected readonly save = this.store.selectSignal(membersFeature.selectDialog);
  private readonly builder = inject(NonNullableFormBuilder);
  protected readonly form = this.builder.group({ email: '', role: this.builder.control<Role>('crew') });

  constructor() {
    this.store.dispatch(MembersPage.dialogOpened());
    effect(() => {
      if (this.save().status === 'saved') this.dialog.close();
    });
  }

  protected submit(element: HTMLFormElement): void {
    const invite = checkForm(this.form, inviteSchema);
    if (invite) this.store.dispatch(MembersPage.inviteSubmitted({ invite }));
    else focusFirstInvalid(element);
  }
}
