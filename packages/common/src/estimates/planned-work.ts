import { Decimal } from 'decimal.js';
import { extend, roundHalfUp, type Cents } from '../money/cents.js';
import { TIME_CATEGORIES } from './cost-categories.js';
import type { EstimateLine } from './revision-contract.js';

/** What an operation is planned to take: the rows a job's clocked time is laid beside. */
export type PlannedWork = { operationId: string; plannedMinutes: number; plannedCostCents: Cents };

/** A line's planned time: quantity × minutes a unit, half-up to the minute; zero where it plans none. */
export function linePlannedMinutes(line: EstimateLine): number {
  if (line.operationId === null || line.plannedMinutesPerUnit === null) return 0;
  return roundHalfUp(new Decimal(line.quantity).times(line.plannedMinutesPerUnit));
}

/**
 * Planned minutes and cost by operation, in the order operations first stand in the lines. Only lines of time add cost:
 * the material on a line that also plans time is no cost of its operation.
 */
export function planWork(lines: readonly EstimateLine[]): PlannedWork[] {
  const byOperation = new Map<string, PlannedWork>();
  for (const line of lines) {
    if (line.operationId === null) continue;
    const row = byOperation.get(line.operationId) ?? {
      operationId: line.operationId,
      plannedMinutes: 0,
      plannedCostCents: 0,
    };
    row.plannedMinutes += linePlannedMinutes(line);
    row.plannedCostCents += isTime(line) ? extend(line.quantity, line.unitCostCents) : 0;
    byOperation.set(line.operationId, row);
  }
  return [...byOperation.values()];
}

function isTime(line: EstimateLine): boolean {
  return (TIME_CATEGORIES as readonly string[]).includes(line.kind);
}
