import { accountBalance, trialBalance } from '@bookmatch/common/ledger/balance';
import type { AccountCode } from '@bookmatch/common/ledger/chart-of-accounts';
import type { TrialBalance } from '@bookmatch/common/ledger/ledger-contract';
import type { ShopQuery } from '../../platform/database/shop-query.js';
import type { ShopScope } from '../../platform/database/scope.js';
import { LedgerLine } from './ledger-line.entity.js';

type Sums = { account: AccountCode; debitCents: string | null; creditCents: string | null };
const sumOf = (side: string) => `sum(case when line.side = '${side}' then line.amountCents else 0 end)`;
const SUMS = { debitCents: sumOf('debit'), creditCents: sumOf('credit') };

/** Every account's balance at the end of a day. */
export async function readTrialBalance(scope: ShopScope, on: string): Promise<TrialBalance> {
  const sums = await scope
    .query(LedgerLine, 'line')
    .pick({ account: 'line.account', ...SUMS })
    .where('line.postedOn <= :on', { on })
    .groupBy('line.account')
    .all<Sums>();
  return trialBalance(
    sums.map(({ account, debitCents, creditCents }) => ({
      account,
      debitCents: Number(debitCents),
      creditCents: Number(creditCents),
    })),
    on,
  );
}

/** The balance of one account over the lines that `narrow` leaves, on the account's normal side. */
export async function readBalance(
  scope: ShopScope,
  account: AccountCode,
  narrow: (query: ShopQuery) => void = () => undefined,
): Promise<number> {
  const query = scope.query(LedgerLine, 'line').pick(SUMS).where('line.account = :account', { account });
  narrow(query);
  const sums = await query.first<Sums>();
  return accountBalance(account, Number(sums?.debitCents ?? 0), Number(sums?.creditCents ?? 0));
}
