import type { LeadSource, LostReason, OpenLeadStage } from '@bookmatch/common/leads/leads-contract';
import { vanities } from '../catalog/baths.js';
import { kitchen } from '../catalog/kitchens.js';
import { closet, mudroomLockers } from '../catalog/storage.js';
import { officeBuiltIn } from '../catalog/trade.js';
import { libraryWall, mediaWall } from '../catalog/walls.js';
import { WOODS, type Work } from '../catalog/work.js';
import type { WorkdayIndex } from './project.js';

/** What became of the estimate of somebody who has not bought. */
export type Offer = {
  work: Work;
  /** Null while it is a draft. A sent one from more than 30 days ago has expired. */
  sentOn: WorkdayIndex | null;
  question?: { asked: string; answer: string | null };
  declined?: { by: 'customer' | 'shop'; on: WorkdayIndex; reason: string };
};

/** Somebody who asked and did not buy, or has not yet. */
export type Inquiry = {
  title: string;
  source: LeadSource;
  cameOn: WorkdayIndex;
  expectedDollars: number | null;
  /** How far it came; a lost one, before it was lost. */
  stage: OpenLeadStage;
  note: string;
  /** Days from today, below zero when it is late; null without one. */
  next: { step: string; inDays: number } | null;
  lost: { reason: LostReason; note: string; on: WorkdayIndex } | null;
  offer: Offer | null;
};

const { maple, poplar, whiteOak, cherry, walnut, ash } = WOODS;
type Rest = Partial<Pick<Inquiry, 'expectedDollars' | 'next' | 'lost' | 'offer'>>;
function inquiry(
  cameOn: WorkdayIndex,
  title: string,
  source: LeadSource,
  stage: OpenLeadStage,
  note: string,
  rest: Rest = {},
): Inquiry {
  return {
    title,
    source,
    cameOn,
    stage,
    note,
    expectedDollars: null,
    next: null,
    lost: null,
    offer: null,
    ...rest,
  };
}
const next = (step: string, inDays: number) => ({ step, inDays });
const lost = (on: WorkdayIndex, reason: LostReason, note = '') => ({ on, reason, note });

/** In the order of `askedContact`. */
export const INQUIRIES: readonly Inquiry[] = [
  // What waits for somebody.
  inquiry(
    -1,
    'Built-in dining bench',
    'website',
    'new',
    'Wrote last night. Seats six, storage below, L-shaped.',
  ),
  inquiry(
    -1,
    'Kitchen, painted, 1920s house',
    'referral',
    'new',
    'Sent by the Wexcombes. Walls are out of plumb, she says.',
    { next: next('Call back', 0) },
  ),
  inquiry(
    -2,
    'Garage storage wall',
    'walk-in',
    'new',
    'Came by on the way home. Wants ply and open bins, nothing fancy.',
    { next: next('Call back', -1) },
  ),
  inquiry(
    -2,
    'Shelving for a pottery studio',
    'show-or-fair',
    'new',
    'Met at the spring fair. Heavy load, 200 lb a shelf.',
    { next: next('Ask for a sketch with sizes', 1) },
  ),
  inquiry(-5, 'Laundry room', 'website', 'contacted', 'Second floor, narrow stairs. Knows what she wants.', {
    expectedDollars: 12500,
    next: next('Agree a time to measure', 1),
  }),
  inquiry(
    -6,
    'Three kitchens for a row of houses',
    'contractor',
    'contacted',
    'Three alike, staggered by a month. Wants a price for one first.',
    { expectedDollars: 58000, next: next('Send two references', -2) },
  ),
  inquiry(
    -8,
    'Media wall with fireplace',
    'referral',
    'contacted',
    'Mantel to be kept. Asked about clearances to the firebox; told them the maker of it has the last word.',
    { expectedDollars: 14000, next: next('Call after they have the firebox papers', 4) },
  ),
  inquiry(-10, 'Sewing room', 'website', 'contacted', 'Machine table that folds away. No hurry.', {
    next: next('Send photos of the closet at the Strohmark place', 2),
  }),
  inquiry(
    -9,
    'Two bathrooms',
    'designer',
    'site-visit',
    'Measured on Thursday. Floors are heated, so no screws into the slab.',
    { expectedDollars: 17500, next: next('Write the estimate', 1) },
  ),
  inquiry(
    -11,
    'Kitchen with pantry',
    'referral',
    'site-visit',
    'Measured with both of them. Ceiling drops 7/8 in over the run.',
    { expectedDollars: 36000, next: next('Ask which range they chose', -3) },
  ),
  inquiry(
    -13,
    'Wine room, walnut',
    'show-or-fair',
    'site-visit',
    'Basement, damp in summer. Told him to have that seen to first.',
    { expectedDollars: 22000, next: next('Call about the dehumidifier', 6) },
  ),
  inquiry(
    -12,
    'Library in a stair hall',
    'referral',
    'estimating',
    'Treads set the shelf heights. Drawing first, then the price.',
    {
      expectedDollars: 19000,
      next: next('Finish the estimate', 0),
      offer: { work: libraryWall({ wood: cherry, runFeet: 11, ladder: false }), sentOn: null },
    },
  ),
  inquiry(
    -15,
    'Mudroom lockers for four',
    'website',
    'estimating',
    'Four children, four doors, four colors.',
    {
      expectedDollars: 9500,
      next: next('Price the fourth color', 1),
      offer: { work: mudroomLockers({ wood: maple, bays: 4 }), sentOn: null },
    },
  ),
  inquiry(
    -19,
    'Kitchen, quarter sawn doors',
    'designer',
    'estimating',
    'Designer draws, we make. Wants shop drawings stamped by us.',
    {
      expectedDollars: 41000,
      next: next('Call the studio', 2),
      offer: {
        work: kitchen({
          wood: whiteOak,
          baseFeet: 20,
          wallFeet: 14,
          tall: 2,
          islandFeet: 7,
          doors: 26,
          drawers: 16,
          style: 'five-piece',
        }),
        sentOn: -6,
        question: { asked: 'Does the price hold if we move the island by two feet?', answer: null },
      },
    },
  ),
  inquiry(-22, 'Walk-in closet, cherry', 'referral', 'estimating', 'Wants drawers with locks for watches.', {
    expectedDollars: 18500,
    next: next('Ask what they think', -1),
    offer: {
      work: closet({ wood: cherry, runFeet: 24, drawers: 12, island: true }),
      sentOn: -9,
      question: {
        asked: 'Can the island come in walnut?',
        answer: 'It can, for about 480 more. Say so and we send a new revision.',
      },
    },
  }),
  inquiry(
    -20,
    'Vanity with makeup table',
    'walk-in',
    'estimating',
    'Sink at one end, knee space at the other.',
    {
      expectedDollars: 7500,
      next: next('Call on Friday', 3),
      offer: { work: vanities({ wood: ash, count: 1, towers: 1 }), sentOn: -12 },
    },
  ),
  inquiry(
    -52,
    'Kitchen, slab fronts, whole floor',
    'contractor',
    'estimating',
    'Waits for his permit since spring.',
    {
      expectedDollars: 46000,
      next: next('Ask about the permit', -9),
      offer: {
        work: kitchen({
          wood: walnut,
          baseFeet: 26,
          wallFeet: 12,
          tall: 4,
          islandFeet: 10,
          doors: 26,
          drawers: 24,
          style: 'slab',
        }),
        sentOn: -38,
      },
    },
  ),
  // What came to nothing.
  inquiry(-230, 'Kitchen, laminate', 'website', 'contacted', 'Asked for the lowest price first.', {
    expectedDollars: 9000,
    lost: lost(-224, 'out-of-scope', 'Wants melamine boxes off the shelf.'),
  }),
  inquiry(-214, 'Bookcase, one', 'walk-in', 'contacted', '', {
    expectedDollars: 1400,
    lost: lost(-205, 'price', 'Found one for 300 at a store.'),
  }),
  inquiry(-196, 'Kitchen for a rental', 'contractor', 'site-visit', 'Measured. Owner lives abroad.', {
    expectedDollars: 24000,
    lost: lost(-172, 'no-answer', 'Four calls, two letters.'),
  }),
  inquiry(-184, 'Study, two walls', 'designer', 'estimating', 'Likes the walnut samples.', {
    expectedDollars: 21000,
    lost: lost(-158, 'price'),
    offer: {
      work: officeBuiltIn({ wood: walnut, runFeet: 20, desks: 1 }),
      sentOn: -170,
      declined: {
        by: 'customer',
        on: -159,
        reason: 'It is beautiful, but a third above what we had set aside.',
      },
    },
  }),
  inquiry(-163, 'Entertainment center', 'website', 'contacted', '', { lost: lost(-150, 'no-answer') }),
  inquiry(-149, 'Bar for a club house', 'show-or-fair', 'site-visit', 'Committee of nine.', {
    expectedDollars: 52000,
    lost: lost(-118, 'timing', 'Put off to next year. Call in spring.'),
  }),
  inquiry(-131, 'Kitchen, shaker, white', 'website', 'estimating', 'Three offers wanted.', {
    expectedDollars: 31000,
    lost: lost(-101, 'went-elsewhere', 'A shop in Tessaly can start in two weeks.'),
    offer: {
      work: kitchen({
        wood: maple,
        baseFeet: 20,
        wallFeet: 15,
        tall: 1,
        islandFeet: 6,
        doors: 26,
        drawers: 12,
        style: 'five-piece',
      }),
      sentOn: -113,
      declined: { by: 'shop', on: -101, reason: 'Called: they took a shop that can start sooner.' },
    },
  }),
  inquiry(-110, 'Outdoor kitchen', 'referral', 'contacted', '', {
    expectedDollars: 16000,
    lost: lost(-104, 'out-of-scope', 'We build for indoors. Gave two names.'),
  }),
  inquiry(-90, 'Media wall', 'website', 'estimating', 'Screen of 85 in, wants it hidden.', {
    expectedDollars: 13000,
    lost: lost(-58, 'timing', 'Baby first.'),
    offer: {
      work: mediaWall({ wood: whiteOak, runFeet: 12 }),
      sentOn: -74,
      declined: { by: 'customer', on: -59, reason: 'Not this year after all. We will come back.' },
    },
  }),
  inquiry(-79, 'Closet doors only', 'walk-in', 'contacted', '', {
    expectedDollars: 2200,
    lost: lost(-73, 'price'),
  }),
  inquiry(-54, 'Church vestry cupboards', 'referral', 'site-visit', 'Council meets on the first Monday.', {
    expectedDollars: 15500,
    lost: lost(-26, 'other', 'The council gives the work to a member.'),
  }),
  inquiry(-40, 'Base cabinets for an island', 'website', 'estimating', 'Only the island; the rest is new.', {
    expectedDollars: 6800,
    lost: lost(-14, 'no-answer', 'Never opened again after the first day.'),
    offer: {
      work: kitchen({
        wood: poplar,
        baseFeet: 8,
        wallFeet: 0,
        tall: 0,
        islandFeet: 0,
        doors: 4,
        drawers: 6,
        style: 'five-piece',
      }),
      sentOn: -31,
    },
  }),
];
