import { dateIn } from '@bookmatch/common/calendar/shop-dates';
import { Workdays } from './calendar/workdays.js';
import { BOOKKEEPER, SECOND_CREW, SECOND_OWNER, SECOND_SHOP_MEMBERS } from './cast/people.js';
import { SECOND_SHOP } from './cast/shops.js';
import { Generator } from './chance/generator.js';
import { ActList } from './making/act-list.js';
import { billJob } from './making/billing-acts.js';
import { HandAtTheClock } from './making/clock-acts.js';
import type { Desk } from './making/desk.js';
import { liveThrough } from './making/history.js';
import { followInquiry } from './making/inquiry-acts.js';
import { runJob } from './making/job-acts.js';
import { openShop, takeIn, type Ground } from './making/opening.js';
import { sellJob } from './making/sales-acts.js';
import { Trail } from './making/trail.js';
import { When } from './making/when.js';
import { SECOND_INQUIRIES, SECOND_JOBS, SECOND_SHIFTS, SECOND_SIGN_UP_DAY } from './plan/second-season.js';

/** A shop of its own in another zone, with the same bookkeeper. Its trial has days left. */
export async function makeSecondShop(ground: Ground, now: Date): Promise<Desk> {
  const random = new Generator('Oxbow');
  const days = new Workdays(dateIn(SECOND_SHOP.timeZone, now.toISOString()));
  const when = new When(SECOND_SHOP.timeZone, days, random.stream('when'), now);
  const signedUpAt = when.at(SECOND_SIGN_UP_DAY, 7 * 60);
  const desk = await openShop(ground, SECOND_OWNER, SECOND_SHOP, signedUpAt);
  for (const place of SECOND_SHOP_MEMBERS) await takeIn(desk, SECOND_OWNER, place, signedUpAt);
  const [trail, floorTrail] = [new Trail(), new Trail()];
  const cast = { owner: SECOND_OWNER, bookkeeper: BOOKKEEPER, leadHand: SECOND_OWNER, crew: [SECOND_CREW] };
  const telling = { desk, trail, when, cast, list: new ActList(when) };
  const taxRate = SECOND_SHOP.settings.defaultTaxRate ?? '0';
  for (const { project, road, milestones, stages } of SECOND_JOBS) {
    sellJob(telling, project, road, random.stream(project.key));
    runJob(telling, project, milestones, [], taxRate, random.stream(`job ${project.key}`));
    billJob(telling, project, stages, random.stream(`payments ${project.key}`));
  }
  SECOND_INQUIRIES.forEach(({ inquiry, contact }, index) =>
    followInquiry(telling, `inquiry ${index}`, inquiry, contact),
  );
  const who = { person: SECOND_CREW, source: 'phone', putRightBy: SECOND_OWNER } as const;
  const hand = new HandAtTheClock(desk, trail, floorTrail, when, who);
  for (const shift of SECOND_SHIFTS) hand.clock(shift, null, random.stream(`clock ${shift.day}`));
  await liveThrough(desk, { acts: telling.list.acts, trail }, { acts: hand.acts, trail: floorTrail });
  return desk;
}
