import type { EstimateRow } from '@bookmatch/common/estimates/estimates-contract';
import type { InvoiceRow, PaymentRow } from '@bookmatch/common/invoices/invoices-contract';
import { buildLeadRow } from '@bookmatch/common/testing/build-lead';
import { nextId } from '@bookmatch/common/testing/ids';
import type {
  BookkeeperToday,
  JobInHand,
  LeadHandToday,
  OnTheClock,
  OwnerToday,
} from '@bookmatch/common/today/today-contract';

export const ON = '2027-01-14';
const aging = {
  currentCents: 0,
  days1To30Cents: 0,
  days31To60Cents: 0,
  days61To90Cents: 0,
  over90Cents: 0,
  totalCents: 0,
};

export function buildEstimateRow(overrides: Partial<EstimateRow> = {}): EstimateRow {
  return {
    id: nextId(),
    number: 318,
    title: 'Library wall',
    customerId: nextId(),
    customerName: 'Ines Calder',
    status: 'sent',
    revisionNumber: 1,
    validUntil: '2027-02-10',
    openQuestions: 0,
    sentAt: '2027-01-12T15:00:00.000Z',
    createdAt: '2027-01-10T15:00:00.000Z',
    totalCents: 1_018_500,
    ...overrides,
  };
}

export function buildInvoiceRow(overrides: Partial<InvoiceRow> = {}): InvoiceRow {
  return {
    id: nextId(),
    number: 2231,
    status: 'issued',
    standing: 'overdue',
    daysOverdue: 6,
    kind: 'progress',
    issuedOn: '2026-12-20',
    dueOn: '2027-01-08',
    customerId: nextId(),
    customerName: 'Wren Halloway',
    jobId: nextId(),
    jobNumber: 1042,
    stageName: 'Ready to finish',
    createdAt: '2026-12-19T15:00:00.000Z',
    totalCents: 564_000,
    balanceCents: 564_000,
    overpaidCents: 0,
    ...overrides,
  };
}

export function buildPaymentRow(overrides: Partial<PaymentRow> = {}): PaymentRow {
  return {
    id: nextId(),
    kind: 'payment',
    method: 'check',
    amountCents: 250_000,
    appliedCents: 250_000,
    receivedOn: '2027-01-12',
    reference: '1187',
    reversesId: null,
    reversedById: null,
    reason: '',
    recordedBy: 'Ada Fenwick',
    createdAt: '2027-01-12T15:00:00.000Z',
    invoiceId: nextId(),
    invoiceNumber: 2230,
    customerName: 'Orla Fenwick',
    ...overrides,
  };
}

export function buildJobInHand(overrides: Partial<JobInHand> = {}): JobInHand {
  return {
    id: nextId(),
    number: 1042,
    title: 'Mudroom lockers',
    customerName: 'Wren Halloway',
    stage: 'building',
    installOn: '2027-01-15',
    plannedMinutes: 1200,
    clockedMinutes: 630,
    ...overrides,
  };
}

export function buildOnTheClock(overrides: Partial<OnTheClock> = {}): OnTheClock {
  return {
    memberId: nextId(),
    memberName: 'Tomas Reed',
    kind: 'work',
    jobId: nextId(),
    jobNumber: 1042,
    jobTitle: 'Mudroom lockers',
    operationName: 'Face frames',
    startedAt: '2027-01-14T14:31:00.000Z',
    ...overrides,
  };
}

export function buildOwnerToday(overrides: Partial<OwnerToday> = {}): OwnerToday {
  return {
    role: 'owner',
    on: ON,
    leadsToFollowUp: { count: 9, rows: [buildLeadRow({ nextStepOn: '2027-01-12' })] },
    leadsByStage: [
      { stage: 'new', count: 3 },
      { stage: 'contacted', count: 0 },
      { stage: 'site-visit', count: 1 },
      { stage: 'estimating', count: 2 },
    ],
    estimatesWaiting: { count: 1, rows: [buildEstimateRow({ openQuestions: 1 })] },
    jobsByStage: [{ stage: 'building', count: 4 }],
    jobsInHand: { count: 4, rows: [buildJobInHand()] },
    overdueInvoices: { count: 1, rows: [buildInvoiceRow()] },
    overdueCents: 564_000,
    aging: { ...aging, currentCents: 100_000, days1To30Cents: 564_000, totalCents: 664_000 },
    cashExpectedCents: 664_000,
    onTheClock: [buildOnTheClock()],
    weekMinutes: 2490,
    ...overrides,
  };
}

export function buildBookkeeperToday(overrides: Partial<BookkeeperToday> = {}): BookkeeperToday {
  return {
    role: 'bookkeeper',
    on: ON,
    draftsToIssue: { count: 0, rows: [] },
    overdueInvoices: { count: 0, rows: [] },
    overdueCents: 0,
    paymentsThisWeek: { count: 1, rows: [buildPaymentRow()] },
    paidThisWeekCents: 250_000,
    aging,
    ...overrides,
  };
}

export function buildLeadHandToday(overrides: Partial<LeadHandToday> = {}): LeadHandToday {
  return {
    role: 'lead-hand',
    on: ON,
    jobsInHand: { count: 1, rows: [buildJobInHand()] },
    onTheClock: [],
    installsThisWeek: [buildJobInHand()],
    clock: { open: null, todayMinutes: 95, choices: [] },
    ...overrides,
  };
}
