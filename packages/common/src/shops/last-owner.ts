import type { Role } from '../access/roles.js';
import type { Refusal } from '../problems/problem.js';

/**
 * A shop keeps an owner: its last one can neither leave nor take another role.
 *
 * @param owners the ids of the members who are owners now
 * @param becomes the member's next role, or null when they leave
 */
export function refuseLosingLastOwner(
  owners: readonly string[],
  memberId: string,
  becomes: Role | null,
): Refusal | null {
  const isLast = owners.length === 1 && owners[0] === memberId;
  if (!isLast || becomes === 'owner') return null;
  return { code: 'conflict', detail: 'A shop needs an owner. Make somebody else an owner first.' };
}
