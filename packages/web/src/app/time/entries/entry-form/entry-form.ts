import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
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
import type { Problem } from '@bookmatch/common/problems/problem';
import type { TimeEntryRow } from '@bookmatch/common/time/time-contract';
import { Store } from '@ngrx/store';
import { injectCan } from '../../../platform/session/ability';
import { ErrorOf } from '../../../ui/form-errors/error-of';
import { placeFieldProblems } from '../../../ui/form-errors/field-problems';
import { focusFirstInvalid, FormErrors } from '../../../ui/form-errors/form-errors';
import { SHOP_ZONE } from '../../../ui/formats/shop-settings';
import { WeeksPage } from '../../state/weeks.actions';
import { weeksFeature } from '../../state/weeks.state';
import { EntryHistory } from '../entry-history/entry-history';
import { addedFields, correctedFields, entryFormGroup, missingIn, typedOf } from './entry-form-group';
import { jobChoices, operationChoices } from './work-choices';

/** Whose time, and which entry; null adds one on the day. */
export type EntryFormSubject = {
  memberId: string;
  memberName: string;
  entry: TimeEntryRow | null;
  on: string | null;
};

/** Adds a forgotten stretch or corrects one, with a reason, and shows what was corrected before. */
@Component({
  selector: 'bm-entry-form',
  imports: [
    EntryHistory,
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
  templateUrl: './entry-form.html',
  styleUrl: './entry-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EntryForm {
  private readonly store = inject(Store);
  private readonly zone = inject(SHOP_ZONE);
  protected readonly subject = inject<EntryFormSubject>(MAT_DIALOG_DATA);
  protected readonly dialog = inject<MatDialogRef<EntryForm>>(MatDialogRef);
  protected readonly save = this.store.selectSignal(weeksFeature.selectSave);
  /** The entry as it is now, with its history. */
  protected readonly entry = this.store.selectSignal(weeksFeature.selectEntry);
  private readonly work = this.store.selectSignal(weeksFeature.selectWork);

  protected readonly mayCorrect = injectCan()('correct', 'TimeEntry') && !this.subject.entry?.voidedAt;
  protected readonly form = entryFormGroup(
    inject(NonNullableFormBuilder),
    typedOf(this.subject.entry, this.subject.on ?? '', this.zone()),
  );
  private readonly typed = toSignal(this.form.valueChanges, { initialValue: this.form.value });
  protected readonly isWork = computed(() => this.typed().kind === 'work');
  protected readonly jobs = computed(() => jobChoices(this.work(), this.subject.entry));
  protected readonly operations = computed(() =>
    operationChoices(this.work(), this.subject.entry, this.typed().jobId ?? ''),
  );
  protected readonly problem = computed(() => placed(this.save().problem));

  constructor() {
    this.store.dispatch(WeeksPage.formOpened({ entryId: this.subject.entry?.id ?? null }));
    if (this.mayCorrect) this.store.dispatch(WeeksPage.workWanted());
    effect(() => {
      if (this.save().status === 'saved') this.dialog.close();
    });
  }

  protected submit(element: HTMLFormElement): void {
    const typed = this.form.getRawValue();
    const { entry, memberId } = this.subject;
    this.form.updateValueAndValidity();
    this.form.markAllAsTouched();
    for (const control of Object.values(this.form.controls)) control.updateValueAndValidity();
    const missing = missingIn(typed, this.zone(), entry?.endedAt === null);
    placeFieldProblems(this.form, missing);
    if (missing.length > 0) {
      focusFirstInvalid(element);
      return;
    }
    const current = this.entry() ?? entry;
    this.store.dispatch(
      current
        ? WeeksPage.correctionSubmitted({
            entry: current,
            fields: correctedFields(typed, current, this.zone()),
          })
        : WeeksPage.addSubmitted({ fields: addedFields(typed, memberId, this.zone()) }),
    );
  }
}

/** The server speaks of instants, the form of times on the wall. */
const NAMES: Record<string, string> = { startedAt: 'from', endedAt: 'to' };

function placed(problem: Problem | null): Problem | null {
  const fields = problem?.fields?.map(({ path, message }) => ({ path: NAMES[path] ?? path, message }));
  return problem && fields ? { ...problem, fields } : problem;
}
