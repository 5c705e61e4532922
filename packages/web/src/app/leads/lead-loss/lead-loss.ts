import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatOption, MatSelect } from '@angular/material/select';
import { LOST_REASON_NAMES } from '@bookmatch/common/leads/lead-words';
import {
  LOST_REASONS,
  loseLeadSchema,
  type LeadRow,
  type LostReason,
} from '@bookmatch/common/leads/leads-contract';
import { Store } from '@ngrx/store';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { LeadsPage } from '../state/leads.actions';
import { selectLead, selectSave } from '../state/leads.selectors';

/** Asks why a lead was lost. */
@Component({
  selector: 'bm-lead-loss',
  imports: [
    ErrorOf,
    FormErrors,
    MatButton,
    MatDialogActions,
    MatDialogContent,
    MatDialogTitle,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    MatOption,
    MatSelect,
    ReactiveFormsModule,
  ],
  templateUrl: './lead-loss.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LeadLoss {
  private readonly store = inject(Store);
  protected readonly lead = inject<Pick<LeadRow, 'id' | 'version' | 'title'>>(MAT_DIALOG_DATA);
  protected readonly dialog = inject<MatDialogRef<LeadLoss>>(MatDialogRef);
  private readonly newest = this.store.selectSignal(selectLead(this.lead.id));
  protected readonly save = this.store.selectSignal(selectSave('loss'));
  protected readonly reasons = LOST_REASONS.map((value) => ({ value, name: LOST_REASON_NAMES[value] }));
  private readonly builder = inject(NonNullableFormBuilder);
  protected readonly form = this.builder.group({
    reason: this.builder.control<LostReason | null>(null),
    note: '',
  });

  constructor() {
    this.store.dispatch(LeadsPage.formOpened({ form: 'loss' }));
    effect(() => {
      if (this.save().status === 'saved') this.dialog.close();
    });
  }

  protected submit(element: HTMLFormElement): void {
    const loss = checkForm(this.form, loseLeadSchema);
    if (loss) this.store.dispatch(LeadsPage.lossSubmitted({ lead: this.latest(), loss }));
    else focusFirstInvalid(element);
  }

  /** After a conflict the newer version was read; a second press means that one. */
  private latest(): Pick<LeadRow, 'id' | 'version'> {
    const newest = this.newest();
    return newest && newest.version > this.lead.version ? newest : this.lead;
  }
}
