import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { CHART_OF_ACCOUNTS } from '@bookmatch/common/ledger/chart-of-accounts';
import type { LedgerEntry } from '@bookmatch/common/ledger/ledger-contract';
import { buildMembership } from '../testing/session';
import { openShopScreen } from '../testing/shop-screen';
import { DataTableHarness } from '../ui/data-table/data-table.harness';
import ledgerRoutes from './ledger.routes';

const routes = [{ path: 'ledger', children: ledgerRoutes }];
const id = (last: number) => `01940000-0000-7000-8000-00000000000${last}`;
const about = { customerId: id(1), jobId: id(2) };
const entry: LedgerEntry = {
  ...{ id: id(3), number: 14, on: '2027-01-11', kind: 'payment', memo: 'Payment of invoice 2001' },
  ...{ source: { kind: 'payment', id: id(4) }, invoiceId: id(5), createdAt: '2027-01-11T15:00:00.000Z' },
  lines: [
    { account: '1000', side: 'debit', amountCents: 43_300, ...about },
    { account: '1200', side: 'credit', amountCents: 43_300, ...about },
  ],
};

async function open(url: string) {
  const screen = await openShopScreen(routes, url, buildMembership({ role: 'bookkeeper' }));
  return { ...screen, loader: TestbedHarnessEnvironment.loader(screen.fixture) };
}

describe('the ledger on the screen', () => {
  it('balances every account, each with the way to what it is made of', async () => {
    const { http, shop, element, fixture } = await open('/ledger');
    const rows = CHART_OF_ACCOUNTS.map(({ code: account, name, type, normalSide }) => ({
      ...{ account, name, type, normalSide },
      debitCents: account === '1000' ? 43_300 : 0,
      creditCents: account === '2300' ? 43_300 : 0,
    }));
    const balance = { on: '2027-01-11', rows, debitCents: 43_300, creditCents: 43_300 };
    http.expectOne(shop('/ledger/trial-balance')).flush(balance);
    await fixture.whenStable();
    const row = [...element.querySelectorAll('tbody tr')].find((one) => one.textContent?.includes('2300'));
    expect(row?.textContent).toContain('Customer deposits');
    expect(row?.textContent).toContain('433.00');
    expect(row?.querySelector('a')?.getAttribute('href')).toBe('/ledger/accounts/2300');
    expect(element.querySelector('tfoot')?.textContent?.match(/433\.00/g)).toHaveLength(2);
  });

  it('lists entries by what they move, narrowed to one invoice and freed again', async () => {
    const { http, shop, loader } = await open(`/ledger/entries?invoiceId=${id(5)}`);
    const table = await loader.getHarness(DataTableHarness);
    http.expectOne(shop(`/ledger/entries?invoiceId=${id(5)}`)).flush({ rows: [entry], next: null, total: 1 });
    const [cells] = await table.cellTexts();
    expect(cells).toEqual([
      '14',
      'Payment of invoice 2001',
      'Payment',
      expect.stringContaining('Jan 11'),
      '433.00',
    ]);
    await table.press('Only one invoice');
    http.expectOne(shop('/ledger/entries')).flush({ rows: [], next: null, total: 0 });
  });

  it('shows an entry in two columns and leads back to its invoice and job', async () => {
    const { http, shop, element, fixture } = await open(`/ledger/entries/${entry.id}`);
    http.expectOne(shop(`/ledger/entries/${entry.id}`)).flush(entry);
    await fixture.whenStable();
    expect(element.querySelector('h1')?.textContent).toBe('Payment of invoice 2001');
    const links = [...element.querySelectorAll('a')].map((link) => link.getAttribute('href'));
    expect(links).toEqual(
      expect.arrayContaining([`/invoices/${id(5)}`, `/jobs/${id(2)}`, '/ledger/accounts/1200']),
    );
  });

  it('runs the balance of an account line by line, with what it opens and closes with', async () => {
    const { http, shop, element, loader, fixture } = await open('/ledger/accounts/1200?from=2027-01-01');
    const { lines: _lines, id: entryId, number: entryNumber, createdAt: _at, ...rest } = entry;
    const row = { ...rest, entryId, entryNumber, side: 'credit', amountCents: 43_300, balanceCents: 6700 };
    http.expectOne(shop('/ledger/accounts/1200?from=2027-01-01')).flush({
      ...{ account: '1200', name: 'Accounts receivable', normalSide: 'debit' },
      ...{ openingBalanceCents: 50_000, closingBalanceCents: 6700, rows: [row], next: null, total: 1 },
    });
    await fixture.whenStable();
    expect(element.querySelector('.ends')?.textContent).toContain('$500.00');
    const [cells] = await (await loader.getHarness(DataTableHarness)).cellTexts();
    expect(cells?.slice(3)).toEqual(['', '433.00', '67.00']);
  });
});
