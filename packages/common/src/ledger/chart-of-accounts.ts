import * as z from 'zod';

export const ACCOUNT_TYPES = ['asset', 'liability', 'income'] as const;
export const accountTypeSchema = z.enum(ACCOUNT_TYPES);
export type AccountType = z.infer<typeof accountTypeSchema>;

export const LEDGER_SIDES = ['debit', 'credit'] as const;
export const ledgerSideSchema = z.enum(LEDGER_SIDES);
export type LedgerSide = z.infer<typeof ledgerSideSchema>;

export const ACCOUNT_CODES = ['1000', '1050', '1200', '2200', '2300', '2350', '4000', '4900'] as const;
export const accountCodeSchema = z.enum(ACCOUNT_CODES, { error: 'There is no such account.' });
export type AccountCode = z.infer<typeof accountCodeSchema>;

export type Account = { code: AccountCode; name: string; type: AccountType; normalSide: LedgerSide };

/** The same for every shop. Only what money events of this program touch; a shop's other books are kept elsewhere. */
export const CHART_OF_ACCOUNTS: readonly Account[] = [
  { code: '1000', name: 'Cash and bank', type: 'asset', normalSide: 'debit' },
  // Cards settle some days later, less fees: until then the money is with the payment provider.
  { code: '1050', name: 'Card clearing', type: 'asset', normalSide: 'debit' },
  { code: '1200', name: 'Accounts receivable', type: 'asset', normalSide: 'debit' },
  { code: '2200', name: 'Sales tax payable', type: 'liability', normalSide: 'credit' },
  { code: '2300', name: 'Customer deposits', type: 'liability', normalSide: 'credit' },
  // Not a deposit: nobody agreed to work for it, and it goes back when the customer asks.
  { code: '2350', name: 'Customer overpayments', type: 'liability', normalSide: 'credit' },
  { code: '4000', name: 'Sales', type: 'income', normalSide: 'credit' },
  // Contra to sales, so that what was sold and what was taken back can both be read.
  { code: '4900', name: 'Credits and allowances', type: 'income', normalSide: 'debit' },
];

export const ACCOUNTS = {
  cashAndBank: '1000',
  cardClearing: '1050',
  accountsReceivable: '1200',
  salesTaxPayable: '2200',
  customerDeposits: '2300',
  customerOverpayments: '2350',
  sales: '4000',
  creditsAndAllowances: '4900',
} as const satisfies Record<string, AccountCode>;
