import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { updatePersonSchema } from '@bookmatch/common/accounts/accounts-contract';
import { Store } from '@ngrx/store';
import { Notices } from '../../platform/page/notices';
import { SessionPage } from '../../platform/session/session.actions';
import { sessionFeature } from '../../platform/session/session.state';
import { Submission } from '../../platform/forms/submission';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { Panel } from '../../ui/panel/panel';
import { AccountsApiClient } from '../accounts-api';

@Component({
  selector: 'bm-name-form',
  imports: [
    ErrorOf,
    FormErrors,
    MatButton,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    Panel,
    ReactiveFormsModule,
  ],
  template: `
    <bm-panel heading="You">
      <form #element class="bm-entry" novalidate [formGroup]="form" (ngSubmit)="submit(element)">
        <bm-form-errors [form]="form" [problem]="submission.problem()" />
        <mat-form-field>
          <mat-label>Name</mat-label>
          <input matInput autocomplete="name" formControlName="name" />
          <mat-error [bmErrorOf]="form.controls.name" />
        </mat-form-field>
        <p class="bm-quiet">You sign in as {{ person()?.email }}.</p>
        <div class="bm-form-actions">
          <button matButton="outlined" type="submit" [disabled]="submission.busy()">Save name</button>
        </div>
      </form>
    </bm-panel>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NameForm {
  private readonly accounts = inject(AccountsApiClient);
  private readonly notices = inject(Notices);
  private readonly store = inject(Store);
  protected readonly person = this.store.selectSignal(sessionFeature.selectPerson);
  protected readonly form = inject(NonNullableFormBuilder).group({ name: '' });
  protected readonly submission = new Submission();

  constructor() {
    effect(() => {
      const name = this.person()?.name;
      if (name !== undefined && !this.form.dirty) this.form.setValue({ name });
    });
  }

  protected submit(element: HTMLFormElement): void {
    const fields = checkForm(this.form, updatePersonSchema);
    if (!fields) {
      focusFirstInvalid(element);
      return;
    }
    this.submission.run(this.accounts.rename(fields.name), ({ name }) => {
      this.form.markAsPristine();
      this.store.dispatch(SessionPage.nameChanged({ name }));
      this.notices.say('Name saved.');
    });
  }
}
