import { JOB_STAGES } from '@bookmatch/common/jobs/jobs-contract';
import { Generator } from '../chance/generator.js';
import { plannedMinutes } from '../crew/job-progress.js';
import { ASKED_COUNT } from '../cast/contacts.js';
import { FIRST_DAY, planFirstYear } from './first-year.js';
import { INQUIRIES } from './inquiries.js';
import { stepsOf } from './stages.js';

const year = planFirstYear(new Generator('Quillback'));

describe('the planned year', () => {
  it('is the same however often it is made', () => {
    expect(planFirstYear(new Generator('Quillback'))).toEqual(year);
  });

  it('ends with a job in every stage', () => {
    const reached = year.jobs.map(({ project, milestones }) => {
      const steps = stepsOf(project, milestones).filter(({ on }) => on < 0);
      return steps.at(-1)?.stage ?? 'accepted';
    });
    expect([...new Set(reached)].sort()).toEqual([...JOB_STAGES].sort());
  });

  it('takes every job from stage to stage in order', () => {
    for (const { project, milestones } of year.jobs) {
      const days = stepsOf(project, milestones).map(({ on, hour }) => on * 24 + hour);
      expect(days).toEqual([...days].sort((one, other) => one - other));
      expect(days[0] ?? 0).toBeGreaterThanOrEqual(project.acceptedOn * 24);
    }
  });

  it('lets an inquiry come before its visit, its estimate and its acceptance', () => {
    for (const { project, road } of year.jobs.filter(({ project }) => project.origin !== 'by-hand')) {
      const { leadOn, contactedOn, visitOn, estimateOn, sentOn, sentAgainOn } = road;
      const days = [FIRST_DAY, leadOn, contactedOn, visitOn, estimateOn, sentOn, sentAgainOn ?? sentOn];
      expect(days).toEqual([...days].sort((one, other) => one - other));
      expect(sentAgainOn ?? sentOn).toBeLessThan(project.acceptedOn);
    }
  });

  it('fills every day without a gap or an overlap', () => {
    for (const { stretches } of year.shifts) {
      expect(stretches.every(({ from, to }) => from < to)).toBe(true);
      stretches.slice(1).forEach((stretch, index) => expect(stretch.from).toBe(stretches[index]?.to));
      expect(stretches.filter(({ task }) => task.kind === 'meal')).toHaveLength(1);
    }
  });

  it('builds most jobs in about the hours that were planned, some well over and some under', () => {
    const clocked = new Map<string, number>();
    for (const { from, to, task } of year.shifts.flatMap(({ stretches }) => stretches))
      if (task.kind === 'job') clocked.set(task.project, (clocked.get(task.project) ?? 0) + to - from);
    const ratios = year.jobs
      .filter(({ milestones, project }) => milestones.doneOn !== null && project.origin !== 'by-hand')
      .map(({ project }) => {
        const planned = [...plannedMinutes(project.work.rooms).values()].reduce((sum, one) => sum + one, 0);
        return (clocked.get(project.key) ?? 0) / planned;
      });
    expect(Math.min(...ratios)).toBeGreaterThan(0.75);
    expect(Math.max(...ratios)).toBeLessThan(1.45);
    expect(ratios.filter((ratio) => ratio > 1.08).length).toBeGreaterThan(3);
    expect(ratios.filter((ratio) => ratio < 0.97).length).toBeGreaterThan(3);
  });

  it('bills no stage before it is reached and none twice', () => {
    for (const { project, milestones, stages } of year.jobs) {
      expect(stages.map(({ stage }) => stage)).toEqual(stages.map((_, index) => index));
      const issued = stages.flatMap(({ issuedOn }) => issuedOn ?? []);
      expect(issued).toEqual([...issued].sort((one, other) => one - other));
      const last = stages.at(-1);
      expect(last?.issuedOn ?? null).toBe(milestones.doneOn === null ? null : milestones.doneOn + 1);
      for (const { issuedOn, payments } of stages)
        for (const { on } of payments) expect(on).toBeGreaterThanOrEqual(issuedOn ?? project.acceptedOn);
    }
  });

  it('has a contact for every inquiry', () => {
    expect(INQUIRIES).toHaveLength(ASKED_COUNT);
  });
});
