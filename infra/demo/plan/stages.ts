import type { JobStage } from '@bookmatch/common/jobs/jobs-contract';
import type { Milestones } from '../crew/job-progress.js';
import type { Project, WorkdayIndex } from './project.js';

export type StageStep = { stage: JobStage; on: WorkdayIndex; hour: number };

/** Working days from the end of the work until a job is closed: the last look, the last bill sent. */
const UNTIL_CLOSED = 9;

/** The steps a job takes from stage to stage, in order; those after today do not happen. */
export function stepsOf({ origin }: Project, milestones: Milestones): StageStep[] {
  const { measuredOn, approvedOn, materialOn, buildingOn, finishingOn, installingOn, doneOn } = milestones;
  const steps: [JobStage, WorkdayIndex | null, number][] = [
    ...(origin === 'by-hand'
      ? []
      : ([
          ['measured', measuredOn, 16],
          ['drawings-approved', approvedOn, 11],
        ] satisfies [JobStage, WorkdayIndex | null, number][])),
    ['materials-in', materialOn, 14],
    ['building', buildingOn, 7],
    ['finishing', finishingOn, 8],
    ['installing', installingOn, 9],
    ['closed', doneOn === null ? null : doneOn + UNTIL_CLOSED, 15],
  ];
  return steps.flatMap(([stage, on, hour]) => (on === null ? [] : [{ stage, on, hour }]));
}
