import type { JobRow } from '@bookmatch/common/jobs/jobs-contract';

/** Whose job it is and where: `Wren Halloway, Alder`. */
export function placeOf({ customerName, siteCity }: JobRow): string {
  return [customerName, siteCity].filter(Boolean).join(', ');
}
