import type { Generator } from '../chance/generator.js';
import type { Milestones } from '../crew/job-progress.js';
import type { Project } from '../plan/project.js';
import type { Purchase } from '../plan/purchases.js';
import { stepsOf } from '../plan/stages.js';
import { customerFor } from './customer-maker.js';
import { JobMaker } from './job-maker.js';
import type { Telling } from './telling.js';

/** A job from where it begins to where it came: stages, who is on it, when it is installed, what was bought. */
export function runJob(
  telling: Telling,
  project: Project,
  milestones: Milestones,
  purchases: readonly Purchase[],
  taxRate: string,
  random: Generator,
): void {
  const { desk, trail, list, cast } = telling;
  const job = new JobMaker(desk, trail, project.key);
  if (project.origin === 'by-hand')
    list.add(project.acceptedOn, 10, cast.owner, async (scope) => {
      const place = await customerFor(scope, desk.services, trail, project.contact);
      await job.createByHand(scope, project.title, project.work, place, taxRate);
    });
  schedule(telling, project, milestones, job, random);
  for (const { stage, on, hour } of stepsOf(project, milestones))
    list.add(on, hour, stage === 'closed' ? cast.owner : cast.leadHand, (scope) => job.move(scope, stage));
  for (const purchase of purchases) buy(telling, project, purchase, job);
}

/** At the approval of the drawings the day is set and the crew put on the job. */
function schedule(
  { list, when, cast }: Telling,
  project: Project,
  { approvedOn, installingOn }: Milestones,
  job: JobMaker,
  random: Generator,
) {
  const setOn = project.origin === 'by-hand' ? project.acceptedOn : approvedOn;
  if (setOn === null) return;
  // What is promised then is seldom the very day.
  const installOn = when.date((installingOn ?? setOn + 28) + random.whole(-3, 2));
  list.add(setOn, 12, cast.owner, async (scope) => {
    await job.update(scope, { installOn });
    await job.assign(scope, [cast.leadHand, ...cast.crew]);
  });
}

function buy(
  { trail, list, when, cast }: Telling,
  { key }: Project,
  purchase: Purchase,
  job: JobMaker,
): void {
  const name = `mistake of ${key}`;
  list.add(purchase.on, 16, cast.bookkeeper, async (scope) => {
    const { id } = await job.buy(scope, purchase, when.date(purchase.on));
    if (purchase.mistake) trail.keep(name, id);
  });
  if (purchase.mistake)
    list.add(purchase.on + 1, 16, cast.bookkeeper, (scope) =>
      job.takeBack(scope, trail.id(name), 'Entered twice.'),
    );
}
