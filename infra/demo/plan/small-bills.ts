import { contactOf, type Contact, type ContactKey } from '../cast/contacts.js';
import type { PaidBy } from './billing.js';
import type { WorkdayIndex } from './project.js';

/** A repair or a small piece for somebody the shop has worked for, billed by itself. */
export type SmallBill = {
  contact: Contact;
  lines: readonly (readonly [description: string, quantity: string, dollars: number, taxable: boolean])[];
  /** Null while it is a draft. */
  issuedOn: WorkdayIndex | null;
  /** The day it is written; of a draft only. */
  writtenOn: WorkdayIndex;
  paid: { on: WorkdayIndex; by: PaidBy } | null;
  creditedWhole: { on: WorkdayIndex; reason: string } | null;
};

function bill(
  who: ContactKey,
  issuedOn: WorkdayIndex,
  lines: SmallBill['lines'],
  paid: SmallBill['paid'],
): SmallBill {
  return { contact: contactOf(who), lines, issuedOn, writtenOn: issuedOn, paid, creditedWhole: null };
}

/** By the day they were written. */
export const SMALL_BILLS: readonly SmallBill[] = [
  bill(
    'pell',
    -196,
    [
      ['Adjust doors, replace two hinges', '1.5', 92, false],
      ['Hinges, soft close', '2', 9, true],
    ],
    { on: -196, by: 'cash' },
  ),
  bill('tarn', -171, [['One more shelf for the boot bay, painted', '1', 165, true]], {
    on: -166,
    by: 'card',
  }),
  bill('birk', -141, [['Ladder rail, move by 14 in', '3', 94, false]], { on: -133, by: 'check' }),
  {
    ...bill('okafor', -127, [['Filler at the new refrigerator', '1', 210, true]], null),
    creditedWhole: { on: -125, reason: 'Billed twice: it was in the price of the kitchen.' },
  },
  bill('quill', -104, [['Drawer divider inserts, maple', '4', 48, true]], { on: -99, by: 'check' }),
  bill(
    'ebb',
    -77,
    [
      ['Grommets and a keyboard tray', '2', 74, true],
      ['Fitting', '1', 92, false],
    ],
    { on: -71, by: 'transfer' },
  ),
  bill(
    'brul',
    -70,
    [
      ['Repair of the elbow rail after a spill', '5', 88, false],
      ['Varnish and paper', '1', 46, true],
    ],
    null,
  ),
  bill('yarr', -29, [['Two picture ledges, cherry', '2', 135, true]], { on: -27, by: 'card' }),
  bill('ruan', -6, [['Shelf pins and six more shelves', '6', 39, true]], null),
  {
    ...bill(
      'nak',
      -3,
      [
        ['Second row of hooks', '6', 17, true],
        ['Fitting', '0.5', 92, false],
      ],
      null,
    ),
    issuedOn: null,
  },
];
