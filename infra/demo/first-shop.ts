import { dateIn } from '@bookmatch/common/calendar/shop-dates';
import { Workdays } from './calendar/workdays.js';
import {
  BENCH_HAND,
  BOOKKEEPER,
  FINISHER,
  FIRST_SHOP_MEMBERS,
  LEAD_HAND,
  OWNER,
  type Person,
} from './cast/people.js';
import { FIRST_SHOP } from './cast/shops.js';
import { Generator } from './chance/generator.js';
import type { Hand } from './crew/hands.js';
import type { Shift, Task } from './crew/shift.js';
import { slipOf } from './crew/slips.js';
import { ActList } from './making/act-list.js';
import { billExtraWork, billJob, billSmall } from './making/billing-acts.js';
import { HandAtTheClock } from './making/clock-acts.js';
import type { Desk } from './making/desk.js';
import { liveThrough, type Story } from './making/history.js';
import { followInquiry } from './making/inquiry-acts.js';
import { runJob } from './making/job-acts.js';
import { openShop, subscribe, takeCards, takeIn, type Ground } from './making/opening.js';
import { addPictures } from './making/picture-acts.js';
import { sellJob } from './making/sales-acts.js';
import type { Telling } from './making/telling.js';
import { Trail } from './making/trail.js';
import { When } from './making/when.js';
import { planFirstYear, SIGN_UP_DAY, type PlannedYear } from './plan/first-year.js';
import { SMALL_BILLS } from './plan/small-bills.js';

const HOUR_MS = 3_600_000;
/** The trial lasts 14 days and is nearly over when the owner subscribes. */
const SUBSCRIBED_AFTER_MS = 13 * 24 * HOUR_MS;
/** Every so many-th job has a drawing and a photo. */
const PICTURED_EVERY = 4;

/** The shop with a year behind it. @param now the moment at which its history ends */
export async function makeFirstShop(ground: Ground, now: Date): Promise<Desk> {
  const random = new Generator('Quillback');
  const days = new Workdays(dateIn(FIRST_SHOP.timeZone, now.toISOString()));
  const when = new When(FIRST_SHOP.timeZone, days, random.stream('when'), now);
  const desk = await open(ground, when.at(SIGN_UP_DAY, 9 * 60));
  const trail = new Trail();
  const crew = [BENCH_HAND, FINISHER];
  const cast = { owner: OWNER, bookkeeper: BOOKKEEPER, leadHand: LEAD_HAND, crew };
  const telling = { desk, trail, when, cast, list: new ActList(when) };
  const year = planFirstYear(random);
  tellOffice(telling, year, random);
  const floor = tellFloor(telling, year.shifts, random.stream('clock'));
  await liveThrough(desk, { acts: telling.list.acts, trail }, floor);
  return desk;
}

async function open(ground: Ground, at: Date): Promise<Desk> {
  const desk = await openShop(ground, OWNER, FIRST_SHOP, at);
  for (const place of FIRST_SHOP_MEMBERS) await takeIn(desk, OWNER, place, new Date(at.getTime() + HOUR_MS));
  await takeCards(desk, OWNER, FIRST_SHOP.shopName, new Date(at.getTime() + 2 * HOUR_MS));
  await subscribe(desk, OWNER, new Date(at.getTime() + SUBSCRIBED_AFTER_MS));
  return desk;
}

function tellOffice(telling: Telling, { jobs, inquiries }: PlannedYear, random: Generator): void {
  const taxRate = FIRST_SHOP.settings.defaultTaxRate ?? '0';
  jobs.forEach(({ project, road, milestones, stages, purchases }, index) => {
    const draw = random.stream(`telling ${project.key}`);
    if (project.origin !== 'by-hand') sellJob(telling, project, road, draw);
    runJob(telling, project, milestones, purchases, taxRate, draw.stream('job'));
    billJob(telling, project, stages, draw.stream('payments'));
    billExtraWork(telling, project, milestones, draw.stream('extra'));
    if (index % PICTURED_EVERY === 0) addPictures(telling, project, milestones, draw.stream('pictures'));
  });
  inquiries.forEach(({ inquiry, contact }, index) =>
    followInquiry(telling, `inquiry ${index}`, inquiry, contact),
  );
  SMALL_BILLS.forEach((bill, index) =>
    billSmall(telling, `small bill ${index}`, bill, random.stream(`bill ${index}`)),
  );
}

function tellFloor({ desk, trail: jobs, when }: Telling, shifts: readonly Shift[], random: Generator): Story {
  const trail = new Trail();
  const at = (person: Person, source: 'phone' | 'desk', putRightBy: Person) =>
    new HandAtTheClock(desk, jobs, trail, when, { person, source, putRightBy });
  const hands: Record<Hand, HandAtTheClock> = {
    'lead-hand': at(LEAD_HAND, 'desk', OWNER),
    'bench-hand': at(BENCH_HAND, 'phone', LEAD_HAND),
    finisher: at(FINISHER, 'phone', LEAD_HAND),
  };
  shifts.forEach((shift, index) => {
    const next = shifts.slice(index + 1).find(({ hand }) => hand === shift.hand);
    const overnight = next?.day === shift.day + 1 && when.isFollowedByWork(shift.day);
    const draw = random.stream(`${shift.hand} ${shift.day}`);
    hands[shift.hand].clock(shift, slipOf(shift, overnight, draw), draw);
  });
  hands.finisher.startNow(lastTask(shifts, 'finisher'), 42);
  return { acts: Object.values(hands).flatMap(({ acts }) => acts), trail };
}

/** What a hand worked on last before today. */
function lastTask(shifts: readonly Shift[], hand: Hand): Task {
  const tasks = shifts
    .filter((shift) => shift.hand === hand && shift.day < 0)
    .flatMap(({ stretches }) => stretches.map(({ task }) => task));
  const last = tasks.findLast(({ kind }) => kind === 'job');
  if (!last) throw new RangeError(`The ${hand} has not worked on a job.`);
  return last;
}
