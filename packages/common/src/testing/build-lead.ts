import type { Lead, LeadRow } from '../leads/leads-contract.js';
import { buildAddress } from './build-customer.js';
import { MADE_AT, nextId } from './ids.js';

export function buildLead(overrides: Partial<Lead> = {}): Lead {
  return {
    id: nextId(),
    version: 1,
    title: 'Mudroom lockers and bench',
    contactName: 'Wren Halloway',
    company: '',
    email: 'wren@example.com',
    phone: '555 0114',
    siteAddress: buildAddress(),
    source: 'referral',
    stage: 'new',
    nextStep: 'Call back about measurements',
    nextStepOn: '2027-01-14',
    customerId: null,
    customerName: null,
    siteId: null,
    siteName: null,
    lostReason: null,
    lostNote: '',
    stageChangedAt: MADE_AT,
    createdAt: MADE_AT,
    estimates: [],
    stageChanges: [],
    expectedCents: 1_400_000,
    ...overrides,
  };
}

/** The same lead as a row of the list or a card of the board. */
export function buildLeadRow(overrides: Partial<LeadRow> = {}): LeadRow {
  return {
    id: nextId(),
    version: 1,
    title: 'Mudroom lockers and bench',
    contactName: 'Wren Halloway',
    company: '',
    phone: '555 0114',
    source: 'referral',
    stage: 'new',
    nextStep: 'Call back about measurements',
    nextStepOn: '2027-01-14',
    createdAt: MADE_AT,
    expectedCents: 1_400_000,
    ...overrides,
  };
}
