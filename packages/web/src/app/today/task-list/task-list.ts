import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { Panel } from '../../ui/panel/panel';
import { StatusChip } from '../../ui/status-chip/status-chip';
import type { Task } from './task';

/** What to do next, a row each, with one action; the rest of the list is one step away. */
@Component({
  selector: 'bm-task-list',
  imports: [MatButton, MoneyPipe, Panel, RouterLink, StatusChip],
  templateUrl: './task-list.html',
  styleUrl: './task-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TaskList {
  readonly heading = input.required<string>();
  readonly tasks = input.required<readonly Task[]>();
  /** How many there are in all; more than are shown leads to the list. */
  readonly count = input<number>();
  readonly listLink = input<string>();
  readonly listParams = input<Record<string, string>>({});
  /** Stands where nothing waits. */
  readonly nothing = input.required<string>();
}
