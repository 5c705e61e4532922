import {
  customerInvoiceSchema,
  startCardPaymentSchema,
} from '@bookmatch/common/customer-page/customer-page-contract';
import { emptyBodySchema, redirectSchema } from '@bookmatch/common/wire/fields';
import { linkRoute, type Route } from '../../platform/http/route.js';
import { customerInvoice, invoiceDocument, type CardPayments } from '../invoices/invoices-public.js';
import type { CustomerLinks } from './customer-links.js';

/** What the address of the page says after the provider's page sent the customer back; the screen reads it. */
const BACK = { paid: '?payment=made', canceled: '?payment=canceled' } as const;

export type InvoicePageServices = { links: CustomerLinks; cards: CardPayments };

export function invoicePageRoutes({ links, cards }: InvoicePageServices): Route[] {
  return [
    linkRoute({
      method: 'get',
      path: '/invoice.pdf',
      summary: 'The invoice as a PDF',
      allow: 'invoice-link',
      handle: async ({ scope, link }) => ({ download: await invoiceDocument(scope, link.subjectId) }),
    }),
    linkRoute({
      method: 'post',
      path: '/card-payments',
      summary: 'Open the payment provider’s page for all that is owed',
      allow: 'invoice-link',
      body: startCardPaymentSchema,
      answer: redirectSchema,
      // A page that is open already is given again.
      repeat: 'natural',
      // Calls the provider between two transactions.
      transaction: 'own',
      handle({ link, stamp }) {
        const page = links.addressOf(link.id);
        const back = { paid: page + BACK.paid, canceled: page + BACK.canceled };
        return cards.start({ stamp, shopId: link.shopId, invoiceId: link.subjectId, linkId: link.id, back });
      },
    }),
    linkRoute({
      method: 'post',
      path: '/card-payments/check',
      summary: 'Ask the payment provider whether a payment has come through',
      allow: 'invoice-link',
      body: emptyBodySchema,
      answer: customerInvoiceSchema,
      // Only asks; what is settled is settled once.
      repeat: 'natural',
      transaction: 'own',
      async handle({ link, stamp, scope }) {
        await cards.check({ stamp, shopId: link.shopId, invoiceId: link.subjectId });
        return customerInvoice(scope, link.subjectId);
      },
    }),
  ];
}
