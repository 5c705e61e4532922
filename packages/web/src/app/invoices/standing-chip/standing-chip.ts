import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { InvoiceStanding } from '@bookmatch/common/invoices/invoice-standings';
import { standingWords } from '@bookmatch/common/invoices/invoice-words';
import { StatusChip, type Tone } from '../../ui/status-chip/status-chip';

const TONES: Record<InvoiceStanding, Tone> = {
  draft: 'neutral',
  due: 'planned',
  'part-paid': 'planned',
  overdue: 'over',
  paid: 'good',
  credited: 'neutral',
};

/** Where an invoice stands: `Due`, `Part paid`, `Overdue 12 days`, … */
@Component({
  selector: 'bm-standing-chip',
  imports: [StatusChip],
  template: `<bm-status-chip [tone]="tone()">{{ words() }}</bm-status-chip>`,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StandingChip {
  readonly standing = input.required<InvoiceStanding>();
  readonly daysOverdue = input(0);
  protected readonly tone = computed(() => TONES[this.standing()]);
  protected readonly words = computed(() => standingWords(this.standing(), this.daysOverdue()));
}
