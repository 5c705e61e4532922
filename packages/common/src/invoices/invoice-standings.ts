import * as z from 'zod';

/** What is stored. Everything else about where an invoice stands is derived from its amounts and the day. */
export const INVOICE_STATUSES = ['draft', 'issued', 'paid', 'credited'] as const;
export const invoiceStatusSchema = z.enum(INVOICE_STATUSES);
export type InvoiceStatus = z.infer<typeof invoiceStatusSchema>;

/** What is shown. `overdue` wins over `part-paid`: what is late matters more than that some came. */
export const INVOICE_STANDINGS = ['draft', 'due', 'part-paid', 'overdue', 'paid', 'credited'] as const;
export const invoiceStandingSchema = z.enum(INVOICE_STANDINGS);
export type InvoiceStanding = z.infer<typeof invoiceStandingSchema>;

export const INVOICE_KINDS = ['deposit', 'progress', 'final', 'other'] as const;
export const invoiceKindSchema = z.enum(INVOICE_KINDS);
export type InvoiceKind = z.infer<typeof invoiceKindSchema>;

export const PAYMENT_METHODS = ['card', 'check', 'cash', 'transfer'] as const;
export const paymentMethodSchema = z.enum(PAYMENT_METHODS);
export type PaymentMethod = z.infer<typeof paymentMethodSchema>;

/** The ways a person can record by hand; a card payment is recorded by the payment provider's word only. */
export const RECORDED_METHODS = ['check', 'cash', 'transfer'] as const;
export const recordedMethodSchema = z.enum(RECORDED_METHODS, { error: 'Choose how it was paid.' });
export type RecordedMethod = z.infer<typeof recordedMethodSchema>;

/** What a record of money is: received, a wrong record taken back, or what came beyond the debt given back. */
export const PAYMENT_KINDS = ['payment', 'reversal', 'refund'] as const;
export const paymentKindSchema = z.enum(PAYMENT_KINDS);
export type PaymentKind = z.infer<typeof paymentKindSchema>;
