import { agingQuerySchema, agingSchema } from '@bookmatch/common/invoices/aging-contract';
import {
  createInvoiceSchema,
  creditInvoiceSchema,
  invoiceListQuerySchema,
  invoiceListTotalsSchema,
  invoicePageSchema,
  invoiceSchema,
  invoiceTotalsQuerySchema,
  issueInvoiceSchema,
  recordPaymentSchema,
  refundOverpaymentSchema,
  sendDocumentSchema,
  sendInvoiceSchema,
  updateInvoiceSchema,
} from '@bookmatch/common/invoices/invoices-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { shopRoute, type Route } from '../../platform/http/route.js';
import { todayOf } from '../shops/shops-public.js';
import { creditNoteDocument, invoiceDocument } from './invoice-documents.js';
import { exportAging, exportInvoices } from './invoice-exports.js';
import type { InvoiceServices } from './invoice-services.js';
import { listInvoices } from './invoice-lists.js';
import { readInvoice } from './invoice-view.js';
import { readAging, readTotals } from './receivables.js';

const today = async (scope: ShopScope) => await todayOf(scope);

export function invoicesRoutes(services: InvoiceServices): Route[] {
  return [...readingRoutes(), ...draftRoutes(services), ...commandRoutes(services)];
}

function readingRoutes(): Route[] {
  return [
    shopRoute({
      method: 'get',
      path: '/invoices',
      summary: 'List invoices',
      allow: ['read', 'Invoice'],
      query: invoiceListQuerySchema,
      answer: invoicePageSchema,
      handle: ({ scope, query }) => listInvoices(scope, query),
    }),
    shopRoute({
      method: 'get',
      path: '/invoices/totals',
      summary: 'Read what is owed in all, by age, and the drafts',
      allow: ['read', 'Invoice'],
      query: invoiceTotalsQuerySchema,
      answer: invoiceListTotalsSchema,
      handle: async ({ scope, query }) => readTotals(scope, query, await today(scope)),
    }),
    shopRoute({
      method: 'get',
      path: '/invoices/aging',
      summary: 'Read what each customer owes, by age',
      allow: ['read', 'Invoice'],
      query: agingQuerySchema,
      answer: agingSchema,
      handle: async ({ scope, query }) => readAging(scope, query.on ?? (await today(scope))),
    }),
    shopRoute({
      method: 'get',
      path: '/invoices/aging/export',
      summary: 'Export what each customer owes as CSV',
      allow: ['export', 'Invoice'],
      query: agingQuerySchema,
      handle: async ({ scope, query }) => exportAging(scope, query.on ?? (await today(scope))),
    }),
    shopRoute({
      method: 'get',
      path: '/invoices/export',
      summary: 'Export the list of invoices as CSV',
      allow: ['export', 'Invoice'],
      query: invoiceListQuerySchema,
      handle: async ({ scope, query }) => exportInvoices(scope, query),
    }),
    shopRoute({
      method: 'get',
      path: '/invoices/:id',
      summary: 'Read an invoice with its lines, payments, credit notes and letters',
      allow: ['read', 'Invoice'],
      answer: invoiceSchema,
      handle: ({ scope, params }) => readInvoice(scope, params.id),
    }),
    shopRoute({
      method: 'get',
      path: '/invoices/:id/pdf',
      summary: 'Read an invoice as PDF',
      allow: ['read', 'Invoice'],
      handle: async ({ scope, params }) => ({ download: await invoiceDocument(scope, params.id) }),
    }),
    shopRoute({
      method: 'get',
      path: '/credit-notes/:id/pdf',
      summary: 'Read a credit note as PDF',
      allow: ['read', 'Invoice'],
      handle: async ({ scope, params }) => ({ download: await creditNoteDocument(scope, params.id) }),
    }),
  ];
}

function draftRoutes({ drafts }: InvoiceServices): Route[] {
  return [
    shopRoute({
      method: 'post',
      path: '/invoices',
      summary: 'Draft an invoice from a billing stage or with lines of its own',
      allow: ['create', 'Invoice'],
      body: createInvoiceSchema,
      answer: invoiceSchema,
      status: 201,
      handle: async ({ scope, body }) => readInvoice(scope, (await drafts.create(scope, body)).id),
    }),
    shopRoute({
      method: 'patch',
      path: '/invoices/:id',
      summary: 'Change a draft',
      allow: ['update', 'Invoice'],
      versioned: true,
      body: updateInvoiceSchema,
      answer: invoiceSchema,
      async handle({ scope, params, body, version }) {
        await drafts.update(scope, params.id, body, version);
        return readInvoice(scope, params.id);
      },
    }),
    shopRoute({
      method: 'delete',
      path: '/invoices/:id',
      summary: 'Delete a draft',
      allow: ['delete', 'Invoice'],
      versioned: true,
      status: 204,
      handle: ({ scope, params, version }) => drafts.remove(scope, params.id, version),
    }),
  ];
}

/** Each answers the whole invoice as it stands afterwards. */
function commandRoutes({ issuing, payments, credits, letters }: InvoiceServices): Route[] {
  return [
    shopRoute({
      method: 'post',
      path: '/invoices/:id/issue',
      summary: 'Issue a draft: number, dates and the books',
      allow: ['issue', 'Invoice'],
      versioned: true,
      body: issueInvoiceSchema,
      answer: invoiceSchema,
      async handle({ scope, params, version }) {
        await issuing.issue(scope, params.id, version);
        return readInvoice(scope, params.id);
      },
    }),
    shopRoute({
      method: 'post',
      path: '/invoices/:id/send',
      summary: 'Send an invoice by e-mail, with its PDF and the link to pay it',
      allow: ['send', 'Invoice'],
      versioned: true,
      body: sendInvoiceSchema,
      answer: invoiceSchema,
      async handle({ scope, params, body, version }) {
        await letters.sendInvoice(scope, params.id, body, version);
        return readInvoice(scope, params.id);
      },
    }),
    shopRoute({
      method: 'post',
      path: '/invoices/:id/payments',
      summary: 'Record a payment by check, cash or transfer',
      allow: ['create', 'Payment'],
      versioned: true,
      body: recordPaymentSchema,
      answer: invoiceSchema,
      status: 201,
      async handle({ scope, params, body, version }) {
        await payments.record(scope, params.id, body, version);
        return readInvoice(scope, params.id);
      },
    }),
    shopRoute({
      method: 'post',
      path: '/invoices/:id/refunds',
      summary: 'Record that money beyond the debt was given back',
      allow: ['create', 'Payment'],
      versioned: true,
      body: refundOverpaymentSchema,
      answer: invoiceSchema,
      status: 201,
      async handle({ scope, params, body, version }) {
        await payments.refund(scope, params.id, body, version);
        return readInvoice(scope, params.id);
      },
    }),
    shopRoute({
      method: 'post',
      path: '/invoices/:id/credit-notes',
      summary: 'Credit an invoice, whole or in part',
      allow: ['credit', 'Invoice'],
      versioned: true,
      body: creditInvoiceSchema,
      answer: invoiceSchema,
      status: 201,
      async handle({ scope, params, body, version }) {
        await credits.credit(scope, params.id, body, version);
        return readInvoice(scope, params.id);
      },
    }),
    shopRoute({
      method: 'post',
      path: '/credit-notes/:id/send',
      summary: 'Send a credit note by e-mail',
      allow: ['send', 'Invoice'],
      body: sendDocumentSchema,
      status: 204,
      handle: ({ scope, params, body }) => letters.sendCreditNote(scope, params.id, body.to),
    }),
  ];
}
