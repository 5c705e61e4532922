import type { BillingStage } from '../estimates/billing-schedule-contract.js';
import { billScheduleSoFar } from '../estimates/billing-schedule.js';
import { estimateTotals, priceRooms } from '../estimates/estimate-totals.js';
import type { Estimate } from '../estimates/estimates-contract.js';
import type {
  EstimateLine,
  EstimateRoom,
  Revision,
  RevisionContent,
} from '../estimates/revision-contract.js';
import { DEFAULT_BILLING_SCHEDULE } from '../shops/new-shop.js';
import { MADE_AT, nextId, nextNumber } from './ids.js';

/** A line of material: 3 sheets of birch ply, cost $89.00, price $124.00 each. */
export function buildLine(overrides: Partial<EstimateLine> = {}): EstimateLine {
  return {
    id: nextId(),
    kind: 'material',
    description: 'Birch ply, 3/4 in',
    quantity: '3',
    unit: 'sheet',
    unitCostCents: 8_900,
    unitPriceCents: 12_400,
    operationId: null,
    plannedMinutesPerUnit: null,
    taxable: true,
    ...overrides,
  };
}

export function buildRoom(overrides: Partial<EstimateRoom> = {}): EstimateRoom {
  return { id: nextId(), name: 'Mudroom', lines: [buildLine()], ...overrides };
}

export function buildSchedule(): BillingStage[] {
  return DEFAULT_BILLING_SCHEDULE.map((stage) => ({ ...stage, id: nextId() }));
}

/** What a person typed; rules and requests take this. */
export function buildRevisionContent(overrides: Partial<RevisionContent> = {}): RevisionContent {
  return {
    validUntil: '2027-02-10',
    taxRule: 'on-price',
    taxRate: '0.0825',
    intro: '',
    terms: '',
    exclusions: '',
    discountCents: 0,
    rooms: [buildRoom()],
    billingSchedule: buildSchedule(),
    ...overrides,
  };
}

type RevisionOverrides = Partial<RevisionContent> &
  Partial<Pick<Revision, 'id' | 'version' | 'number' | 'status' | 'sentAt'>>;

/** A revision as the API answers it: whatever content is given, its amounts are those of the rules. */
export function buildRevision(overrides: RevisionOverrides = {}): Revision {
  const { id, version, number, status, sentAt, ...typed } = overrides;
  const content = buildRevisionContent(typed);
  const totals = estimateTotals(content);
  return {
    ...content,
    id: id ?? nextId(),
    version: version ?? 1,
    number: number ?? 1,
    status: status ?? 'draft',
    rooms: priceRooms(content.rooms),
    billingSchedule: billScheduleSoFar(content.billingSchedule, totals),
    totals,
    sendRefusals: [],
    sentAt: sentAt ?? null,
    createdAt: MADE_AT,
  };
}

/** An estimate with one revision, which is also in its list of revisions. */
export function buildEstimate(overrides: Partial<Estimate> = {}): Estimate {
  const revision = overrides.currentRevision ?? buildRevision();
  return {
    id: nextId(),
    version: 1,
    number: nextNumber('estimate', 101),
    title: 'Mudroom lockers and bench',
    status: 'draft',
    customer: { id: nextId(), name: 'Wren Halloway', email: 'wren@example.com', taxExempt: false },
    site: null,
    lead: null,
    job: null,
    currentRevision: revision,
    revisions: [
      {
        id: revision.id,
        number: revision.number,
        status: revision.status,
        totalCents: revision.totals.totalCents,
        sentAt: revision.sentAt,
        createdAt: revision.createdAt,
      },
    ],
    sends: [],
    questions: [],
    acceptance: null,
    declineReason: '',
    createdAt: MADE_AT,
    ...overrides,
  };
}
