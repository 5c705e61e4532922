import { createHash } from 'node:crypto';
import { acceptedDocument, acceptedText } from '@bookmatch/common/estimates/accepted-document';
import type { AcceptedDocument } from '@bookmatch/common/estimates/accepted-document-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { Customer, Site } from '../customers/customers-public.js';
import { shopOf } from '../shops/shops-public.js';
import type { EstimateRevision } from './estimate-revision.entity.js';
import type { Estimate } from './estimate.entity.js';
import { loadContent } from './revision-content.js';

/** The estimate as the customer reads it: as it was frozen when it was sent, or as a draft would be sent now. */
export async function documentOf(
  scope: ShopScope,
  estimate: Estimate,
  revision: EstimateRevision,
): Promise<AcceptedDocument> {
  if (revision.document) return revision.document;
  const shop = await shopOf(scope);
  const customer = await scope.rows(Customer).get(estimate.customerId);
  const site = estimate.siteId === null ? null : await scope.rows(Site).get(estimate.siteId);
  const frame = {
    shopName: shop.name,
    customerName: customer.name,
    site: site && { name: site.name, address: site.address },
    estimateNumber: estimate.number,
    revisionNumber: revision.number,
    revisionId: revision.id,
    title: estimate.title,
    currency: shop.currency,
  };
  return acceptedDocument(frame, await loadContent(scope, revision));
}

/** SHA-256, hex, of the document's canonical text. */
export function hashOf(document: AcceptedDocument): string {
  return createHash('sha256').update(acceptedText(document)).digest('hex');
}
