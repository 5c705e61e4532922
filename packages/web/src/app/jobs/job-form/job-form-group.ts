import type { NonNullableFormBuilder } from '@angular/forms';
import { COST_CATEGORIES, type CostCategory } from '@bookmatch/common/estimates/cost-categories';
import type { CreateJobInput } from '@bookmatch/common/jobs/jobs-contract';
import type { Operation } from '@bookmatch/common/shops/operations-contract';

/** What a person types of a new job. Hours and costs stand by operation and kind, empty where nothing is planned. */
export function jobFormGroup(builder: NonNullableFormBuilder) {
  return builder.group({
    title: '',
    customerId: '',
    siteId: builder.control<string | null>(null),
    installOn: builder.control<string | null>(null),
    openToCrew: true,
    notes: '',
    contractNetCents: builder.control<number | null>(null),
    contractTaxCents: builder.control<number | null>(null),
    hours: builder.record<string>({}),
    costs: builder.record<number | null>(
      Object.fromEntries(COST_CATEGORIES.map((category) => [category, null])),
    ),
  });
}
export type JobFormGroup = ReturnType<typeof jobFormGroup>;
export type JobFormValue = ReturnType<JobFormGroup['getRawValue']>;

/** Whether a text is hours as people type them: empty, `7.5`, `12`, at most 10,000. */
export function isHours(text: string): boolean {
  return text.trim() === '' || (/^\d{1,5}(\.\d{1,2})?$/.test(text.trim()) && Number(text) <= 10_000);
}

/** The body of the request: what was left empty is left out. */
export function jobBody(value: JobFormValue): CreateJobInput {
  const { hours, costs, contractNetCents, contractTaxCents, ...fields } = value;
  return {
    ...fields,
    contractNetCents: contractNetCents ?? 0,
    contractTaxCents: contractTaxCents ?? 0,
    operations: Object.entries(hours)
      .map(([operationId, text]) => ({ operationId, plannedMinutes: Math.round(Number(text) * 60) }))
      .filter(({ plannedMinutes }) => plannedMinutes > 0),
    plannedCosts: Object.entries(costs).flatMap(([category, cents]) =>
      cents ? [{ category: category as CostCategory, plannedCents: cents }] : [],
    ),
  };
}

/** The operations whose time belongs to jobs and that take new plans. */
export const plannable = (operations: readonly Operation[]): Operation[] =>
  operations.filter(({ onJob, archived }) => onJob && !archived);
