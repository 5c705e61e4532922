import * as z from 'zod';
import { addressSchema } from '../customers/customers-contract.js';
import { acceptedDocumentSchema } from '../estimates/accepted-document-contract.js';
import { invoiceStandingSchema, paymentMethodSchema } from '../invoices/invoice-standings.js';
import {
  centsSchema,
  currencySchema,
  dateSchema,
  idSchema,
  instantSchema,
  lineSchema,
  notesSchema,
} from '../wire/fields.js';
import { questionSchema } from './questions-contract.js';

/**
 * What a customer gets behind a link. Nothing here knows costs, hours, margins, members or other customers: the schema
 * itself has no such keys.
 */
export const shopIdentitySchema = z.object({
  name: z.string(),
  phone: z.string(),
  email: z.string(),
  address: addressSchema,
  /** The customer's page shows times in the shop's zone. */
  timeZone: z.string(),
});
export type ShopIdentity = z.infer<typeof shopIdentitySchema>;

/** `superseded`: a newer revision was sent, and the link shows that one as soon as it is opened again. */
export const CUSTOMER_ESTIMATE_STATUSES = ['open', 'expired', 'accepted', 'declined', 'superseded'] as const;

export const customerEstimateSchema = z.object({
  status: z.enum(CUSTOMER_ESTIMATE_STATUSES),
  document: acceptedDocumentSchema,
  /** SHA-256, hex, of the document's canonical text; sent back with the acceptance. */
  documentHash: z.string(),
  questions: z.array(questionSchema),
  acceptance: z.object({ name: z.string(), acceptedAt: instantSchema, documentHash: z.string() }).nullable(),
});
export type CustomerEstimate = z.infer<typeof customerEstimateSchema>;

export const customerInvoiceSchema = z.object({
  number: z.int(),
  customerName: z.string(),
  jobTitle: z.string().nullable(),
  stageName: z.string().nullable(),
  standing: invoiceStandingSchema,
  daysOverdue: z.int(),
  issuedOn: dateSchema,
  dueOn: dateSchema,
  currency: currencySchema,
  lines: z.array(
    z.object({
      description: z.string(),
      quantity: z.string(),
      unitPriceCents: centsSchema,
      amountCents: centsSchema,
    }),
  ),
  netCents: centsSchema,
  taxCents: centsSchema,
  totalCents: centsSchema,
  payments: z.array(
    z.object({ receivedOn: dateSchema, method: paymentMethodSchema, amountCents: centsSchema }),
  ),
  creditedCents: centsSchema,
  paidCents: centsSchema,
  balanceCents: centsSchema,
  /** What the customer paid beyond the debt, and has not got back yet. */
  heldCents: centsSchema,
  memo: z.string(),
  /** The shop takes cards and something is owed. */
  canPayByCard: z.boolean(),
});
export type CustomerInvoice = z.infer<typeof customerInvoiceSchema>;

export const customerPageSchema = z.discriminatedUnion('subject', [
  z.object({ subject: z.literal('estimate'), shop: shopIdentitySchema, estimate: customerEstimateSchema }),
  z.object({ subject: z.literal('invoice'), shop: shopIdentitySchema, invoice: customerInvoiceSchema }),
]);
export type CustomerPage = z.infer<typeof customerPageSchema>;

/** Hash and revision say what was read: if anything changed meanwhile, the acceptance is refused with 409. */
export const acceptEstimateSchema = z.strictObject({
  name: lineSchema(120, 'Your name'),
  revisionId: idSchema,
  documentHash: z.string().regex(/^[0-9a-f]{64}$/, 'Open the estimate again before accepting it.'),
  agreed: z.literal(true, { error: 'Tick the box to say that you accept the estimate.' }),
});
export type AcceptEstimate = z.infer<typeof acceptEstimateSchema>;

export const customerDeclineSchema = z.strictObject({ revisionId: idSchema, reason: notesSchema(1000) });
export type CustomerDecline = z.infer<typeof customerDeclineSchema>;

/** A card pays the whole balance, and the server alone says how much that is. Answers with `redirectSchema`. */
export const startCardPaymentSchema = z.strictObject({});
