import type { LeadListQuery, LeadRow } from '@bookmatch/common/leads/leads-contract';
import type { Page } from '@bookmatch/common/wire/list';
import type { ShopScope } from '../../platform/database/scope.js';
import type { ShopQuery } from '../../platform/database/shop-query.js';
import { keysetPage } from '../../platform/http/keyset.js';
import { leadConditions } from './lead-filters.js';
import { seesMoney } from './lead-view.js';
import { Lead } from './lead.entity.js';

export type StoredLeadRow = Omit<LeadRow, 'createdAt'> & { createdAt: Date };

const PAGING = {
  id: 'lead.id',
  sorts: { title: 'lead.title', nextStepOn: 'lead.nextStepOrder', createdAt: 'lead.createdAt' },
  standard: '-createdAt',
} as const;

/** The list of leads. By next step, those without one come last. */
export async function listLeads(scope: ShopScope, request: LeadListQuery): Promise<Page<LeadRow>> {
  const query = leadRows(scope);
  for (const { sql, parameters } of await leadConditions(scope, request)) query.where(sql, parameters);
  const page = await keysetPage<StoredLeadRow, keyof typeof PAGING.sorts>(query, PAGING, request);
  return { ...page, rows: page.rows.map(viewLeadRow) };
}

/** Rows of the alias `lead` as lists, cards and first pages show them. */
export function leadRows(scope: ShopScope): ShopQuery {
  return scope.query(Lead, 'lead').pick({
    id: 'lead.id',
    version: 'lead.version',
    title: 'lead.title',
    contactName: 'lead.contactName',
    company: 'lead.company',
    phone: 'lead.phone',
    source: 'lead.source',
    stage: 'lead.stage',
    nextStep: 'lead.nextStep',
    nextStepOn: 'lead.nextStepOn',
    createdAt: 'lead.createdAt',
    ...(seesMoney(scope) ? { expectedCents: 'lead.expectedCents' } : {}),
  });
}

export function viewLeadRow(row: StoredLeadRow): LeadRow {
  return { ...row, createdAt: row.createdAt.toISOString() };
}
