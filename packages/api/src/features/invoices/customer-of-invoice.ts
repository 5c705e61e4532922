import type { ShopScope } from '../../platform/database/scope.js';
import { conflict } from '../../platform/http/problem-error.js';
import { Invoice } from './invoice.entity.js';

/** Whom a link to the invoice is for. @throws conflict while it is a draft */
export async function customerOfInvoice(scope: ShopScope, id: string): Promise<string> {
  const { status, customerId } = await scope.rows(Invoice).get(id);
  if (status === 'draft') throw conflict('Issue the invoice before you hand out a link to it.');
  return customerId;
}
