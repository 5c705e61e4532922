import type { ShopScope } from '../../platform/database/scope.js';
import { Member } from './member.entity.js';

/** The names of all members there ever were, by member id. A shop has few, so one look-up serves a whole page. */
export async function memberNames(scope: ShopScope): Promise<Map<string, string>> {
  const rows = await scope
    .query(Member, 'member')
    .pick({ id: 'member.id', name: '(select person.name from person where person.id = member.person_id)' })
    .all<{ id: string; name: string }>();
  return new Map(rows.map((row) => [row.id, row.name]));
}
