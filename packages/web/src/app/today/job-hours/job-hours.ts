import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { formatHours } from '@bookmatch/common/calendar/format';
import type { JobInHand } from '@bookmatch/common/today/today-contract';
import { LeafPair } from '../../ui/leaf-pair/leaf-pair';
import type { LeafRow } from '../../ui/leaf-pair/leaf-row';
import { Panel } from '../../ui/panel/panel';

/** Planned and clocked hours of the jobs in hand, the soonest install first. A figure opens its job. */
@Component({
  selector: 'bm-job-hours',
  imports: [LeafPair, MatButton, Panel, RouterLink],
  template: `
    <bm-panel heading="Hours by job" flush>
      <a matButton bmPanelAction routerLink="/jobs" [queryParams]="{ stage: 'open', sort: 'installOn' }">
        {{ count() > jobs().length ? 'All ' + count() : 'List' }}<span class="bm-spoken">: jobs in hand</span>
      </a>
      @if (rows().length > 0) {
        <bm-leaf-pair
          label="Hours of the jobs in hand"
          builtName="Clocked"
          opens
          [rows]="rows()"
          [format]="hours"
          (opened)="open($event)"
        />
      } @else {
        <p class="nothing">No job has planned or clocked hours. A job begins when an estimate is accepted.</p>
      }
    </bm-panel>
  `,
  styles: `
    .nothing {
      padding: 4px 24px 20px;
      color: var(--mat-sys-on-surface-variant);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JobHours {
  readonly jobs = input.required<readonly JobInHand[]>();
  readonly count = input.required<number>();
  private readonly router = inject(Router);
  protected readonly hours = formatHours;
  protected readonly rows = computed(() => jobHourLeaves(this.jobs()));

  protected open({ key }: LeafRow): void {
    void this.router.navigate(['/jobs', key]);
  }
}

/** Jobs without any hours say nothing here. */
export function jobHourLeaves(jobs: readonly JobInHand[]): LeafRow[] {
  return jobs
    .filter(({ plannedMinutes, clockedMinutes }) => plannedMinutes > 0 || clockedMinutes > 0)
    .map(({ id, number, title, plannedMinutes, clockedMinutes }) => ({
      key: id,
      name: `${number} ${title}`,
      planned: plannedMinutes,
      built: clockedMinutes,
      note: clockedMinutes === 0 ? 'not started' : undefined,
    }));
}
