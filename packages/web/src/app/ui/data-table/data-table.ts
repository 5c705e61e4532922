import { NgTemplateOutlet } from '@angular/common';
import {
  booleanAttribute,
  ChangeDetectionStrategy,
  Component,
  computed,
  contentChildren,
  ElementRef,
  inject,
  input,
  output,
  type TemplateRef,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { RouterLink } from '@angular/router';
import type { Problem } from '@bookmatch/common/problems/problem';
import { ProblemNote } from '../problem-note/problem-note';
import { Skeleton } from '../skeleton/skeleton';
import { Cell } from './cell';
import type { Column } from './column';
import { nextSort, sortDirection } from './sort';

/**
 * A dense list, paged, sorted and filtered by the server. Filters go into `[bmFilters]`, what stands in an empty list
 * into `[bmEmpty]`. Up, Down, Home and End walk the rows, Enter opens one.
 */
@Component({
  selector: 'bm-data-table',
  imports: [NgTemplateOutlet, MatButton, MatIcon, RouterLink, ProblemNote, Skeleton],
  templateUrl: './data-table.html',
  styleUrl: './data-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(keydown)': 'walk($event)' },
})
export class DataTable<Row extends { id: string }> {
  /** What is listed, for who cannot see the screen: "Customers". */
  readonly label = input.required<string>();
  readonly columns = input.required<readonly Column<Row>[]>();
  readonly rows = input.required<readonly Row[]>();
  readonly loading = input(false, { transform: booleanAttribute });
  readonly problem = input<Problem | null>(null);
  /** The address of a row's own screen; absent when rows do not open. */
  readonly rowLink = input<(row: Row) => string>();
  readonly sort = input<string>();
  readonly next = input<string | null>(null);
  readonly hasPrevious = input(false);
  readonly total = input<number | null>(null);
  /** True when a search or filter narrows the list. */
  readonly narrowed = input(false);
  /** Where the whole list downloads as CSV; absent when it cannot. */
  readonly csvUrl = input<string>();

  readonly sortChange = output<string>();
  readonly nextPage = output<string>();
  readonly previousPage = output();
  readonly retry = output();
  readonly clearFilters = output();

  private readonly cells = contentChildren<Cell<Row>>(Cell);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  protected readonly skeletonRows = [70, 55, 80, 60, 75, 50, 65, 58];
  protected readonly sortDirection = sortDirection;

  protected readonly state = computed(() => {
    if (this.problem()) return 'failed';
    if (this.rows().length > 0) return 'filled';
    if (this.loading()) return 'loading';
    return this.narrowed() ? 'nothing-found' : 'empty';
  });
  protected readonly paged = computed(() => this.hasPrevious() || this.next() !== null);
  private readonly templates = computed(
    () => new Map(this.cells().map((cell) => [cell.bmCell(), cell.template])),
  );

  protected templateOf(column: Column<Row>): TemplateRef<{ $implicit: Row }> | null {
    return this.templates().get(column.key) ?? null;
  }

  protected placeOf(column: Column<Row>, index: number): string {
    return column.phone ?? (index === 0 ? 'title' : 'line');
  }

  protected isBlank(column: Column<Row>, row: Row): boolean {
    return column.text ? !column.text(row) : !this.templates().has(column.key);
  }

  protected sortBy(key: string): void {
    this.sortChange.emit(nextSort(this.sort(), key));
  }

  protected walk(event: KeyboardEvent): void {
    const links = [...this.host.nativeElement.querySelectorAll<HTMLElement>('a.row-link')];
    const at = links.indexOf(event.target as HTMLElement);
    if (at < 0) return;
    const to = { ArrowDown: at + 1, ArrowUp: at - 1, Home: 0, End: links.length - 1 }[event.key];
    const link = to === undefined ? undefined : links[to];
    if (!link) return;
    event.preventDefault();
    link.focus();
  }
}
