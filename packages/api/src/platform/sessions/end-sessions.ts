import type { GlobalScope } from '../database/scope.js';
import { SessionRow } from './session.entity.js';
import { hashedSid } from './session-store.js';

/**
 * Ends a person's sessions everywhere, in the transaction of what ends them: a password is never changed without it.
 * Requests under way do not bring them back, since the store only updates rows.
 *
 * @param keepSid the session id that stays
 */
export async function endSessions(scope: GlobalScope, personId: string, keepSid?: string): Promise<void> {
  await scope.manager
    .createQueryBuilder()
    .delete()
    .from(SessionRow)
    .where({ personId })
    .andWhere('sid <> :kept', { kept: keepSid === undefined ? '' : hashedSid(keepSid) })
    .execute();
}
