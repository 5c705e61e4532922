import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatIconAnchor } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { RouterLink } from '@angular/router';
import { addDays, dateIn, weekStart } from '@bookmatch/common/calendar/shop-dates';
import { DateTextPipe } from '../../../ui/formats/date-text.pipe';
import { SHOP_ZONE } from '../../../ui/formats/shop-settings';

/** Which week is shown, with the ways to the one before and the one after; the address keeps it. */
@Component({
  selector: 'bm-week-bar',
  imports: [DateTextPipe, MatIcon, MatIconAnchor, RouterLink],
  template: `
    <a matIconButton [routerLink]="[]" [queryParams]="{ of: before() }" aria-label="The week before">
      <mat-icon svgIcon="chevron-left" />
    </a>
    <p>{{ startsOn() | dateText }} – {{ endsOn() | dateText }}</p>
    @if (isPast()) {
      <a matIconButton [routerLink]="[]" [queryParams]="{ of: after() }" aria-label="The week after">
        <mat-icon svgIcon="chevron-right" />
      </a>
      <a class="now" [routerLink]="[]">This week</a>
    }
  `,
  styleUrl: './week-bar.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WeekBar {
  readonly startsOn = input.required<string>();

  private readonly zone = inject(SHOP_ZONE);
  protected readonly endsOn = computed(() => addDays(this.startsOn(), 6));
  protected readonly before = computed(() => addDays(this.startsOn(), -7));
  protected readonly after = computed(() => addDays(this.startsOn(), 7));
  protected readonly isPast = computed(
    () => this.startsOn() < weekStart(dateIn(this.zone(), new Date().toISOString())),
  );
}
