import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { Correction } from '@bookmatch/common/time/time-contract';
import { DateTextPipe } from '../../../ui/formats/date-text.pipe';
import { SHOP_ZONE } from '../../../ui/formats/shop-settings';
import { changeWords } from './change-words';

/** What was done to an entry afterwards: who, when, why, and what it was before. */
@Component({
  selector: 'bm-entry-history',
  imports: [DateTextPipe],
  template: `
    <h3>History</h3>
    <ol>
      @for (row of rows(); track $index) {
        <li>
          <p>
            <strong>{{ row.correction.by }}</strong>
            <span class="bm-quiet"> {{ row.correction.at | dateText: 'day-and-time' }}</span>
          </p>
          <p>{{ row.correction.reason }}</p>
          @for (words of row.words; track words) {
            <p class="bm-quiet">{{ words }}</p>
          }
        </li>
      }
    </ol>
  `,
  styleUrl: './entry-history.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EntryHistory {
  readonly corrections = input.required<readonly Correction[]>();
  private readonly zone = inject(SHOP_ZONE);
  protected readonly rows = computed(() =>
    this.corrections().map((correction) => ({ correction, words: changeWords(correction, this.zone()) })),
  );
}
