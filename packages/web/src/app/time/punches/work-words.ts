import type { PunchedWork } from './punch';

type Named = Pick<PunchedWork, 'kind' | 'jobNumber' | 'jobTitle' | 'operationName'>;

/** `Face frames`, or `Meal break`. */
export function whatOf({ kind, operationName }: Named): string {
  return kind === 'meal-break' ? 'Meal break' : (operationName ?? '');
}

/** `Job 1042, Mudroom lockers`; nothing for time that belongs to no job. */
export function jobOf({ jobNumber, jobTitle }: Named): string {
  return jobNumber === null ? '' : `Job ${jobNumber}, ${jobTitle ?? ''}`;
}

/** `2:14`, as a large clock shows it; never below zero, whatever a device's own clock says. */
export function clockFace(minutes: number): string {
  const whole = Math.max(0, minutes);
  return `${Math.floor(whole / 60)}:${String(whole % 60).padStart(2, '0')}`;
}
