import type {
  EstimateListQuery,
  EstimateRow,
  EstimateStatus,
} from '@bookmatch/common/estimates/estimates-contract';
import type { Page } from '@bookmatch/common/wire/list';
import type { ShopScope } from '../../platform/database/scope.js';
import type { ShopQuery } from '../../platform/database/shop-query.js';
import { keysetPage, likePattern } from '../../platform/http/keyset.js';
import { Customer } from '../customers/customers-public.js';
import { EstimateQuestion } from './estimate-question.entity.js';
import { EstimateRevision } from './estimate-revision.entity.js';
import { Estimate } from './estimate.entity.js';

export type StoredEstimateRow = Omit<EstimateRow, 'status' | 'openQuestions' | 'sentAt' | 'createdAt'> & {
  status: Estimate['status'];
  openUntil: Date | null;
  openQuestions: number | string;
  sentAt: Date | null;
  createdAt: Date;
};

/** The list of estimates: each with its current revision's price and date. */
export async function listEstimates(
  scope: ShopScope,
  request: EstimateListQuery,
): Promise<Page<EstimateRow>> {
  const query = estimateRows(scope);
  if (request.status) whereStatus(query, request.status, scope.now);
  if (request.customerId) query.where('estimate.customerId = :customerId', request);
  if (request.leadId) query.where('estimate.leadId = :leadId', request);
  if (request.q) whereText(query, request.q);
  const page = await keysetPage<StoredEstimateRow, 'number' | 'title' | 'createdAt'>(query, PAGING, request);
  return { ...page, rows: page.rows.map((row) => viewEstimateRow(row, scope.now)) };
}

/** Rows of the alias `estimate` as lists and first pages show them. */
export function estimateRows(scope: ShopScope): ShopQuery {
  return scope
    .query(Estimate, 'estimate')
    .join(Customer, 'customer', 'customer.id = estimate.customerId')
    .join(
      EstimateRevision,
      'revision',
      'revision.estimateId = estimate.id and revision.number = estimate.currentRevisionNumber',
    )
    .pick(COLUMNS)
    .pickFrom(
      { openQuestions: 'count(*)' },
      EstimateQuestion,
      'question',
      'question.estimateId = estimate.id and question.answer is null',
    );
}

const COLUMNS = {
  id: 'estimate.id',
  number: 'estimate.number',
  title: 'estimate.title',
  customerId: 'estimate.customerId',
  customerName: 'customer.name',
  status: 'estimate.status',
  openUntil: 'estimate.openUntil',
  revisionNumber: 'estimate.currentRevisionNumber',
  validUntil: 'revision.validUntil',
  totalCents: 'revision.totalCents',
  sentAt: 'revision.sentAt',
  createdAt: 'estimate.createdAt',
};
const PAGING = {
  id: 'estimate.id',
  sorts: { number: 'estimate.number', title: 'estimate.title', createdAt: 'estimate.createdAt' },
  standard: '-number',
} as const;

/** A sent estimate whose last day is over is expired: the one status that nothing stores. */
function whereStatus(query: ShopQuery, status: EstimateStatus, now: Date): void {
  if (status === 'expired') query.where("estimate.status = 'sent' and estimate.openUntil <= :now", { now });
  else if (status === 'sent') query.where("estimate.status = 'sent' and estimate.openUntil > :now", { now });
  else query.where('estimate.status = :status', { status });
}

function whereText(query: ShopQuery, text: string): void {
  const number = /^\d{1,9}$/.test(text) ? Number(text) : -1;
  query.where('estimate.title like :q or customer.name like :q or estimate.number = :number', {
    q: likePattern(text),
    number,
  });
}

export function viewEstimateRow({ openUntil, ...row }: StoredEstimateRow, now: Date): EstimateRow {
  const expired = row.status === 'sent' && openUntil !== null && openUntil <= now;
  return {
    ...row,
    status: expired ? 'expired' : row.status,
    openQuestions: Number(row.openQuestions),
    sentAt: row.sentAt?.toISOString() ?? null,
    createdAt: row.createdAt.toISOString(),
  };
}
