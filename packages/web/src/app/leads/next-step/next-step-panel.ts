import { ChangeDetectionStrategy, Component, computed, effect, inject, input, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { addDays } from '@bookmatch/common/calendar/shop-dates';
import { nextStepStanding } from '@bookmatch/common/leads/lead-stages';
import { updateLeadSchema, type Lead } from '@bookmatch/common/leads/leads-contract';
import { Store } from '@ngrx/store';
import { injectCan } from '../../platform/session/ability';
import { DayInput } from '../../ui/day-input/day-input';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { injectShopToday } from '../../ui/formats/shop-today';
import { Panel } from '../../ui/panel/panel';
import { LeadsPage } from '../state/leads.actions';
import { selectSave } from '../state/leads.selectors';
import { StepDate } from './step-date';

/** What is to be done about a lead next, and when: shown large, changed in place. */
@Component({
  selector: 'bm-next-step-panel',
  imports: [
    DayInput,
    ErrorOf,
    FormErrors,
    MatButton,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    Panel,
    ReactiveFormsModule,
    StepDate,
  ],
  templateUrl: './next-step-panel.html',
  styleUrl: './next-step-panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NextStepPanel {
  readonly lead = input.required<Lead>();

  private readonly store = inject(Store);
  private readonly today = injectShopToday();
  protected readonly can = injectCan();
  protected readonly save = this.store.selectSignal(selectSave('next-step'));
  protected readonly standing = computed(() => nextStepStanding(this.lead(), this.today()));
  private readonly builder = inject(NonNullableFormBuilder);
  protected readonly form = this.builder.group({
    nextStep: '',
    nextStepOn: this.builder.control<string | null>(null),
  });
  /** `set` writes the step anew, `done` first notes the one that stood there. */
  protected readonly editing = signal<'set' | 'done' | null>(null);
  protected readonly shortcuts = computed(() => {
    const today = this.today();
    return [
      { name: 'Tomorrow', day: addDays(today, 1) },
      { name: 'In 3 days', day: addDays(today, 3) },
      { name: 'In a week', day: addDays(today, 7) },
    ];
  });

  constructor() {
    effect(() => {
      if (this.save().status === 'saved') this.editing.set(null);
    });
  }

  protected edit(how: 'set' | 'done'): void {
    const { nextStep, nextStepOn } = this.lead();
    this.store.dispatch(LeadsPage.formOpened({ form: 'next-step' }));
    this.form.reset(how === 'set' ? { nextStep, nextStepOn } : { nextStep: '', nextStepOn: null });
    this.editing.set(how);
  }

  protected pick(day: string): void {
    this.form.patchValue({ nextStepOn: day });
    this.form.markAsDirty();
  }

  protected submit(element: HTMLFormElement): void {
    const fields = checkForm(this.form, updateLeadSchema);
    if (!fields) {
      focusFirstInvalid(element);
      return;
    }
    const lead = this.lead();
    if (this.editing() === 'done' && lead.nextStep)
      this.store.dispatch(LeadsPage.noteSubmitted({ id: lead.id, body: `Done: ${lead.nextStep}` }));
    this.store.dispatch(LeadsPage.nextStepSubmitted({ lead, fields }));
  }
}
