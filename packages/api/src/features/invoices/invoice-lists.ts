import { invoiceStanding } from '@bookmatch/common/invoices/invoice-standing';
import type { InvoiceKind, InvoiceStatus } from '@bookmatch/common/invoices/invoice-standings';
import type { InvoiceListQuery, InvoiceRow } from '@bookmatch/common/invoices/invoices-contract';
import type { Page } from '@bookmatch/common/wire/list';
import type { ShopQuery } from '../../platform/database/shop-query.js';
import type { ShopScope } from '../../platform/database/scope.js';
import { keysetPage, likePattern } from '../../platform/http/keyset.js';
import { Customer } from '../customers/customers-public.js';
import { Job, JobBillingStage } from '../jobs/jobs-public.js';
import { todayOf } from '../shops/shops-public.js';
import { Invoice } from './invoice.entity.js';

type StoredRow = Omit<InvoiceRow, 'standing' | 'daysOverdue' | 'createdAt'> & {
  status: InvoiceStatus;
  kind: InvoiceKind;
  paidCents: number;
  createdAt: Date;
};
type SortKey = 'number' | 'issuedOn' | 'dueOn' | 'createdAt';

const COLUMNS = {
  id: 'invoice.id',
  sorts: {
    number: 'invoice.numberOrder',
    issuedOn: 'invoice.issuedOrder',
    dueOn: 'invoice.dueOrder',
    createdAt: 'invoice.createdAt',
  },
  // Drafts first, since they wait for somebody, then the newest number.
  standard: '-number',
} as const;

/** The list of invoices. */
export async function listInvoices(scope: ShopScope, request: InvoiceListQuery): Promise<Page<InvoiceRow>> {
  const today = await todayOf(scope);
  const query = invoicesQuery(scope);
  narrow(query, request, today);
  const page = await keysetPage<StoredRow, SortKey>(query, COLUMNS, request);
  return { ...page, rows: page.rows.map((row) => viewRow(row, today)) };
}

/**
 * The first invoices at a standing: what is overdue by how late it is, drafts as they were made.
 * @param today the date in the shop's zone
 */
export async function firstInvoices(
  scope: ShopScope,
  standing: 'overdue' | 'draft',
  { today, limit }: { today: string; limit: number },
): Promise<InvoiceRow[]> {
  const query = invoicesQuery(scope);
  narrow(query, { standing }, today);
  const rows = await query
    .orderBy(standing === 'overdue' ? 'invoice.dueOrder' : 'invoice.createdAt')
    .orderBy('invoice.id')
    .limit(limit)
    .all<StoredRow>();
  return rows.map((row) => viewRow(row, today));
}

function invoicesQuery(scope: ShopScope): ShopQuery {
  return scope
    .query(Invoice, 'invoice')
    .join(Customer, 'customer', 'customer.id = invoice.customerId')
    .leftJoin(Job, 'job', 'job.id = invoice.jobId')
    .leftJoin(JobBillingStage, 'stage', 'stage.id = invoice.billingStageId')
    .pick({
      id: 'invoice.id',
      number: 'invoice.number',
      status: 'invoice.status',
      kind: 'invoice.kind',
      issuedOn: 'invoice.issuedOn',
      dueOn: 'invoice.dueOn',
      customerId: 'invoice.customerId',
      customerName: 'customer.name',
      jobId: 'invoice.jobId',
      jobNumber: 'job.number',
      stageName: 'stage.name',
      createdAt: 'invoice.createdAt',
      totalCents: 'invoice.totalCents',
      paidCents: 'invoice.paidCents',
      balanceCents: 'invoice.balanceCents',
      overpaidCents: 'invoice.overpaidCents',
    });
}

function narrow(query: ShopQuery, request: InvoiceListQuery, today: string): void {
  const { standing, customerId, jobId, issuedFrom, issuedTo, q } = request;
  if (standing) query.where(STANDINGS[standing], { today });
  if (customerId) query.where('invoice.customerId = :customerId', { customerId });
  if (jobId) query.where('invoice.jobId = :jobId', { jobId });
  if (issuedFrom) query.where('invoice.issuedOn >= :issuedFrom', { issuedFrom });
  if (issuedTo) query.where('invoice.issuedOn <= :issuedTo', { issuedTo });
  if (q)
    query.where(
      'customer.name like :q or customer.company like :q or job.title like :q or invoice.number = :n',
      {
        q: likePattern(q),
        n: /^\d{1,9}$/.test(q) ? Number(q) : -1,
      },
    );
}

const STANDINGS: Record<NonNullable<InvoiceListQuery['standing']>, string> = {
  draft: "invoice.status = 'draft'",
  open: "invoice.status = 'issued'",
  overdue: "invoice.status = 'issued' and invoice.dueOrder < :today",
  paid: "invoice.status = 'paid'",
  credited: "invoice.status = 'credited'",
};

function viewRow(row: StoredRow, today: string): InvoiceRow {
  const { paidCents, ...rest } = row;
  return {
    ...rest,
    ...invoiceStanding(row.status, paidCents, row.dueOn, today),
    createdAt: row.createdAt.toISOString(),
  };
}
