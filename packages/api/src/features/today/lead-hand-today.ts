import { addDays, weekStart } from '@bookmatch/common/calendar/shop-dates';
import { TODAY_LIMIT, type LeadHandToday } from '@bookmatch/common/today/today-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { clockStateOf, onTheClock } from '../time/time-public.js';
import { installsBetween, jobsInHand } from './jobs-in-hand.js';

/** More installs than this in one week are a list, not a glance. */
const INSTALLS_LIMIT = 20;

/** The floor: the jobs in hand, who works on what, and what leaves the shop this workweek. No money. */
export async function leadHandToday(scope: ShopScope, today: string): Promise<LeadHandToday> {
  const from = weekStart(today);
  return {
    role: 'lead-hand',
    on: today,
    jobsInHand: await jobsInHand(scope, TODAY_LIMIT),
    onTheClock: await onTheClock(scope),
    installsThisWeek: await installsBetween(scope, { from, to: addDays(from, 6), limit: INSTALLS_LIMIT }),
    clock: await clockStateOf(scope),
  };
}
