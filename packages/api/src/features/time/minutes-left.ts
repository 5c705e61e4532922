/** SQL: minutes clocked by everybody to a job and an operation, in closed entries that were not voided. */
export function clockedMinutes(jobColumn: string, operationColumn: string, shopColumn: string): string {
  return `(select coalesce(sum(clocked.minutes), 0) from time_entry clocked where clocked.shop_id = ${shopColumn} and clocked.job_id = ${jobColumn} and clocked.operation_id = ${operationColumn} and clocked.voided_at is null)`;
}
