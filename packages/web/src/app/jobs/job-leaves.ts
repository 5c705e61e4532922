import { COST_CATEGORY_NAMES } from '@bookmatch/common/estimates/cost-categories';
import type { Job, JobMoney } from '@bookmatch/common/jobs/jobs-contract';
import { formatRate } from '@bookmatch/common/money/format';
import type { LeafRow } from '../ui/leaf-pair/leaf-row';

/** A job's figures as the rows of mirrored pairs: planned to the left, built to the right. */

export function costLeaves({ costs }: JobMoney, closed: boolean): LeafRow[] {
  return costs.map(({ category, plannedCents, actualCents }) => ({
    key: category,
    name: COST_CATEGORY_NAMES[category],
    planned: plannedCents,
    built: actualCents,
    note: notStarted(actualCents, closed),
  }));
}

export function hourLeaves({ operations, closedAt }: Job): LeafRow[] {
  return operations.map(({ operationId, name, plannedMinutes, clockedMinutes }) => ({
    key: operationId,
    name,
    planned: plannedMinutes,
    built: clockedMinutes,
    note: plannedMinutes > 0 ? notStarted(clockedMinutes, closedAt !== null) : undefined,
  }));
}

export function billingLeaves({ billing, billedCents }: JobMoney): LeafRow[] {
  const rows = billing.map(({ billingStageId, name, plannedCents, billedCents: billed }) => ({
    key: billingStageId,
    name,
    planned: plannedCents,
    built: billed,
    note: billed === 0 ? 'not billed' : undefined,
  }));
  const beside = billedCents - billing.reduce((sum, row) => sum + row.billedCents, 0);
  return beside === 0
    ? rows
    : [...rows, { key: 'beside', name: 'Other invoices', planned: 0, built: beside, note: undefined }];
}

function notStarted(built: number, closed: boolean): string | undefined {
  return built === 0 && !closed ? 'not started' : undefined;
}

/** `Actual to date, 71% complete`. */
export function actualName({ percentComplete }: JobMoney, closed: boolean): string {
  if (closed) return 'Actual';
  return percentComplete === null
    ? 'Actual to date'
    : `Actual to date, ${formatRate(percentComplete, 0)} complete`;
}

/** What the job is on pace for; nothing once it is closed, or as long as that is its plan. */
export function paceNote(
  money: JobMoney,
  closed: boolean,
  format: (cents: number) => string,
): string | undefined {
  if (closed || money.actualCostCents === 0) return undefined;
  return `on pace for ${format(money.expectedCostCents)}`;
}
