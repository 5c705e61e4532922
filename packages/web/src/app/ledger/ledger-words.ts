import { CHART_OF_ACCOUNTS, type AccountCode } from '@bookmatch/common/ledger/chart-of-accounts';
import type { EntryKind } from '@bookmatch/common/ledger/ledger-contract';

export const ENTRY_KIND_NAMES: Record<EntryKind, string> = {
  'deposit-invoice': 'Deposit invoice',
  invoice: 'Invoice',
  'deposit-earned': 'Deposit earned',
  payment: 'Payment',
  'payment-reversal': 'Payment taken back',
  refund: 'Refund',
  'credit-note': 'Credit note',
};

export const ACCOUNT_TYPE_NAMES = { asset: 'Asset', liability: 'Liability', income: 'Income' } as const;

const NAMES = new Map(CHART_OF_ACCOUNTS.map(({ code, name }) => [code, name]));

/** `1200 Accounts receivable` */
export function accountName(code: AccountCode): string {
  return `${code} ${NAMES.get(code) ?? ''}`;
}
