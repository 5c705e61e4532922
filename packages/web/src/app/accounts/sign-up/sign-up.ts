import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatRadioButton, MatRadioGroup } from '@angular/material/radio';
import { RouterLink } from '@angular/router';
import { MIN_PASSWORD_LENGTH, signUpSchema } from '@bookmatch/common/accounts/accounts-contract';
import type { UnitSystem } from '@bookmatch/common/measure/unit-system';
import { Notices } from '../../platform/page/notices';
import { Submission } from '../../platform/forms/submission';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { AccountsApiClient } from '../accounts-api';
import { EntryFrame } from '../entry-frame/entry-frame';
import { likelyZone, HOME_ZONES, otherZones } from './time-zones';

/** Opens a shop: its owner, its time zone and how it measures. */
@Component({
  selector: 'bm-sign-up',
  imports: [
    EntryFrame,
    ErrorOf,
    FormErrors,
    MatButton,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    MatRadioButton,
    MatRadioGroup,
    ReactiveFormsModule,
    RouterLink,
  ],
  templateUrl: './sign-up.html',
  styleUrl: './sign-up.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignUp {
  private readonly accounts = inject(AccountsApiClient);
  private readonly notices = inject(Notices);
  private readonly builder = inject(NonNullableFormBuilder);
  protected readonly minLength = MIN_PASSWORD_LENGTH;
  protected readonly homeZones = HOME_ZONES;
  protected readonly otherZones = otherZones();
  protected readonly form = this.builder.group({
    name: '',
    email: '',
    password: '',
    shopName: '',
    timeZone: likelyZone(),
    unitSystem: this.builder.control<UnitSystem>('inch'),
  });
  protected readonly submission = new Submission();
  protected readonly again = new Submission();
  /** The address the letter went to; null before. */
  protected readonly sentTo = signal<string | null>(null);

  protected submit(element: HTMLFormElement): void {
    const fields = checkForm(this.form, signUpSchema);
    if (fields) this.submission.run(this.accounts.signUp(fields), () => this.sentTo.set(fields.email));
    else focusFirstInvalid(element);
  }

  protected resend(email: string): void {
    this.again.run(this.accounts.resendConfirmation(email), () => this.notices.say('Sent once more.'));
  }
}
