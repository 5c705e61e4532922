import { setTimeout as sleep } from 'node:timers/promises';

/** The database's ways to say "you lost a race, start again": changed snapshot, lock wait timeout, deadlock. */
const LOST_RACES = new Set([1020, 1205, 1213]);
const ATTEMPTS = 20;

export function errorNumber(error: unknown): number | undefined {
  const errno = (error as { errno?: unknown; driverError?: { errno?: unknown } } | null)?.errno;
  const driver = (error as { driverError?: { errno?: unknown } } | null)?.driverError?.errno;
  return typeof errno === 'number' ? errno : typeof driver === 'number' ? driver : undefined;
}

export const isDuplicateKey = (error: unknown): boolean => errorNumber(error) === 1062;
export const isBrokenReference = (error: unknown): boolean => [1451, 1452].includes(errorNumber(error) ?? 0);
const isLostRace = (error: unknown): boolean => LOST_RACES.has(errorNumber(error) ?? 0);

/**
 * Runs the whole of `work` again when it lost a race, after a random pause that grows with each try, so that the
 * contenders spread out. The work must have no effect outside its transaction.
 */
export async function retryLostRaces<Result>(work: () => Promise<Result>): Promise<Result> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await work();
    } catch (error) {
      if (attempt === ATTEMPTS || !isLostRace(error)) throw error;
      await sleep(Math.random() * 5 * 2 ** Math.min(attempt, 6));
    }
  }
}
