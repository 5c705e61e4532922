import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { ClockChoice } from '@bookmatch/common/time/clock-contract';
import type { Running } from '../../punches/apply-punches';
import { MEAL_BREAK, workOf, type PunchedWork } from '../../punches/punch';
import { factsOf } from '../choice-words';

/** What one can start or switch to, a touch each; room inside for a way to what is not in the list. */
@Component({
  selector: 'bm-choice-list',
  templateUrl: './choice-list.html',
  styleUrl: './choice-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ChoiceList {
  readonly choices = input.required<readonly ClockChoice[]>();
  readonly running = input.required<Running | null>();
  readonly chosen = output<PunchedWork>();

  protected readonly factsOf = factsOf;
  protected readonly workOf = workOf;
  protected readonly mealBreak = MEAL_BREAK;
  protected readonly heading = computed(() => (this.running() ? 'Switch to' : 'Start'));
  /** Only work is interrupted by a meal. */
  protected readonly offersBreak = computed(() => this.running()?.work.kind === 'work');
}
