import type { Page } from '@playwright/test';
import { run } from './errand';

type Made = { id: string };
export type Operation = Made & { name: string; onJob: boolean };
export type JobPlan = { title: string; customer: string; hours: Record<string, number>; priceCents?: number };

/** A customer and a job of theirs that the whole crew sees, made by the owner without the screens. */
export async function addJob(owner: Page, { title, customer, hours, priceCents }: JobPlan): Promise<string> {
  const { rows } = await run<{ rows: Operation[] }>(owner, '/operations');
  const planned = Object.entries(hours).map(([name, hour]) => ({
    operationId: rows.find((one) => one.name === name)?.id,
    plannedMinutes: hour * 60,
  }));
  const { id: customerId } = await run<Made>(owner, '/customers', {
    method: 'POST',
    body: { name: customer, kind: 'homeowner' },
  });
  const { id } = await run<Made>(owner, '/jobs', {
    method: 'POST',
    body: { title, customerId, operations: planned, contractNetCents: priceCents ?? 0 },
  });
  return id;
}
