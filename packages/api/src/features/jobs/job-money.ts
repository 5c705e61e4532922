import type { CostCategory } from '@bookmatch/common/estimates/cost-categories';
import type { JobBillingRow, JobMoney } from '@bookmatch/common/jobs/jobs-contract';
import { costRows, jobProgress, type ActualCost } from '@bookmatch/common/jobs/planned-and-built';
import { sumCents } from '@bookmatch/common/money/cents';
import type { ShopScope } from '../../platform/database/scope.js';
import { Operation } from '../shops/shops-public.js';
import { bills } from './billing-stages.js';
import type { ClockedOperation } from './clocked-time.js';
import type { JobBilling, JobInvoice } from './job-billing.js';
import { JobBillingStage } from './job-billing-stage.entity.js';
import { JobCost } from './job-cost.entity.js';
import { JobPlannedCost } from './job-planned-cost.entity.js';
import type { Job } from './job.entity.js';

/** All of a job's money: what it was planned to cost and did, what was agreed, billed and paid. */
export async function viewMoney(
  scope: ShopScope,
  job: Job,
  clocked: readonly ClockedOperation[],
  billing: JobBilling,
): Promise<JobMoney> {
  const [planned, spent, labor, stages, invoices] = await Promise.all([
    scope.rows(JobPlannedCost).findBy({ jobId: job.id }),
    spentByCategory(scope, job.id),
    laborByCategory(scope, clocked),
    scope.rows(JobBillingStage).findBy({ jobId: job.id }, 'position'),
    billing.invoicesOf(scope, job.id),
  ]);
  const costs = costRows(planned, [...spent, ...labor]);
  const billedNetCents = sumCents(invoices.map((invoice) => invoice.billedNetCents));
  const { contractNetCents, contractTaxCents, contractTotalCents } = job;
  const closed = job.closedAt !== null;
  return {
    ...{ contractNetCents, contractTaxCents, contractTotalCents, costs, billedNetCents },
    ...jobProgress({ costs, contractNetCents, billedNetCents, closed }),
    billing: stages.map((stage) => viewStage(stage, invoices)),
    billedCents: sumCents(invoices.map((invoice) => invoice.billedCents)),
    paidCents: sumCents(invoices.map((invoice) => invoice.paidCents)),
  };
}

function spentByCategory(scope: ShopScope, jobId: string): Promise<ActualCost[]> {
  return scope
    .query(JobCost, 'cost')
    .pick({ category: 'cost.category', amountCents: 'cast(sum(cost.amountCents) as signed)' })
    .where('cost.jobId = :jobId', { jobId })
    .groupBy('cost.category')
    .all<{ category: CostCategory; amountCents: number | string }>()
    .then((rows) => rows.map((row) => ({ ...row, amountCents: Number(row.amountCents) })));
}

/** Clocked time costs what its operations' category says. */
async function laborByCategory(
  scope: ShopScope,
  clocked: readonly ClockedOperation[],
): Promise<ActualCost[]> {
  const operations = await scope.rows(Operation).findBy({ id: clocked.map((row) => row.operationId) });
  const categories = new Map(operations.map((row) => [row.id, row.costCategory]));
  return clocked.map((row) => ({
    category: categories.get(row.operationId) ?? 'labor',
    amountCents: row.costCents,
  }));
}

/** The stage beside its invoice: the one that bills it, else the newest, a draft or one that was credited whole. */
function viewStage(stage: JobBillingStage, invoices: readonly JobInvoice[]): JobBillingRow {
  const { id, name, share, deposit, due, totalCents } = stage;
  const own = invoices.filter((invoice) => invoice.billingStageId === id);
  const shown = own.find(bills) ?? own.at(-1);
  return {
    ...{ billingStageId: id, name, share, deposit, due, plannedCents: totalCents },
    billedCents: sumCents(own.map((invoice) => invoice.billedCents)),
    paidCents: sumCents(own.map((invoice) => invoice.paidCents)),
    invoice: shown ? invoiceOf(shown) : null,
  };
}

function invoiceOf({ id, number, standing, daysOverdue }: JobInvoice): JobBillingRow['invoice'] {
  return { id, number, standing, daysOverdue };
}
