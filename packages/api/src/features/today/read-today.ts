import type { Role } from '@bookmatch/common/access/roles';
import type { Today } from '@bookmatch/common/today/today-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { notAllowed } from '../../platform/http/problem-error.js';
import { todayOf } from '../shops/shops-public.js';
import { clockStateOf } from '../time/time-public.js';
import { bookkeeperToday } from './bookkeeper-today.js';
import { leadHandToday } from './lead-hand-today.js';
import { ownerToday } from './owner-today.js';

/** The first page of the one who asks, by their role: nothing of another role's page is even read. */
export async function readToday(scope: ShopScope): Promise<Today> {
  const today = await todayOf(scope);
  return PAGES[roleOf(scope)](scope, today);
}

const PAGES: Record<Role, (scope: ShopScope, today: string) => Promise<Today>> = {
  owner: ownerToday,
  bookkeeper: bookkeeperToday,
  'lead-hand': leadHandToday,
  crew: async (scope, on) => ({ role: 'crew', on, clock: await clockStateOf(scope) }),
};

function roleOf({ stamp: { author } }: ShopScope): Role {
  if (author.kind !== 'member') throw notAllowed();
  return author.role;
}
