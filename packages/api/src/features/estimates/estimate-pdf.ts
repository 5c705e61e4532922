import { formatDate, formatInstant } from '@bookmatch/common/calendar/format';
import { dateIn } from '@bookmatch/common/calendar/shop-dates';
import type { AcceptedDocument } from '@bookmatch/common/estimates/accepted-document-contract';
import type { Content } from 'pdfmake/interfaces.js';
import type { ShopScope } from '../../platform/database/scope.js';
import { addressLines, letterhead, type Fact } from '../../platform/documents/letterhead.js';
import { renderPdf } from '../../platform/documents/render-pdf.js';
import { Customer } from '../customers/customers-public.js';
import { shopOf, type Shop } from '../shops/shops-public.js';
import { EstimateAcceptance } from './estimate-acceptance.entity.js';
import { documentOf } from './estimate-document.js';
import { pricePages } from './estimate-pages.js';
import { EstimateRevision } from './estimate-revision.entity.js';
import { Estimate } from './estimate.entity.js';

/** A revision as pages: the frozen document of one that was sent, or what a draft would be. */
export async function estimatePdf(scope: ShopScope, revisionId: string) {
  const revision = await scope.rows(EstimateRevision).get(revisionId);
  const estimate = await scope.rows(Estimate).get(revision.estimateId);
  const shop = await shopOf(scope);
  const customer = await scope.rows(Customer).get(estimate.customerId);
  const acceptance = await scope.rows(EstimateAcceptance).findOneBy({ revisionId });
  const document = await documentOf(scope, estimate, revision);
  const title = `Estimate ${document.estimateNumber}, revision ${document.revisionNumber}`;
  const writtenAt = revision.sentAt ?? scope.now;
  const content = [
    ...letterhead(shop, `Estimate ${document.estimateNumber}`, recipientOf(document, customer), [
      ...factsOf(document, dateIn(shop.timeZone, writtenAt.toISOString())),
    ]),
    ...(revision.status === 'draft' ? [draftNote()] : []),
    ...pricePages(document),
    ...(acceptance ? [acceptedNote(acceptance, shop)] : []),
  ];
  return {
    name: `${title}.pdf`,
    type: 'application/pdf',
    inline: true,
    body: await renderPdf(title, document.shopName, content, writtenAt),
  };
}

function recipientOf({ customerName }: AcceptedDocument, customer: Customer): string[] {
  return [customerName, customer.company, ...addressLines(customer.billingAddress)];
}

function factsOf(document: AcceptedDocument, date: string): Fact[] {
  const place = document.site && [document.site.name, ...addressLines(document.site.address)].join('\n');
  return [
    { label: 'Revision', value: String(document.revisionNumber) },
    { label: 'Date', value: formatDate(date) },
    { label: 'Valid until', value: formatDate(document.validUntil) },
    ...(place ? [{ label: 'Site', value: place }] : []),
  ];
}

function draftNote(): Content {
  return { text: 'Draft. Not sent to the customer yet.', bold: true, margin: [0, 0, 0, 10] };
}

/** Who accepted it, and by what the accepted text can be told again. */
function acceptedNote({ name, createdAt, documentHash }: EstimateAcceptance, shop: Shop): Content {
  return {
    unbreakable: true,
    stack: [
      { text: 'Accepted', style: 'heading' },
      { text: `${name}, ${formatInstant(createdAt.toISOString(), shop.timeZone)}` },
      { text: `SHA-256 of the accepted text: ${documentHash}`, style: 'small', margin: [0, 2, 0, 0] },
    ],
  };
}
