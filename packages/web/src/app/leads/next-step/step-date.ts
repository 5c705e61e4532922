import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { daysBetween } from '@bookmatch/common/calendar/shop-dates';
import { nextStepStanding } from '@bookmatch/common/leads/lead-stages';
import type { LeadRow } from '@bookmatch/common/leads/leads-contract';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { injectShopToday } from '../../ui/formats/shop-today';
import { StatusChip } from '../../ui/status-chip/status-chip';

/** When the next step of a lead is due: what is late stands out. */
@Component({
  selector: 'bm-step-date',
  imports: [DateTextPipe, StatusChip],
  template: `
    @switch (standing()) {
      @case ('overdue') {
        <bm-status-chip tone="over">{{ lead().nextStepOn | dateText }}, {{ late() }}</bm-status-chip>
      }
      @case ('today') {
        <bm-status-chip tone="planned">Today</bm-status-chip>
      }
      @case ('ahead') {
        {{ lead().nextStepOn | dateText }}
      }
    }
  `,
  styles: ':host { white-space: nowrap; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StepDate {
  readonly lead = input.required<Pick<LeadRow, 'stage' | 'nextStepOn'>>();
  private readonly today = injectShopToday();

  protected readonly standing = computed(() => nextStepStanding(this.lead(), this.today()));
  protected readonly late = computed(() => {
    const days = daysBetween(this.lead().nextStepOn ?? this.today(), this.today());
    return days === 1 ? '1 day late' : `${days} days late`;
  });
}
