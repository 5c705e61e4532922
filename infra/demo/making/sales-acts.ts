import type { LeadSource } from '@bookmatch/common/leads/leads-contract';
import { item } from '../catalog/lines.js';
import type { Work } from '../catalog/work.js';
import type { Generator } from '../chance/generator.js';
import { FOUR_STAGES } from '../plan/billing.js';
import type { Project } from '../plan/project.js';
import type { Road } from '../plan/road.js';
import { customerFor } from './customer-maker.js';
import { EstimateMaker } from './estimate-maker.js';
import { JobMaker } from './job-maker.js';
import { LeadMaker } from './lead-maker.js';
import type { Telling } from './telling.js';

/** From the inquiry to the accepted estimate of a job that was won. */
export function sellJob(telling: Telling, project: Project, road: Road, random: Generator): void {
  const { desk, trail, list, cast } = telling;
  const contact = project.contact;
  const estimate = new EstimateMaker(desk, trail, `estimate ${project.key}`);
  const job = new JobMaker(desk, trail, project.key);
  if (project.origin === 'estimate-only') {
    list.add(road.estimateOn, 9, cast.owner, async (scope) => {
      const place = await customerFor(scope, desk.services, trail, contact);
      const { id } = await desk.services.estimates.create(scope, {
        title: project.title,
        ...place,
        leadId: null,
      });
      estimate.started(id);
    });
  } else if (project.origin !== 'by-hand') followLead(telling, project, project.origin, road, estimate);
  offer(telling, project, road, estimate, random);
  list.add(project.acceptedOn, 9, cast.owner, async (scope) => {
    await estimate.accept(scope, contact);
    await job.followAcceptance(scope, trail.id(`estimate ${project.key}`));
  });
}

function followLead(
  { desk, trail, list, when, cast }: Telling,
  { key, title, contact, work, acceptedOn }: Project,
  source: LeadSource,
  road: Road,
  estimate: EstimateMaker,
): void {
  const lead = new LeadMaker(desk.services, trail, `lead ${key}`);
  const firstCall = { step: 'Call back', on: when.date(road.contactedOn) };
  const visit = { step: 'Measure the site', on: when.date(road.visitOn) };
  const expectedCents = roundedPrice(work);
  list.add(road.leadOn, 8, cast.owner, (scope) =>
    lead.take(scope, { title, contact, source, expectedCents, next: firstCall }),
  );
  list.add(road.contactedOn, 10, cast.owner, async (scope) => {
    await lead.move(scope, 'contacted');
    await lead.plan(scope, visit);
    await lead.note(scope, work.intro);
  });
  list.add(road.visitOn, 13, cast.owner, async (scope) => {
    await lead.move(scope, 'site-visit');
    await lead.plan(scope, { step: 'Write the estimate', on: when.date(road.estimateOn) });
    await lead.convert(scope, contact);
  });
  list.add(road.estimateOn, 14, cast.owner, async (scope) => {
    estimate.started(await lead.startEstimate(scope, title, contact));
  });
  list.add(road.sentOn, 16, cast.owner, (scope) =>
    lead.plan(scope, { step: 'Ask whether there are questions', on: when.date(road.sentOn + 4) }),
  );
  list.add(acceptedOn, 10, cast.owner, (scope) => lead.plan(scope, null));
}

/** Written, sent, asked about, and sent again where the first offer was changed. */
function offer(
  { list, cast }: Telling,
  { work, turns, contact }: Project,
  { estimateOn, sentOn, sentAgainOn }: Road,
  estimate: EstimateMaker,
  random: Generator,
): void {
  const schedule = turns.includes('four-stages') ? FOUR_STAGES : null;
  const first = sentAgainOn === null ? work : withAllowance(work);
  const greeting = `Hello ${contact.name.split(' ')[0]}, here is what we talked about. Call me with any question.`;
  list.add(estimateOn, 15, cast.owner, (scope) =>
    estimate.write(scope, { work: first, discountCents: 0, schedule }),
  );
  list.add(sentOn, 15, cast.owner, (scope) => estimate.send(scope, contact, greeting));
  if (turns.includes('asked')) {
    const [question, answer] = random.pick(QUESTIONS);
    list.add(sentOn, 19, cast.owner, (scope) => estimate.ask(scope, question));
    list.add(sentOn + 1, 8, cast.owner, (scope) => estimate.answer(scope, answer));
  }
  list.add(sentAgainOn, 14, cast.owner, async (scope) => {
    await estimate.revise(scope);
    await estimate.write(scope, { work, discountCents: random.whole(2, 9) * 5_000, schedule });
    await estimate.send(scope, contact, 'Changed as we agreed: no allowance, and the price for the whole.');
  });
}

const QUESTIONS = [
  [
    'How long from the deposit until you install?',
    'Six to eight weeks. We set the day when the drawings are approved.',
  ],
  ['Are the insides finished too?', 'Yes. The boxes come prefinished, with a clear coat.'],
  ['Can we buy the pulls ourselves?', 'You can. Tell us the hole distance and we take the allowance off.'],
  ['Who takes the old ones out?', 'That is not in the price. Most have it done the day before we come.'],
  [
    'Does the finish yellow?',
    'This one does so hardly at all. We bring a sample that has stood in the window for a year.',
  ],
] as const;

/** The offer as it was first written, with something in it that was talked about and left out again. */
function withAllowance(work: Work): Work {
  const [first, ...rest] = work.rooms;
  if (!first) return work;
  const allowance = item('other', 'Allowance for changes on site', [1, 'lot'], 320);
  return { ...work, rooms: [{ ...first, lines: [...first.lines, allowance] }, ...rest] };
}

/** What one says on the phone: the price to the next five hundred. */
function roundedPrice({ rooms }: Work): number {
  const cents = rooms
    .flatMap(({ lines }) => lines)
    .reduce((sum, { quantity, unitPriceCents }) => sum + Number(quantity) * unitPriceCents, 0);
  return Math.round(cents / 50_000) * 50_000;
}
