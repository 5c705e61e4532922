import type { BillingStagePlan } from '@bookmatch/common/estimates/billing-schedule-contract';
import type { RecordedMethod } from '@bookmatch/common/invoices/invoice-standings';
import type { Generator } from '../chance/generator.js';
import type { Milestones } from '../crew/job-progress.js';
import type { Project, Trouble, WorkdayIndex } from './project.js';

export type PaidBy = RecordedMethod | 'card';
/** Money that comes in: a share of what is owed then, 1 for all of it. */
export type PlannedPayment = { on: WorkdayIndex; share: number; by: PaidBy; returnedOn?: WorkdayIndex };

/** What happens to the invoice of one stage of the billing schedule. */
export type StageBilling = {
  stage: number;
  /** Null while it stays a draft. */
  issuedOn: WorkdayIndex | null;
  remindedOn: WorkdayIndex[];
  credit: { on: WorkdayIndex; cents: number; reason: string } | null;
  payments: PlannedPayment[];
};

export const FOUR_STAGES: readonly BillingStagePlan[] = [
  { name: 'Deposit', share: { percent: '35' }, deposit: true, due: 'on-acceptance' },
  { name: 'Boxes built', share: { percent: '25' }, deposit: false, due: 'by-hand' },
  { name: 'Ready to finish', share: { percent: '25' }, deposit: false, due: 'by-hand' },
  { name: 'Installed', share: { remainder: true }, deposit: false, due: 'by-hand' },
];

type Part = 'deposit' | 'progress' | 'final';
/** The working days until the money comes, as most pay. Two weeks are given, so that some of the last come late. */
const USUAL_DAYS: Record<Part, readonly [number, number]> = {
  deposit: [1, 6],
  progress: [3, 9],
  final: [4, 14],
};

/** How a job is billed and paid, as far as it came. Days after today are in the plan and do not happen. */
export function billingOf(project: Project, milestones: Milestones, random: Generator): StageBilling[] {
  const { acceptedOn, turns, trouble } = project;
  const { buildingOn, finishingOn, doneOn } = milestones;
  const boxesOn =
    buildingOn === null || finishingOn === null ? null : Math.floor((buildingOn + finishingOn) / 2);
  const stages: [Part, WorkdayIndex | null][] = [
    [
      'deposit',
      trouble === 'deposit-not-issued' ? null : acceptedOn + (project.origin === 'by-hand' ? 1 : 0),
    ],
    ...(turns.includes('four-stages') ? ([['progress', boxesOn]] as [Part, WorkdayIndex | null][]) : []),
    ['progress', finishingOn],
    ['final', doneOn === null ? null : doneOn + 1],
  ];
  return stages.map(([part, issuedOn], stage) => {
    const isLastProgress = part === 'progress' && stages[stage + 1]?.[0] === 'final';
    const stageTrouble = trouble !== null && hits(trouble, part, isLastProgress) ? trouble : null;
    const usual = { stage, issuedOn, remindedOn: [], credit: null, payments: [] };
    if (issuedOn === null) return usual;
    const draw = random.stream(`stage ${stage}`);
    const payment = usualPayment(project, part, issuedOn, draw);
    return { ...usual, ...afterTrouble(stageTrouble, issuedOn, payment) };
  });
}

function hits(trouble: Trouble, part: Part, isLastProgress: boolean): boolean {
  if (trouble.startsWith('progress')) return isLastProgress;
  return part === 'final' && trouble !== 'deposit-not-issued';
}

function usualPayment(
  project: Project,
  part: Part,
  issuedOn: WorkdayIndex,
  random: Generator,
): PlannedPayment {
  const on = issuedOn + random.whole(...USUAL_DAYS[part]);
  return { on, share: 1, by: random.pick(waysToPay(project)) };
}

/** Firms send checks and transfers; homeowners also pay by card, and small sums in cash. */
function waysToPay({ contact, work }: Project): readonly PaidBy[] {
  if (contact.kind !== 'homeowner') return ['check', 'check', 'transfer'];
  const small = work.rooms.flatMap(({ lines }) => lines).length < 17;
  return ['check', 'check', 'transfer', 'card', 'card', ...(small ? (['cash'] as const) : [])];
}

function afterTrouble(
  trouble: Trouble | null,
  issuedOn: WorkdayIndex,
  payment: PlannedPayment,
): Pick<StageBilling, 'payments'> & Partial<StageBilling> {
  switch (trouble) {
    case 'final-overdue-long':
      return { payments: [], remindedOn: [issuedOn + 15, issuedOn + 31] };
    case 'final-overdue':
    case 'progress-overdue':
      return { payments: [], remindedOn: [issuedOn + 13] };
    case 'final-part-paid':
      return { payments: [{ ...payment, share: 0.6, by: 'check' }], remindedOn: [issuedOn + 14] };
    case 'progress-part-paid':
      return { payments: [{ on: issuedOn, share: 0.5, by: 'transfer' }] };
    case 'final-part-credited': {
      const credit = {
        on: issuedOn + 2,
        cents: 45_000,
        reason:
          'One door came with a wrong grain match; it is made new and the price of its finish taken off.',
      };
      return { payments: [{ ...payment, on: issuedOn + 6 }], credit };
    }
    case 'check-returned': {
      const returned: PlannedPayment = { on: issuedOn + 4, share: 1, by: 'check', returnedOn: issuedOn + 9 };
      return {
        payments: [returned, { on: issuedOn + 12, share: 1, by: 'transfer' }],
        remindedOn: [issuedOn + 9],
      };
    }
    case 'deposit-not-issued':
    case null:
      return { payments: [payment] };
  }
}
