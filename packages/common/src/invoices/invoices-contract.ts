import * as z from 'zod';
import { MAX_PRICE_CENTS } from '../money/cents.js';
import {
  centsSchema,
  dateSchema,
  decimalSchema,
  emailSchema,
  idSchema,
  instantSchema,
  lineSchema,
  notesSchema,
  optionalLineSchema,
  paragraphSchema,
  positiveCentsSchema,
  rateSchema,
  versionSchema,
} from '../wire/fields.js';
import { listQuerySchema, pageSchema } from '../wire/list.js';
import { agingBucketsSchema } from './aging-contract.js';
import {
  invoiceKindSchema,
  invoiceStandingSchema,
  invoiceStatusSchema,
  paymentKindSchema,
  paymentMethodSchema,
  recordedMethodSchema,
} from './invoice-standings.js';

/** A line as typed. A price below zero takes something off; the invoice as a whole stays above zero. */
export const invoiceLineSchema = z.strictObject({
  id: idSchema,
  description: lineSchema(300, 'The description'),
  quantity: decimalSchema(3, { max: 100_000 }),
  unitPriceCents: centsSchema
    .min(-100_000_000, 'Give at most $1,000,000 a unit.')
    .max(100_000_000, 'Give at most $1,000,000 a unit.'),
  taxable: z.boolean(),
});
export type InvoiceLine = z.infer<typeof invoiceLineSchema>;

const linesSchema = z
  .array(invoiceLineSchema)
  .max(200, 'An invoice can have at most 200 lines.')
  .refine(
    (lines) => new Set(lines.map((line) => line.id)).size === lines.length,
    'Every line needs an id of its own.',
  )
  .refine((lines) => upperBound(lines) <= MAX_PRICE_CENTS, 'An invoice can be at most $40,000,000.');

/** Keeps every sum of an invoice inside MAX_CENTS; no rounding is done here. */
function upperBound(lines: InvoiceLine[]): number {
  return lines.reduce((sum, line) => sum + Number(line.quantity) * Math.abs(line.unitPriceCents), 0);
}

/**
 * A draft comes from a stage of a job's billing schedule, whose net and tax it takes over as they were accepted, or it
 * is free: lines of its own, for a customer or for more work on a job.
 */
export const createInvoiceSchema = z.discriminatedUnion('from', [
  z.strictObject({ from: z.literal('stage'), jobId: idSchema, billingStageId: idSchema }),
  z.strictObject({
    from: z.literal('lines'),
    customerId: idSchema,
    jobId: idSchema.nullable().default(null),
    lines: linesSchema,
    taxRate: rateSchema,
    memo: notesSchema(2000),
  }),
]);
export type CreateInvoice = z.infer<typeof createInvoiceSchema>;
export type CreateInvoiceInput = z.input<typeof createInvoiceSchema>;

/** Lines and tax rate can be changed on a free draft only: a stage's amounts were agreed with the customer. */
export const updateInvoiceSchema = z.strictObject({
  memo: z.string().trim().max(2000, 'This can have at most 2000 characters.').optional(),
  /** Null: counted from the day of issue by the shop's days. */
  dueOn: dateSchema.nullable().optional(),
  lines: linesSchema.optional(),
  taxRate: rateSchema.optional(),
});
export type UpdateInvoice = z.infer<typeof updateInvoiceSchema>;

// Commands. Each carries If-Match.

/** Gives the number and the dates, today in the shop's zone, and books it. Nothing of it changes afterwards. */
export const issueInvoiceSchema = z.strictObject({});

export const sendInvoiceSchema = z.strictObject({ to: emailSchema, message: notesSchema(2000) });
export type SendInvoice = z.infer<typeof sendInvoiceSchema>;

export const recordPaymentSchema = z.strictObject({
  method: recordedMethodSchema,
  amountCents: positiveCentsSchema,
  receivedOn: dateSchema,
  /** The check's number, the transfer's text. */
  reference: optionalLineSchema(80, 'The reference'),
});
export type RecordPayment = z.infer<typeof recordPaymentSchema>;

/** A payment is never changed: a wrong one is taken back by a record of its own, then entered again. */
export const reversePaymentSchema = z.strictObject({ reason: paragraphSchema(300, 'The reason') });
export type ReversePayment = z.infer<typeof reversePaymentSchema>;

/** What came beyond the debt is given back, by whatever way. */
export const refundOverpaymentSchema = z.strictObject({
  method: paymentMethodSchema,
  amountCents: positiveCentsSchema,
  /** The day it went out. */
  paidOn: dateSchema,
  reference: optionalLineSchema(80, 'The reference'),
});
export type RefundOverpayment = z.infer<typeof refundOverpaymentSchema>;

/** An amount with its tax, or the whole open balance when left out. What was paid is refunded, not credited. */
export const creditInvoiceSchema = z.strictObject({
  amountCents: positiveCentsSchema.optional(),
  reason: paragraphSchema(500, 'The reason'),
});
export type CreditInvoice = z.infer<typeof creditInvoiceSchema>;

/** To whom a credit note or a receipt goes; the words are the letter's own. */
export const sendDocumentSchema = z.strictObject({ to: emailSchema });
export type SendDocument = z.infer<typeof sendDocumentSchema>;

export const paymentSchema = z.object({
  id: idSchema,
  kind: paymentKindSchema,
  method: paymentMethodSchema,
  /** Below zero in a reversal and in a refund. */
  amountCents: centsSchema,
  /** The part that pays the invoice; the rest was more than was owed and is held for the customer. */
  appliedCents: centsSchema,
  receivedOn: dateSchema,
  reference: z.string(),
  reversesId: idSchema.nullable(),
  reversedById: idSchema.nullable(),
  /** Why it was taken back; empty otherwise. */
  reason: z.string(),
  /** Null when the payment provider's word recorded it. */
  recordedBy: z.string().nullable(),
  createdAt: instantSchema,
});
export type Payment = z.infer<typeof paymentSchema>;

export const creditNoteSchema = z.object({
  id: idSchema,
  number: z.int(),
  issuedOn: dateSchema,
  netCents: centsSchema,
  taxCents: centsSchema,
  amountCents: centsSchema,
  reason: z.string(),
});
export type CreditNote = z.infer<typeof creditNoteSchema>;

/** What a letter about an invoice carries. */
export const INVOICE_DOCUMENT_KINDS = ['invoice', 'credit-note', 'payment-receipt'] as const;
export const invoiceDocumentKindSchema = z.enum(INVOICE_DOCUMENT_KINDS);
export type InvoiceDocumentKind = z.infer<typeof invoiceDocumentKindSchema>;

export const invoiceSendSchema = z.object({
  id: idSchema,
  document: invoiceDocumentKindSchema,
  to: z.string(),
  sentAt: instantSchema,
});
export type InvoiceSend = z.infer<typeof invoiceSendSchema>;

const amounts = {
  netCents: centsSchema,
  taxCents: centsSchema,
  totalCents: centsSchema,
  paidCents: centsSchema,
  creditedCents: centsSchema,
  /** What is owed: zero while it is a draft. */
  balanceCents: centsSchema,
  /** What came by card beyond what was owed, and was not given back yet. */
  overpaidCents: centsSchema,
};
const place = {
  status: invoiceStatusSchema,
  standing: invoiceStandingSchema,
  /** Whole days past the due date; 0 unless overdue. */
  daysOverdue: z.int(),
  kind: invoiceKindSchema,
  issuedOn: dateSchema.nullable(),
  dueOn: dateSchema.nullable(),
};

export const invoiceSchema = z.object({
  id: idSchema,
  version: versionSchema,
  /** Null until it is issued. */
  number: z.int().nullable(),
  ...place,
  customer: z.object({ id: idSchema, name: z.string(), email: z.string() }),
  job: z.object({ id: idSchema, number: z.int(), title: z.string() }).nullable(),
  billingStage: z.object({ id: idSchema, name: z.string() }).nullable(),
  lines: z.array(z.object({ ...invoiceLineSchema.shape, amountCents: centsSchema })),
  /** Null when the tax is the stage's agreed share and not a rate on the lines. */
  taxRate: z.string().nullable(),
  ...amounts,
  memo: z.string(),
  payments: z.array(paymentSchema),
  creditNotes: z.array(creditNoteSchema),
  sends: z.array(invoiceSendSchema),
  /** What must be put right before it can be issued; empty when nothing, and once it is issued. */
  issueRefusals: z.array(z.string()),
  createdAt: instantSchema,
});
export type Invoice = z.infer<typeof invoiceSchema>;

export const invoiceRowSchema = z.object({
  id: idSchema,
  number: z.int().nullable(),
  ...place,
  customerId: idSchema,
  customerName: z.string(),
  jobId: idSchema.nullable(),
  jobNumber: z.int().nullable(),
  stageName: z.string().nullable(),
  createdAt: instantSchema,
  totalCents: centsSchema,
  balanceCents: centsSchema,
  overpaidCents: centsSchema,
});
export type InvoiceRow = z.infer<typeof invoiceRowSchema>;
export const invoicePageSchema = pageSchema(invoiceRowSchema);

export const INVOICE_SORT_KEYS = ['number', 'issuedOn', 'dueOn', 'createdAt'] as const;
export const invoiceListQuerySchema = listQuerySchema(INVOICE_SORT_KEYS).extend({
  /** A standing, or `open` for everything issued that is still owed. */
  standing: z.enum(['draft', 'open', 'overdue', 'paid', 'credited']).optional(),
  customerId: idSchema.optional(),
  jobId: idSchema.optional(),
  issuedFrom: dateSchema.optional(),
  issuedTo: dateSchema.optional(),
});
export type InvoiceListQuery = z.infer<typeof invoiceListQuerySchema>;

/** The head of the list: all that is owed by age, for the whole shop or one customer or job. */
export const invoiceTotalsQuerySchema = z.strictObject({
  customerId: idSchema.optional(),
  jobId: idSchema.optional(),
});
export type InvoiceTotalsQuery = z.infer<typeof invoiceTotalsQuerySchema>;
export const invoiceListTotalsSchema = z.object({
  on: dateSchema,
  aging: agingBucketsSchema,
  overdueCents: centsSchema,
  openCount: z.int(),
  overdueCount: z.int(),
  draftCents: centsSchema,
  draftCount: z.int(),
});
export type InvoiceListTotals = z.infer<typeof invoiceListTotalsSchema>;

/** Every payment of the shop, newest first: what the bookkeeper lays beside the bank's list. */
export const paymentRowSchema = paymentSchema.extend({
  invoiceId: idSchema,
  invoiceNumber: z.int(),
  customerName: z.string(),
});
export type PaymentRow = z.infer<typeof paymentRowSchema>;
export const paymentPageSchema = pageSchema(paymentRowSchema);
export const paymentListQuerySchema = listQuerySchema(['receivedOn']).extend({
  method: paymentMethodSchema.optional(),
  from: dateSchema.optional(),
  to: dateSchema.optional(),
});
export type PaymentListQuery = z.infer<typeof paymentListQuerySchema>;
