import type { JobExportQuery, JobListQuery, JobRow } from '@bookmatch/common/jobs/jobs-contract';
import type { Address } from '@bookmatch/common/customers/customers-contract';
import type { Page } from '@bookmatch/common/wire/list';
import type { ShopScope } from '../../platform/database/scope.js';
import type { ShopQuery } from '../../platform/database/shop-query.js';
import { keysetPage, likePattern } from '../../platform/http/keyset.js';
import { Customer, Site } from '../customers/customers-public.js';
import type { ClockedTime } from './clocked-time.js';
import { isAssigned, onlyReadable, seesMoney } from './job-access.js';
import { Job } from './job.entity.js';

type StoredRow = Omit<JobRow, 'createdAt' | 'siteCity' | 'assignedMemberIds' | 'clockedMinutes'> & {
  createdAt: Date;
  siteAddress: Address | null;
  assigned: string | null;
  clockedMinutes: number | string;
  actualCostCents?: number | string;
};
const COLUMNS = {
  id: 'job.id',
  sorts: {
    number: 'job.number',
    title: 'job.title',
    installOn: 'job.installOrder',
    createdAt: 'job.createdAt',
  },
  standard: '-number',
} as const;
type SortKey = keyof typeof COLUMNS.sorts;

/** The list of the jobs that the actor may see, with money for who may see it. */
export async function listJobs(
  scope: ShopScope,
  request: JobListQuery,
  time: ClockedTime,
): Promise<Page<JobRow>> {
  const query = jobRows(scope, time);
  filter(scope, query, request);
  const page = await keysetPage<StoredRow, SortKey>(query, COLUMNS, request);
  return { ...page, rows: page.rows.map(viewRow) };
}

function jobRows(scope: ShopScope, { sums }: ClockedTime): ShopQuery {
  const query = scope
    .query(Job, 'job')
    .join(Customer, 'customer', 'customer.id = job.customerId')
    .leftJoin(Site, 'site', 'site.id = job.siteId')
    .pick({
      id: 'job.id',
      version: 'job.version',
      number: 'job.number',
      title: 'job.title',
      customerName: 'customer.name',
      siteAddress: 'site.address',
      stage: 'job.stage',
      installOn: 'job.installOn',
      plannedMinutes: 'job.plannedMinutes',
      createdAt: 'job.createdAt',
      clockedMinutes: sums.minutes,
      assigned:
        '(select group_concat(a.member_id order by a.id) from job_assignment a where a.shop_id = job.shop_id and a.job_id = job.id)',
    });
  if (seesMoney(scope))
    query.pick({
      contractTotalCents: 'job.contractTotalCents',
      plannedCostCents: 'job.plannedCostCents',
      actualCostCents: `(${sums.costCents} + ${SPENT})`,
    });
  return onlyReadable(scope, query);
}

/** SQL: what was spent on the job beside the alias `job`, besides clocked time. */
const SPENT =
  '(select coalesce(sum(cost.amount_cents), 0) from job_cost cost where cost.shop_id = job.shop_id and cost.job_id = job.id)';

function filter(scope: ShopScope, query: ShopQuery, request: JobExportQuery): void {
  const { stage, assigned, customerId, installFrom, installTo, q } = request;
  if (stage === 'open') query.where("job.stage <> 'closed'");
  else if (stage) query.where('job.stage = :stage', { stage });
  if (assigned)
    query.where(isAssigned(':assigned'), { assigned: assigned === 'me' ? scope.memberId : assigned });
  if (customerId) query.where('job.customerId = :customerId', { customerId });
  if (installFrom) query.where('job.installOn >= :installFrom', { installFrom });
  if (installTo) query.where('job.installOn <= :installTo', { installTo });
  if (q)
    query.where('job.title like :q or customer.name like :q or job.number = :number', {
      q: likePattern(q),
      number: /^\d{1,9}$/.test(q) ? Number(q) : -1,
    });
}

function viewRow({ siteAddress, assigned, clockedMinutes, actualCostCents, ...row }: StoredRow): JobRow {
  return {
    ...row,
    siteCity: siteAddress?.city ?? '',
    assignedMemberIds: assigned === null ? [] : assigned.split(','),
    clockedMinutes: Number(clockedMinutes),
    createdAt: row.createdAt.toISOString(),
    ...(actualCostCents === undefined ? {} : { actualCostCents: Number(actualCostCents) }),
  };
}
