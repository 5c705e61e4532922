import * as z from 'zod';
import { centsSchema, dateSchema, idSchema, instantSchema, positiveCentsSchema } from '../wire/fields.js';
import { listQuerySchema, pageSchema } from '../wire/list.js';
import { accountCodeSchema, accountTypeSchema, ledgerSideSchema } from './chart-of-accounts.js';

export const ENTRY_KINDS = [
  'deposit-invoice',
  'invoice',
  'deposit-earned',
  'payment',
  'payment-reversal',
  'refund',
  'credit-note',
] as const;
export const entryKindSchema = z.enum(ENTRY_KINDS);
export type EntryKind = z.infer<typeof entryKindSchema>;

/** What the entry was made for; one entry of a kind for a source. */
export const ENTRY_SOURCES = ['invoice', 'payment', 'credit-note'] as const;
export const entrySourceSchema = z.object({ kind: z.enum(ENTRY_SOURCES), id: idSchema });
export type EntrySource = z.infer<typeof entrySourceSchema>;

export const ledgerLineSchema = z.object({
  account: accountCodeSchema,
  side: ledgerSideSchema,
  /** Always above zero; the side says which way. */
  amountCents: positiveCentsSchema,
  customerId: idSchema.nullable(),
  jobId: idSchema.nullable(),
});
export type LedgerLine = z.infer<typeof ledgerLineSchema>;

/** Never changed and never deleted. A mistake is put right by a document of its own, which makes its own entry. */
export const ledgerEntrySchema = z.object({
  id: idSchema,
  number: z.int(),
  on: dateSchema,
  kind: entryKindSchema,
  memo: z.string(),
  lines: z.array(ledgerLineSchema).min(2),
  source: entrySourceSchema,
  /** The invoice it is about, whatever it was made for. */
  invoiceId: idSchema,
  createdAt: instantSchema,
});
export type LedgerEntry = z.infer<typeof ledgerEntrySchema>;
export const ledgerPageSchema = pageSchema(ledgerEntrySchema);

export const LEDGER_SORT_KEYS = ['number'] as const;
export const ledgerListQuerySchema = listQuerySchema(LEDGER_SORT_KEYS).extend({
  kind: entryKindSchema.optional(),
  customerId: idSchema.optional(),
  jobId: idSchema.optional(),
  invoiceId: idSchema.optional(),
  from: dateSchema.optional(),
  to: dateSchema.optional(),
});
export type LedgerListQuery = z.infer<typeof ledgerListQuerySchema>;

/** The whole ledger, or what counts between two days. */
export const ledgerExportQuerySchema = z.strictObject({
  from: dateSchema.optional(),
  to: dateSchema.optional(),
});
export type LedgerExportQuery = z.infer<typeof ledgerExportQuerySchema>;

export const trialBalanceQuerySchema = z.strictObject({
  /** Everything up to the end of this day; today when left out. */
  on: dateSchema.optional(),
});
export type TrialBalanceQuery = z.infer<typeof trialBalanceQuerySchema>;

export const trialBalanceRowSchema = z.object({
  account: accountCodeSchema,
  name: z.string(),
  type: accountTypeSchema,
  normalSide: ledgerSideSchema,
  /** The balance stands on one side; the other is zero. */
  debitCents: centsSchema,
  creditCents: centsSchema,
});
export type TrialBalanceRow = z.infer<typeof trialBalanceRowSchema>;

export const trialBalanceSchema = z.object({
  on: dateSchema,
  rows: z.array(trialBalanceRowSchema),
  debitCents: centsSchema,
  creditCents: centsSchema,
});
export type TrialBalance = z.infer<typeof trialBalanceSchema>;

/** What happened on one account, oldest first. */
export const accountActivityQuerySchema = listQuerySchema(LEDGER_SORT_KEYS)
  .omit({ q: true })
  .extend({ from: dateSchema.optional(), to: dateSchema.optional(), customerId: idSchema.optional() });
export type AccountActivityQuery = z.infer<typeof accountActivityQuerySchema>;

export const accountActivityRowSchema = z.object({
  entryId: idSchema,
  entryNumber: z.int(),
  on: dateSchema,
  kind: entryKindSchema,
  memo: z.string(),
  source: entrySourceSchema,
  invoiceId: idSchema,
  side: ledgerSideSchema,
  amountCents: centsSchema,
  /** The account's balance after this line, on its normal side. */
  balanceCents: centsSchema,
});
export type AccountActivityRow = z.infer<typeof accountActivityRowSchema>;

/** Balances are on the account's normal side: below zero when it stands on the other. */
export const accountActivitySchema = pageSchema(accountActivityRowSchema).extend({
  account: accountCodeSchema,
  name: z.string(),
  normalSide: ledgerSideSchema,
  openingBalanceCents: centsSchema,
  closingBalanceCents: centsSchema,
});
export type AccountActivity = z.infer<typeof accountActivitySchema>;
