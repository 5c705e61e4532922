import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import type { Member } from '@bookmatch/common/shops/members-contract';
import { Store } from '@ngrx/store';
import { FormErrors } from '../../ui/form-errors/form-errors';
import { MembersPage } from '../state/members.actions';
import { membersFeature } from '../state/members.state';
import { RoleChoice } from './role-choice';

/** Gives a member another role. */
@Component({
  selector: 'bm-role-dialog',
  imports: [
    FormErrors,
    MatButton,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    ReactiveFormsModule,
    RoleChoice,
  ],
  template: `
    <h2 mat-dialog-title>The role of {{ member.name }}</h2>
    <form [formGroup]="form" (ngSubmit)="submit()">
      <mat-dialog-content>
        <bm-form-errors [form]="form" [problem]="save().problem" />
        <bm-role-choice [control]="form.controls.role" />
        <p class="bm-quiet">It holds from the next thing {{ member.name }} does.</p>
      </mat-dialog-content>
      <mat-dialog-actions>
        <button matButton type="button" mat-dialog-close>Cancel</button>
        <button matButton="filled" type="submit" [disabled]="save().status === 'saving'">
          Change the role
        </button>
      </mat-dialog-actions>
    </form>
  `,
  styles: 'p { margin-top: 16px; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RoleDialog {
  private readonly store = inject(Store);
  private readonly dialog = inject<MatDialogRef<RoleDialog>>(MatDialogRef);
  protected readonly member = inject<Member>(MAT_DIALOG_DATA);
  protected readonly save = this.store.selectSignal(membersFeature.selectDialog);
  protected readonly form = inject(NonNullableFormBuilder).group({ role: this.member.role });

  constructor() {
    this.store.dispatch(MembersPage.dialogOpened());
    effect(() => {
      if (this.save().status === 'saved') this.dialog.close();
    });
  }

  protected submit(): void {
    const { role } = this.form.getRawValue();
    if (role === this.member.role) this.dialog.close();
    else this.store.dispatch(MembersPage.roleChosen({ member: this.member, role }));
  }
}
