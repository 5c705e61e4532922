import { abilitySql, type SqlFields } from '../../platform/database/ability-sql.js';
import type { ShopScope } from '../../platform/database/scope.js';
import type { ShopQuery } from '../../platform/database/shop-query.js';
import { JobAssignment } from './job-assignment.entity.js';
import { Job } from './job.entity.js';

/** A job with what the rules about who may see it look at. */
export type AccessedJob = Job & { assignedMemberIds: string[] };

/** Loads a job that the actor may read. @throws not-found for one that does not exist and one they may not see */
export async function readJob(scope: ShopScope, id: string): Promise<AccessedJob> {
  return withAccess(scope, 'read', await scope.rows(Job).get(id));
}

/** The same, locked until the transaction ends, for who may change it. */
export async function changeJob(scope: ShopScope, id: string): Promise<AccessedJob> {
  return withAccess(scope, 'update', await scope.rows(Job).getForUpdate(id));
}

/** A job that the actor may read, locked: so that it cannot be closed while time is being clocked to it. */
export async function lockReadableJob(scope: ShopScope, id: string): Promise<AccessedJob> {
  return withAccess(scope, 'read', await scope.rows(Job).getForUpdate(id));
}

async function withAccess(scope: ShopScope, action: 'read' | 'update', job: Job): Promise<AccessedJob> {
  const assignments = await scope.rows(JobAssignment).findBy({ jobId: job.id }, 'createdAt');
  const accessed = Object.assign(job, { assignedMemberIds: assignments.map((row) => row.memberId) });
  scope.check(action, 'Job', accessed);
  return accessed;
}

/** Whether the actor sees a job's money at all; without it the columns are not even read. */
export const seesMoney = (scope: ShopScope): boolean => scope.can('read', 'Job', 'money');

/** Leaves only the jobs that the actor may read in a query whose first table is `job`. */
export function onlyReadable(scope: ShopScope, query: ShopQuery): ShopQuery {
  const { sql, parameters } = abilitySql(scope.ability, 'read', 'Job', JOB_FIELDS);
  return query.where(sql, parameters);
}

const JOB_FIELDS: SqlFields = {
  openToCrew: (parameter) => `job.openToCrew = ${parameter}`,
  assignedMemberIds: isAssigned,
};

/** SQL: the job beside the alias `job` is assigned to the member that the parameter names. */
export function isAssigned(parameter: string): string {
  return `exists (select 1 from job_assignment mine where mine.shop_id = job.shop_id and mine.job_id = job.id and mine.member_id = ${parameter})`;
}
