import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { answerQuestionSchema, type Question } from '@bookmatch/common/customer-page/questions-contract';
import type { Estimate } from '@bookmatch/common/estimates/estimates-contract';
import { Store } from '@ngrx/store';
import { injectCan } from '../../platform/session/ability';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { Panel } from '../../ui/panel/panel';
import { EstimatesPage } from '../state/estimates.actions';

/** What the customer asked on the estimate's page, and the shop's answers. */
@Component({
  selector: 'bm-questions-panel',
  imports: [
    DateTextPipe,
    ErrorOf,
    MatButton,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    Panel,
    ReactiveFormsModule,
  ],
  templateUrl: './questions-panel.html',
  styleUrl: './questions-panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class QuestionsPanel {
  readonly estimate = input.required<Estimate>();
  private readonly store = inject(Store);
  protected readonly can = injectCan();
  private readonly answers = new Map<string, FormControl<string>>();

  /** Kept while the screen lives, so that an answer half written survives what comes in meanwhile. */
  protected answerTo({ id }: Question): FormControl<string> {
    const known = this.answers.get(id);
    if (known) return known;
    const fresh = new FormControl('', { nonNullable: true });
    this.answers.set(id, fresh);
    return fresh;
  }

  protected answer(question: Question): void {
    const control = this.answerTo(question);
    const parsed = answerQuestionSchema.safeParse({ body: control.value });
    if (!parsed.success) {
      control.setErrors({ problem: parsed.error.issues[0]?.message });
      control.markAsTouched();
      return;
    }
    const { id: estimateId } = this.estimate();
    this.store.dispatch(
      EstimatesPage.answerSubmitted({ estimateId, questionId: question.id, ...parsed.data }),
    );
  }
}
