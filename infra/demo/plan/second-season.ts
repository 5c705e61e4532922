import { kitchenette, shelfWall } from '../catalog/metric.js';
import { WOODS } from '../catalog/work.js';
import { contactElsewhere, type Contact } from '../cast/contacts.js';
import type { Milestones } from '../crew/job-progress.js';
import type { Shift, Stretch } from '../crew/shift.js';
import { atHour } from '../calendar/wall-clock.js';
import type { StageBilling } from './billing.js';
import type { Inquiry } from './inquiries.js';
import type { Project, WorkdayIndex } from './project.js';
import type { Road } from './road.js';

/**
 * The second shop began a week ago and is in its trial: a handful of everything, to see the wall between shops. Five
 * working days are less than the trial's 14 days also over Christmas.
 */
export const SECOND_SIGN_UP_DAY: WorkdayIndex = -5;

type SmallJob = { project: Project; road: Road; milestones: Milestones; stages: StageBilling[] };
const NOWHERE: Milestones = {
  ...{ measuredOn: null, approvedOn: null, materialOn: null, buildingOn: null },
  ...{ finishingOn: null, installingOn: null, doneOn: null },
};
const usual = { turns: [], trouble: null, pace: { measure: 1, approval: 1, material: 1 }, tempo: 1 } as const;
const roadFrom = (leadOn: number): Road => ({
  ...{ leadOn, contactedOn: leadOn, visitOn: leadOn + 1, estimateOn: leadOn + 1 },
  ...{ sentOn: leadOn + 1, sentAgainOn: null },
});
const stage = (
  number: number,
  issuedOn: WorkdayIndex | null,
  payments: StageBilling['payments'],
): StageBilling => ({
  ...{ stage: number, issuedOn, payments, remindedOn: [], credit: null },
});

export const SECOND_JOBS: readonly SmallJob[] = [
  {
    project: {
      ...usual,
      key: 'shelf wall',
      title: 'Shelf wall, white ash',
      contact: contactElsewhere(0),
      work: shelfWall({ wood: WOODS.ash, sections: 4 }),
      acceptedOn: -3,
      origin: 'referral',
    },
    road: roadFrom(-5),
    milestones: { ...NOWHERE, measuredOn: -3, approvedOn: -2, materialOn: -2, buildingOn: -1 },
    stages: [stage(0, -3, [{ on: -2, share: 1, by: 'check' }]), stage(1, null, [])],
  },
  {
    project: {
      ...usual,
      key: 'kitchenette',
      title: 'Kitchenette for a studio',
      contact: contactElsewhere(1),
      work: kitchenette({ wood: WOODS.maple, modules: 4 }),
      acceptedOn: -1,
      origin: 'website',
    },
    road: roadFrom(-4),
    milestones: NOWHERE,
    stages: [stage(0, -1, []), stage(1, null, [])],
  },
];

export const SECOND_INQUIRIES: readonly { inquiry: Inquiry; contact: Contact }[] = [
  {
    contact: contactElsewhere(2),
    inquiry: {
      title: 'Wardrobes for three rooms',
      ...{ source: 'contractor', cameOn: -4, stage: 'contacted', expectedDollars: 14_000 },
      note: 'Three alike, 2400 mm high.',
      ...{ next: { step: 'Agree a time to measure', inDays: 1 }, lost: null, offer: null },
    },
  },
  {
    contact: contactElsewhere(3),
    inquiry: {
      title: 'Boat cupboard',
      ...{ source: 'walk-in', cameOn: -2, stage: 'new', expectedDollars: null },
      note: 'Asked whether it can hang from rope.',
      ...{ next: null, lost: null, offer: null },
    },
  },
];

const onShelves = (operation: 'Cut sheet goods' | 'Assemble boxes') =>
  ({ kind: 'job', project: 'shelf wall', operation }) as const;
const DAY: Stretch[] = [
  { from: atHour(8), to: atHour(12), task: onShelves('Cut sheet goods') },
  { from: atHour(12), to: atHour(12, 30), task: { kind: 'meal' } },
  { from: atHour(12, 30), to: atHour(16), task: onShelves('Assemble boxes') },
];
export const SECOND_SHIFTS: readonly Shift[] = [-1].map((day) => ({
  hand: 'bench-hand',
  day,
  stretches: DAY,
}));
