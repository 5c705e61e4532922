import { TestKey } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { ChangeDetectionStrategy, Component, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { Problem } from '@bookmatch/common/problems/problem';
import { provideIcons } from '../../testing/icons';
import { Cell } from './cell';
import type { Column } from './column';
import { DataTable } from './data-table';
import { DataTableHarness } from './data-table.harness';

type Row = { id: string; name: string; cents: number };

@Component({
  selector: 'bm-table-test',
  imports: [Cell, DataTable],
  template: `
    <bm-data-table
      label="Jobs"
      [columns]="columns"
      [rows]="rows()"
      [loading]="loading()"
      [problem]="problem()"
      [rowLink]="linkOf"
      [sort]="'name'"
      [next]="next()"
      [narrowed]="narrowed()"
      (sortChange)="said.push('sort ' + $event)"
      (nextPage)="said.push('next ' + $event)"
      (retry)="said.push('retry')"
      (clearFilters)="said.push('clear')"
    >
      <ng-template bmCell="cents" [bmCellOf]="rows()" let-row>{{ row.cents / 100 }} dollars</ng-template>
      <p bmEmpty>No jobs yet</p>
    </bm-data-table>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Host {
  readonly columns: Column<Row>[] = [
    { key: 'name', header: 'Name', sort: 'name', text: ({ name }) => name },
    {
      key: 'cents',
      header: 'Price',
      sort: 'price',
      align: 'end',
      text: ({ cents }) => (cents === 0 ? '' : 'priced'),
    },
  ];
  readonly rows = signal<Row[]>([
    { id: 'a', name: 'Lockers', cents: 5000 },
    { id: 'b', name: 'Bench', cents: 700 },
  ]);
  readonly loading = signal(false);
  readonly problem = signal<Problem | null>(null);
  readonly next = signal<string | null>(null);
  readonly narrowed = signal(false);
  readonly said: string[] = [];
  readonly linkOf = ({ id }: Row): string => `/jobs/${id}`;
}

async function open() {
  TestBed.configureTestingModule({ providers: [provideRouter([]), provideIcons()] });
  const fixture = TestBed.createComponent(Host);
  document.body.append(fixture.nativeElement as HTMLElement);
  const table = await TestbedHarnessEnvironment.loader(fixture).getHarness(DataTableHarness);
  return { host: fixture.componentInstance, fixture, table, element: fixture.nativeElement as HTMLElement };
}

describe('DataTable', () => {
  it('writes each row, by the column or by its own template', async () => {
    const { table } = await open();
    expect(await table.cellTexts()).toEqual([
      ['Lockers', '50 dollars'],
      ['Bench', '7 dollars'],
    ]);
  });

  it('links the first cell of a row to its screen', async () => {
    const { element } = await open();
    expect(element.querySelector('a.row-link')?.getAttribute('href')).toBe('/jobs/a');
  });

  it('says how it is sorted, turns the order around, and starts another column ascending', async () => {
    const { table, host } = await open();
    expect(await table.sortOf('Name')).toBe('ascending');
    expect(await table.sortOf('Price')).toBeNull();
    await table.sortBy('Name');
    await table.sortBy('Price');
    expect(host.said).toEqual(['sort -name', 'sort price']);
  });

  it('walks the rows by arrow keys, Home and End, and stays at the ends', async () => {
    const { table } = await open();
    expect(await table.walk(0, TestKey.DOWN_ARROW)).toBe(1);
    expect(await table.walk(1, TestKey.DOWN_ARROW)).toBe(1);
    expect(await table.walk(1, TestKey.HOME)).toBe(0);
    expect(await table.walk(0, TestKey.END)).toBe(1);
  });

  it('pages on by the cursor of the answer', async () => {
    const { table, host } = await open();
    host.next.set('cursor');
    await table.press('Next');
    expect(host.said).toEqual(['next cursor']);
  });

  it('shows skeleton rows at first, and keeps the rows it has while more are loaded', async () => {
    const { table, host } = await open();
    host.loading.set(true);
    expect(await table.rowCount()).toBe(2);
    host.rows.set([]);
    expect(await table.rowCount()).toBeGreaterThan(3);
  });

  it('offers the first step in an empty list, and the way out of a filter that finds nothing', async () => {
    const { table, host, fixture, element } = await open();
    host.rows.set([]);
    await fixture.whenStable();
    expect(element.textContent).toContain('No jobs yet');
    host.narrowed.set(true);
    await table.press('Show all');
    expect(element.textContent).not.toContain('No jobs yet');
    expect(host.said).toEqual(['clear']);
  });

  it('says what went wrong and tries again', async () => {
    const { table, host, element } = await open();
    host.problem.set({
      type: '',
      title: '',
      status: 500,
      code: 'fault',
      detail: 'It broke.',
      reference: 'r1',
    });
    await table.press('Try again');
    expect(element.querySelector('[role=alert]')?.textContent).toContain('It broke.');
    expect(host.said).toEqual(['retry']);
  });

  it('leaves a cell without a text out of a narrow row, also when a template draws it', async () => {
    const { fixture } = await open();
    fixture.componentInstance.rows.update(([first, ...rest]) => [{ ...first!, cents: 0 }, ...rest]);
    await fixture.whenStable();
    const cells = [...(fixture.nativeElement as HTMLElement).querySelectorAll('tbody td.end')];
    expect(cells.map((cell) => cell.classList.contains('blank'))).toEqual([true, false]);
  });
});
