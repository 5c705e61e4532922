import { ChangeDetectionStrategy, Component, effect, inject, input } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatIcon } from '@angular/material/icon';
import { MatInput } from '@angular/material/input';
import { LEAD_STAGE_NAMES } from '@bookmatch/common/leads/lead-stages';
import { addLeadNoteSchema } from '@bookmatch/common/leads/leads-contract';
import { Store } from '@ngrx/store';
import { injectCan } from '../../platform/session/ability';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { LeadsPage } from '../state/leads.actions';
import { selectNotesProblem, selectSave } from '../state/leads.selectors';
import type { TimelineEntry } from './timeline-entry';

/** Notes and steps of a lead in one line of time, with room for the next note on top. */
@Component({
  selector: 'bm-timeline',
  imports: [
    DateTextPipe,
    ErrorOf,
    FormErrors,
    MatButton,
    MatError,
    MatFormField,
    MatIcon,
    MatInput,
    MatLabel,
    Panel,
    ProblemNote,
    ReactiveFormsModule,
  ],
  templateUrl: './timeline.html',
  styleUrl: './timeline.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Timeline {
  readonly leadId = input.required<string>();
  readonly entries = input.required<readonly TimelineEntry[]>();

  private readonly store = inject(Store);
  protected readonly can = injectCan();
  protected readonly save = this.store.selectSignal(selectSave('note'));
  protected readonly problem = this.store.selectSignal(selectNotesProblem);
  protected readonly stageNames = LEAD_STAGE_NAMES;
  protected readonly form = inject(NonNullableFormBuilder).group({ body: '' });
  /** What was sent: the field is emptied only for that, so that nothing typed meanwhile is lost. */
  private sent = '';

  constructor() {
    this.store.dispatch(LeadsPage.formOpened({ form: 'note' }));
    effect(() => {
      if (this.save().status === 'saved' && this.form.getRawValue().body.trim() === this.sent)
        this.form.reset();
    });
  }

  hasUnsavedChanges(): boolean {
    return this.form.getRawValue().body.trim() !== '';
  }

  protected submit(element: HTMLFormElement): void {
    const note = checkForm(this.form, addLeadNoteSchema);
    if (!note) {
      focusFirstInvalid(element);
      return;
    }
    this.sent = note.body;
    this.store.dispatch(LeadsPage.noteSubmitted({ id: this.leadId(), body: note.body }));
  }
}
