import type { CreateJobCost, JobCost as JobCostView } from '@bookmatch/common/jobs/job-costs-contract';
import { isDuplicateKey } from '../../platform/database/retry.js';
import type { ShopScope } from '../../platform/database/scope.js';
import { conflict, invalid, notFound } from '../../platform/http/problem-error.js';
import { memberNames, todayOf } from '../shops/shops-public.js';
import { readJob } from './job-access.js';
import { JobCost } from './job-cost.entity.js';

/** What was spent on a job, besides clocked time. Rows are only added: a wrong one is reversed. */
export class JobCostsService {
  /** Newest first. */
  async list(scope: ShopScope, jobId: string): Promise<JobCostView[]> {
    await readJob(scope, jobId);
    const rows = await scope.rows(JobCost).findBy({ jobId }, 'createdAt');
    const names = await memberNames(scope);
    const reversals = new Map(rows.flatMap((row) => (row.reversesId ? [[row.reversesId, row.id]] : [])));
    return rows.map((row) => view(row, names, reversals.get(row.id) ?? null)).toReversed();
  }

  async add(scope: ShopScope, jobId: string, input: CreateJobCost): Promise<JobCostView> {
    await readJob(scope, jobId);
    if (input.onDate > (await todayOf(scope))) throw invalid('onDate', 'A cost cannot be of a day to come.');
    return this.insert(scope, { ...input, jobId, reversesId: null, reason: '' });
  }

  /** Takes a cost back by a row of the opposite amount, dated today. @throws conflict when it was taken back already */
  async reverse(scope: ShopScope, jobId: string, costId: string, reason: string): Promise<JobCostView> {
    await readJob(scope, jobId);
    const cost = await scope.rows(JobCost).findOneBy({ id: costId, jobId }, true);
    if (!cost) throw notFound('This cost');
    if (cost.reversesId !== null) throw conflict('This is a reversal. Enter the cost again instead.');
    const { category, description, amountCents, supplier } = cost;
    const onDate = await todayOf(scope);
    try {
      const taken = { category, description, amountCents: -amountCents, supplier, onDate };
      return await this.insert(scope, { ...taken, jobId, reversesId: costId, reason });
    } catch (error) {
      throw isDuplicateKey(error) ? conflict('This cost was reversed already.') : error;
    }
  }

  private async insert(
    scope: ShopScope,
    values: Omit<JobCost, 'id' | 'shopId' | 'createdAt' | 'memberId'>,
  ): Promise<JobCostView> {
    const row = await scope.rows(JobCost).insert({ ...values, id: scope.newId(), memberId: scope.memberId });
    return view(row, await memberNames(scope), null);
  }
}

function view(row: JobCost, names: Map<string, string>, reversedById: string | null): JobCostView {
  const { id, category, description, amountCents, onDate, supplier, reversesId, reason } = row;
  return {
    ...{ id, category, description, amountCents, onDate, supplier, reversesId, reversedById, reason },
    recordedBy: names.get(row.memberId) ?? '',
    createdAt: row.createdAt.toISOString(),
  };
}
