import {
  invoiceSchema,
  paymentListQuerySchema,
  paymentPageSchema,
  reversePaymentSchema,
  sendDocumentSchema,
} from '@bookmatch/common/invoices/invoices-contract';
import { shopRoute, type Route } from '../../platform/http/route.js';
import { receiptDocument } from './invoice-documents.js';
import { exportPayments } from './invoice-exports.js';
import { readInvoice } from './invoice-view.js';
import type { InvoiceServices } from './invoice-services.js';
import { listPayments } from './payment-lists.js';

export function paymentsRoutes({ payments, letters }: InvoiceServices): Route[] {
  return [
    shopRoute({
      method: 'get',
      path: '/payments',
      summary: 'List payments',
      allow: ['read', 'Payment'],
      query: paymentListQuerySchema,
      answer: paymentPageSchema,
      handle: ({ scope, query }) => listPayments(scope, query),
    }),
    shopRoute({
      method: 'get',
      path: '/payments/export',
      summary: 'Export payments as CSV',
      allow: ['export', 'Payment'],
      query: paymentListQuerySchema,
      handle: async ({ scope, query }) => exportPayments(scope, query),
    }),
    shopRoute({
      method: 'get',
      path: '/payments/:id/pdf',
      summary: 'Read the receipt of a payment as PDF',
      allow: ['read', 'Payment'],
      handle: async ({ scope, params }) => ({ download: await receiptDocument(scope, params.id) }),
    }),
    shopRoute({
      method: 'post',
      path: '/payments/:id/reverse',
      summary: 'Take a wrongly recorded payment back',
      allow: ['correct', 'Payment'],
      body: reversePaymentSchema,
      answer: invoiceSchema,
      status: 201,
      async handle({ scope, params, body }) {
        const { invoiceId } = await payments.reverse(scope, params.id, body);
        return readInvoice(scope, invoiceId);
      },
    }),
    shopRoute({
      method: 'post',
      path: '/payments/:id/send',
      summary: 'Send the receipt of a payment by e-mail',
      allow: ['send', 'Invoice'],
      body: sendDocumentSchema,
      status: 204,
      handle: ({ scope, params, body }) => letters.sendReceipt(scope, params.id, body.to),
    }),
  ];
}
