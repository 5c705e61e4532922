import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import type { InvoiceRow } from '@bookmatch/common/invoices/invoices-contract';
import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import { DataTableHarness } from '../../ui/data-table/data-table.harness';
import invoicesRoutes from '../invoices.routes';

const routes = [{ path: 'invoices', children: invoicesRoutes }];
const row: InvoiceRow = {
  id: '01940000-0000-7000-8000-000000000001',
  number: 2207,
  status: 'issued',
  standing: 'overdue',
  daysOverdue: 12,
  kind: 'progress',
  issuedOn: '2027-01-11',
  dueOn: '2027-01-25',
  customerId: '01940000-0000-7000-8000-000000000002',
  customerName: 'Wren Halloway',
  jobId: '01940000-0000-7000-8000-000000000003',
  jobNumber: 1042,
  stageName: 'Ready to finish',
  createdAt: '2027-01-11T15:00:00.000Z',
  totalCents: 564_000,
  balanceCents: 500_000,
  overpaidCents: 0,
};
const draft: InvoiceRow = {
  ...row,
  ...{ id: '01940000-0000-7000-8000-000000000004', number: null, status: 'draft', standing: 'draft' },
  ...{ daysOverdue: 0, issuedOn: null, dueOn: null, balanceCents: 0 },
};
const totals = {
  on: '2027-02-06',
  aging: {
    currentCents: 100_000,
    days1To30Cents: 500_000,
    days31To60Cents: 0,
    days61To90Cents: 0,
    over90Cents: 0,
    totalCents: 600_000,
  },
  overdueCents: 500_000,
  openCount: 2,
  overdueCount: 1,
  draftCents: 564_000,
  draftCount: 1,
};

async function open(url = '/invoices', role: 'owner' | 'bookkeeper' = 'owner') {
  const screen = await openShopScreen(routes, url, buildMembership({ role }));
  const table = await TestbedHarnessEnvironment.loader(screen.fixture).getHarness(DataTableHarness);
  return { ...screen, table };
}

describe('InvoiceList', () => {
  it('says what is owed in all and by age, and each invoice in a line', async () => {
    const { http, shop, table, element, fixture } = await open();
    http.expectOne(shop('/invoices/totals')).flush(totals);
    http.expectOne(shop('/invoices')).flush({ rows: [draft, row], next: null, total: 2 });
    await fixture.whenStable();
    const [first, second] = await table.cellTexts();
    expect(first?.[0]).toBe('Draft');
    expect(second).toEqual([
      '2207',
      'Wren Halloway',
      'Job 1042, Ready to finish',
      expect.stringContaining('Jan 11'),
      expect.stringContaining('Jan 25'),
      '5,640.00',
      '5,000.00',
      'Overdue 12 days',
    ]);
    const owed = element.querySelector('.owed')?.textContent ?? '';
    expect(owed).toContain('$6,000.00');
    expect(owed).toContain('1 to 30 days');
  });

  it('asks for what the address says, and can be freed from a customer it was narrowed to', async () => {
    const url = `/invoices?standing=open&customerId=${row.customerId}`;
    const { http, shop, table, element } = await open(url);
    http
      .expectOne(shop(`/invoices?standing=open&customerId=${row.customerId}`))
      .flush({ rows: [row], next: null, total: 1 });
    await table.press('Only Wren Halloway');
    http.expectOne(shop('/invoices?standing=open')).flush({ rows: [], next: null, total: 0 });
    const csv = element.querySelector<HTMLAnchorElement>('a[download]');
    expect(csv?.getAttribute('href')).toBe(shop('/invoices/export?standing=open'));
  });
});
