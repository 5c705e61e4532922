import type { Role } from '@bookmatch/common/access/roles';

/** Who acts in the demo. Every name, address and place in it is invented. */
export type Person = { name: string; email: string };

/** One for all, so that a visitor has one thing to remember. Also in sign-ins.json, which `npm start` prints. */
export const DEMO_PASSWORD = 'shavings on the floor';

export const OWNER: Person = { name: 'Rowan Hathersby', email: 'rowan@quillback.example' };
/** Keeps the books of both shops, from outside. */
export const BOOKKEEPER: Person = { name: 'Ottilie Brandvold', email: 'ottilie@evenledger.example' };
export const LEAD_HAND: Person = { name: 'Desmond Achterberg', email: 'desmond@quillback.example' };
export const BENCH_HAND: Person = { name: 'Tamsin Oyelade', email: 'tamsin@quillback.example' };
export const FINISHER: Person = { name: 'Jory Pellwood', email: 'jory@quillback.example' };

export const SECOND_OWNER: Person = { name: 'Signe Marrow', email: 'signe@oxbowteal.example' };
export const SECOND_CREW: Person = { name: 'Bram Okkerman', email: 'bram@oxbowteal.example' };

/** A person's place in a shop; the cost of an hour is set from the first day. */
export type Place = { person: Person; role: Role; laborCostCentsPerHour: number | null };

export const FIRST_SHOP_MEMBERS: readonly Place[] = [
  { person: BOOKKEEPER, role: 'bookkeeper', laborCostCentsPerHour: null },
  { person: LEAD_HAND, role: 'lead-hand', laborCostCentsPerHour: 4650 },
  { person: BENCH_HAND, role: 'crew', laborCostCentsPerHour: 3825 },
  { person: FINISHER, role: 'crew', laborCostCentsPerHour: 3540 },
];
export const SECOND_SHOP_MEMBERS: readonly Place[] = [
  { person: BOOKKEEPER, role: 'bookkeeper', laborCostCentsPerHour: null },
  { person: SECOND_CREW, role: 'crew', laborCostCentsPerHour: 3650 },
];
