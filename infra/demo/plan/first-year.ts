import { askedContact, type Contact } from '../cast/contacts.js';
import type { Generator } from '../chance/generator.js';
import type { Milestones } from '../crew/job-progress.js';
import type { Shift } from '../crew/shift.js';
import { CrewYear } from '../crew/year-of-work.js';
import { billingOf, type StageBilling } from './billing.js';
import { INQUIRIES, type Inquiry } from './inquiries.js';
import type { Project, WorkdayIndex } from './project.js';
import { PROJECTS } from './projects.js';
import { purchasesOf, type Purchase } from './purchases.js';
import { roadOf, type Road } from './road.js';

/** The days on which it began: the shop signed up, took the first inquiries, and the crew clocked in. */
export const SIGN_UP_DAY: WorkdayIndex = -253;
export const FIRST_DAY: WorkdayIndex = -252;
export const FIRST_WORKING_DAY: WorkdayIndex = -249;

export type PlannedJob = {
  project: Project;
  road: Road;
  milestones: Milestones;
  stages: StageBilling[];
  purchases: Purchase[];
};
export type PlannedYear = {
  jobs: PlannedJob[];
  inquiries: { inquiry: Inquiry; contact: Contact }[];
  shifts: Shift[];
};

/** The whole year of the first shop, in working days back from today: the same on whatever day it is made. */
export function planFirstYear(random: Generator): PlannedYear {
  const crew = new CrewYear(PROJECTS, random.stream('crew'));
  const { shifts, milestones } = crew.workThrough(FIRST_WORKING_DAY);
  const jobs = PROJECTS.map((project) => {
    const reached = milestones.get(project.key);
    if (!reached) throw new RangeError(`The crew does not know ${project.key}.`);
    const draw = random.stream(project.key);
    return {
      project,
      milestones: reached,
      road: roadOf(project, FIRST_DAY, draw.stream('road')),
      stages: billingOf(project, reached, draw.stream('billing')),
      purchases: purchasesOf(project, reached, draw.stream('purchases')),
    };
  });
  const inquiries = INQUIRIES.map((inquiry, index) => ({ inquiry, contact: askedContact(index) }));
  return { jobs, inquiries, shifts };
}
