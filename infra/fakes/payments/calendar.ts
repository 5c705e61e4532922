/** Unix seconds one or more calendar months on, in UTC; a day the month lacks becomes its last day. */
export function addMonths(unixSeconds: number, months: number): number {
  const date = new Date(unixSeconds * 1000);
  const day = date.getUTCDate();
  date.setUTCDate(1);
  date.setUTCMonth(date.getUTCMonth() + months);
  const lastDay = new Date(Date.UTC(date.getUTCFullYear(), date.getUTCMonth() + 1, 0)).getUTCDate();
  date.setUTCDate(Math.min(day, lastDay));
  return Math.floor(date.getTime() / 1000);
}

/** The first anniversary of the anchor, in steps of `stepMonths`, that lies after `after`. */
export function nextPeriodEnd(anchor: number, after: number, stepMonths: number): number {
  let steps = 1;
  while (addMonths(anchor, steps * stepMonths) <= after) steps += 1;
  return addMonths(anchor, steps * stepMonths);
}
