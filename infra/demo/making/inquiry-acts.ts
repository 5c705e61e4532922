import { addDays } from '@bookmatch/common/calendar/shop-dates';
import { OPEN_LEAD_STAGES } from '@bookmatch/common/leads/leads-contract';
import type { Contact } from '../cast/contacts.js';
import type { Inquiry, Offer } from '../plan/inquiries.js';
import { EstimateMaker } from './estimate-maker.js';
import { LeadMaker } from './lead-maker.js';
import type { Telling } from './telling.js';

/** What was done about somebody who asked and has not bought. */
export function followInquiry(telling: Telling, name: string, inquiry: Inquiry, contact: Contact): void {
  const { desk, trail, list, when, cast } = telling;
  const { cameOn, stage, note, lost, offer } = inquiry;
  const lead = new LeadMaker(desk.services, trail, `lead ${name}`);
  const next = inquiry.next && { step: inquiry.next.step, on: addDays(when.today, inquiry.next.inDays) };
  const expectedCents = inquiry.expectedDollars === null ? null : inquiry.expectedDollars * 100;
  list.add(cameOn, 8, cast.owner, async (scope) => {
    await lead.take(scope, { ...inquiry, contact, expectedCents, next: stage === 'new' ? next : null });
    if (note !== '') await lead.note(scope, note);
  });
  // One stage about every two days; where an estimate was started, that takes the last step by itself.
  const last = OPEN_LEAD_STAGES.indexOf(stage);
  const moved = offer ? last - 1 : last;
  for (let step = 1; step <= moved; step += 1) {
    const to = OPEN_LEAD_STAGES[step]!;
    list.add(Math.min(0, cameOn + step * 2 - 1), 9 + step, cast.owner, (scope) => lead.move(scope, to));
  }
  const offeredOn = Math.min(0, cameOn + 6);
  if (offer) makeOffer(telling, lead, name, inquiry.title, offer, offeredOn, contact);
  if (stage !== 'new' && next)
    list.add(Math.min(0, offer ? offeredOn + 2 : cameOn + 5), 17, cast.owner, (scope) =>
      lead.plan(scope, next),
    );
  if (lost) list.add(lost.on, 16, cast.owner, (scope) => lead.lose(scope, lost.reason, lost.note));
}

function makeOffer(
  { desk, trail, list, cast }: Telling,
  lead: LeadMaker,
  name: string,
  title: string,
  { work, sentOn, question, declined }: Offer,
  startedOn: number,
  contact: Contact,
): void {
  const estimate = new EstimateMaker(desk, trail, `estimate ${name}`);
  list.add(startedOn, 14, cast.owner, async (scope) => {
    await lead.convert(scope, contact);
    estimate.started(await lead.startEstimate(scope, title, contact));
    await estimate.write(scope, { work, discountCents: 0, schedule: null });
  });
  list.add(sentOn, 15, cast.owner, (scope) => estimate.send(scope, contact, ''));
  if (sentOn !== null && question) {
    const { asked, answer } = question;
    list.add(sentOn + 1, 18, cast.owner, (scope) => estimate.ask(scope, asked));
    if (answer !== null) list.add(sentOn + 2, 9, cast.owner, (scope) => estimate.answer(scope, answer));
  }
  if (!declined) return;
  const { by, on, reason } = declined;
  list.add(on, 12, cast.owner, (scope) =>
    by === 'customer' ? estimate.decline(scope, reason) : estimate.declineForCustomer(scope, reason),
  );
}
