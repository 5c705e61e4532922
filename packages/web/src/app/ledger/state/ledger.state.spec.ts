import type { AccountActivity, AccountActivityRow } from '@bookmatch/common/ledger/ledger-contract';
import { LedgerApi, LedgerPage } from './ledger.actions';
import { selectActivityList } from './ledger.selectors';
import { initialLedger, ledgerFeature } from './ledger.state';

const { reducer } = ledgerFeature;
const row: AccountActivityRow = {
  ...{ entryId: 'e1', entryNumber: 1, on: '2027-01-11', kind: 'invoice', memo: 'Invoice 2001' },
  ...{ source: { kind: 'invoice', id: 'i1' }, invoiceId: 'i1' },
  ...{ side: 'debit', amountCents: 100, balanceCents: 100 },
};
const activity: AccountActivity = {
  ...{ account: '1200', name: 'Accounts receivable', normalSide: 'debit' },
  ...{ openingBalanceCents: 0, closingBalanceCents: 100, rows: [row], next: null, total: 1 },
};

describe('the ledger in the store', () => {
  const loaded = reducer(initialLedger, LedgerApi.activityLoaded({ activity }));

  it('keeps the rows and the head of an account apart', () => {
    expect(selectActivityList.projector(loaded.activity)).toMatchObject({
      rows: [{ id: 'e1', balanceCents: 100 }],
      total: 1,
    });
    expect(loaded.activityHead).toMatchObject({ account: '1200', closingBalanceCents: 100 });
  });

  it('keeps the rows while the same account is asked in another order, and none of another account', () => {
    const same = reducer(loaded, LedgerPage.activityOpened({ code: '1200', query: {} }));
    expect(same.activity.ids).toEqual(['e1']);
    const other = reducer(loaded, LedgerPage.activityOpened({ code: '4000', query: {} }));
    expect(other.activity.ids).toEqual([]);
    expect(other.activityHead).toBeNull();
  });
});
