import * as z from 'zod';
import {
  emailSchema,
  idSchema,
  instantSchema,
  lineSchema,
  notesSchema,
  optionalLineSchema,
  versionSchema,
} from '../wire/fields.js';
import { listQuerySchema, pageSchema } from '../wire/list.js';

export const CUSTOMER_KINDS = ['homeowner', 'contractor', 'designer'] as const;
export const customerKindSchema = z.enum(CUSTOMER_KINDS);
export type CustomerKind = z.infer<typeof customerKindSchema>;

/** A postal address as typed; every part may be empty, since a lead often has only a street. */
export const addressSchema = z.strictObject({
  street: optionalLineSchema(120, 'The street'),
  street2: optionalLineSchema(120, 'The second line'),
  city: optionalLineSchema(80, 'The city'),
  region: optionalLineSchema(40, 'The state'),
  postalCode: optionalLineSchema(20, 'The ZIP code'),
});
export type Address = z.infer<typeof addressSchema>;

const emailOrEmpty = z.union([z.literal(''), emailSchema]).default('');

/** The fields of a customer that a person types. */
export const customerFieldsSchema = z.strictObject({
  kind: customerKindSchema,
  name: lineSchema(120, 'The name'),
  company: optionalLineSchema(120, 'The company'),
  email: emailOrEmpty,
  phone: optionalLineSchema(40, 'The phone number'),
  billingAddress: addressSchema.prefault({}),
  taxExempt: z.boolean().default(false),
  /** The number of the exemption certificate on file; required when exempt. */
  exemptionCertificate: optionalLineSchema(60, 'The certificate number'),
  notes: notesSchema(),
});
const exemptNeedsCertificate = {
  error: 'A tax-exempt customer needs the number of the certificate on file.',
  path: ['exemptionCertificate'],
};
export const createCustomerSchema = customerFieldsSchema.refine(
  (customer) => !customer.taxExempt || customer.exemptionCertificate !== '',
  exemptNeedsCertificate,
);
export type CreateCustomer = z.infer<typeof createCustomerSchema>;
export type CustomerInput = z.input<typeof createCustomerSchema>;

export const siteFieldsSchema = z.strictObject({
  name: lineSchema(120, 'The name'),
  address: addressSchema.prefault({}),
  notes: notesSchema(),
});
export type SiteFields = z.infer<typeof siteFieldsSchema>;
export type SiteInput = z.input<typeof siteFieldsSchema>;

export const customerSchema = z.object({
  id: idSchema,
  version: versionSchema,
  kind: customerKindSchema,
  name: z.string(),
  company: z.string(),
  email: z.string(),
  phone: z.string(),
  billingAddress: addressSchema,
  taxExempt: z.boolean(),
  exemptionCertificate: z.string(),
  notes: z.string(),
  archivedAt: instantSchema.nullable(),
  createdAt: instantSchema,
});
export type Customer = z.infer<typeof customerSchema>;

export const siteSchema = z.object({
  id: idSchema,
  version: versionSchema,
  customerId: idSchema,
  name: z.string(),
  address: addressSchema,
  notes: z.string(),
});
export type Site = z.infer<typeof siteSchema>;

export const customerWithSitesSchema = customerSchema.extend({ sites: z.array(siteSchema) });
export type CustomerWithSites = z.infer<typeof customerWithSitesSchema>;

export const CUSTOMER_SORT_KEYS = ['name', 'createdAt'] as const;
export const customerListQuerySchema = listQuerySchema(CUSTOMER_SORT_KEYS).extend({
  kind: customerKindSchema.optional(),
  archived: z.enum(['no', 'only', 'all']).optional(),
});
export type CustomerListQuery = z.infer<typeof customerListQuerySchema>;

export const customerRowSchema = z.object({
  id: idSchema,
  kind: customerKindSchema,
  name: z.string(),
  company: z.string(),
  email: z.string(),
  phone: z.string(),
  city: z.string(),
  archivedAt: instantSchema.nullable(),
  createdAt: instantSchema,
});
export type CustomerRow = z.infer<typeof customerRowSchema>;
export const customerPageSchema = pageSchema(customerRowSchema);
