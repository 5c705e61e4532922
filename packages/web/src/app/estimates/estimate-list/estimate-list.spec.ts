import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import type { EstimateRow } from '@bookmatch/common/estimates/estimates-contract';
import { buildEstimate } from '@bookmatch/common/testing/build-estimate';
import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import { DataTableHarness } from '../../ui/data-table/data-table.harness';
import estimatesRoutes from '../estimates.routes';

const routes = [{ path: 'estimates', children: estimatesRoutes }];
const { id, number, title, customer, createdAt } = buildEstimate({ number: 318 });
const row: EstimateRow = {
  ...{ id, number, title, createdAt, customerId: customer.id, customerName: customer.name },
  ...{ status: 'expired', revisionNumber: 2, validUntil: '2026-02-10', openQuestions: 2, sentAt: createdAt },
  totalCents: 566_155,
};

async function open(url = '/estimates', membership = buildMembership()) {
  const screen = await openShopScreen(routes, url, membership);
  const loader = TestbedHarnessEnvironment.loader(screen.fixture);
  return { ...screen, table: await loader.getHarness(DataTableHarness) };
}

describe('EstimateList', () => {
  it('asks for what the address says and shows each with its price and status', async () => {
    const { http, shop, table } = await open('/estimates?status=expired&q=wall');
    http.expectOne(shop('/estimates?q=wall&status=expired')).flush({ rows: [row], next: null, total: 1 });
    const [cells] = await table.cellTexts();
    expect(cells?.map((text) => text.replace(/\s+/g, ' '))).toEqual([
      `${title} 2 open questions`,
      '318 revision 2',
      customer.name,
      'Expired',
      expect.stringContaining('Feb 10'),
      expect.any(String),
      '$5,661.55',
    ]);
  });

  it('offers a new estimate only to those who may write one', async () => {
    const offers = async (role: 'owner' | 'bookkeeper') => {
      TestBed.resetTestingModule();
      const { element } = await open('/estimates', buildMembership({ role }));
      return element.textContent?.includes('New estimate');
    };
    expect(await offers('owner')).toBe(true);
    expect(await offers('bookkeeper')).toBe(false);
  });
});
