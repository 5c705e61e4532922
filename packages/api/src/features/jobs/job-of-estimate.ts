import type { ShopScope } from '../../platform/database/scope.js';
import { Job } from './job.entity.js';

/** One step on from an estimate: the job that its acceptance made. */
export function jobOfEstimate(
  scope: ShopScope,
  estimateId: string,
): Promise<{ id: string; number: number } | null> {
  return scope
    .query(Job, 'job')
    .pick({ id: 'job.id', number: 'job.number' })
    .where('job.estimateId = :estimateId', { estimateId })
    .first();
}
