import * as z from 'zod';
import { addressSchema } from '../customers/customers-contract.js';
import { centsSchema, currencySchema, dateSchema, idSchema } from '../wire/fields.js';
import { billingDueSchema } from './billing-schedule-contract.js';
import { quantityUnitSchema } from './revision-contract.js';
import { taxRuleSchema } from './tax-rules.js';

/** Changes whenever the document's keys or their meaning change, so that an old hash can still be recomputed. */
export const ACCEPTED_DOCUMENT_FORM = 'bookmatch-estimate-1';

/**
 * The estimate as the customer reads it and accepts it: what the page and the PDF show, and what is hashed. It has no
 * cost, no margin and no hours. All text is given in full, so that the document stands without the database.
 */
export const acceptedDocumentSchema = z.object({
  form: z.literal(ACCEPTED_DOCUMENT_FORM),
  shopName: z.string(),
  customerName: z.string(),
  site: z.object({ name: z.string(), address: addressSchema }).nullable(),
  estimateNumber: z.int(),
  revisionNumber: z.int(),
  revisionId: idSchema,
  title: z.string(),
  currency: currencySchema,
  intro: z.string(),
  rooms: z.array(
    z.object({
      name: z.string(),
      lines: z.array(
        z.object({
          description: z.string(),
          quantity: z.string(),
          unit: quantityUnitSchema,
          unitPriceCents: centsSchema,
          amountCents: centsSchema,
        }),
      ),
      amountCents: centsSchema,
    }),
  ),
  subtotalCents: centsSchema,
  discountCents: centsSchema,
  netCents: centsSchema,
  taxRule: taxRuleSchema,
  taxRate: z.string(),
  taxableCents: centsSchema,
  taxCents: centsSchema,
  totalCents: centsSchema,
  billingSchedule: z.array(
    z.object({
      name: z.string(),
      deposit: z.boolean(),
      due: billingDueSchema,
      netCents: centsSchema,
      taxCents: centsSchema,
      totalCents: centsSchema,
    }),
  ),
  exclusions: z.string(),
  terms: z.string(),
  validUntil: dateSchema,
});
export type AcceptedDocument = z.infer<typeof acceptedDocumentSchema>;
