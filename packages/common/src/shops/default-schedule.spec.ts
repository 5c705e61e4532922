import type { BillingStagePlan } from '../estimates/billing-schedule-contract.js';
import { refuseDefaultSchedule } from './default-schedule.js';
import { DEFAULT_BILLING_SCHEDULE } from './new-shop.js';

const stage = (share: BillingStagePlan['share']): BillingStagePlan => ({
  name: 'Stage',
  share,
  deposit: false,
  due: 'by-hand',
});
const refused = (...shares: BillingStagePlan['share'][]) => refuseDefaultSchedule(shares.map(stage));

describe('a default billing schedule', () => {
  it('is, for a new shop, one that works', () => {
    expect(refuseDefaultSchedule(DEFAULT_BILLING_SCHEDULE)).toBeNull();
  });

  it('bills the whole price, whatever it will be', () => {
    expect(refused({ percent: '50' }, { percent: '50' })).toBeNull();
    expect(refused({ amountCents: 50_000 }, { remainder: true })).toBeNull();
    expect(refused({ percent: '40' }, { percent: '40' })?.fields?.[0]?.path).toBe('defaultBillingSchedule');
    expect(refused({ amountCents: 50_000 })).not.toBeNull();
    expect(refused({ percent: '100' }, { remainder: true })).not.toBeNull();
  });

  it('has at most one remainder, and no stage that bills nothing', () => {
    expect(refused({ remainder: true }, { remainder: true })).not.toBeNull();
    expect(refused({ percent: '0' }, { percent: '100' })).not.toBeNull();
  });
});
