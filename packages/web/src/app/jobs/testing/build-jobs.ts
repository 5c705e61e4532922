import type { JobCost } from '@bookmatch/common/jobs/job-costs-contract';
import type { JobFile } from '@bookmatch/common/jobs/job-files-contract';
import type { JobBillingRow, JobRow } from '@bookmatch/common/jobs/jobs-contract';

export const idOf = (at: number): string => `0190a1b2-0000-7000-8000-${String(at).padStart(12, '0')}`;
const AT = '2027-01-14T15:00:00.000Z';

export function buildJobRow(overrides: Partial<JobRow> = {}): JobRow {
  return {
    id: idOf(1),
    version: 1,
    number: 1042,
    title: 'Mudroom lockers and bench',
    customerName: 'Wren Halloway',
    siteCity: 'Alder',
    stage: 'building',
    installOn: null,
    assignedMemberIds: [],
    plannedMinutes: 600,
    clockedMinutes: 90,
    createdAt: AT,
    ...overrides,
  };
}

export function buildBillingRow(overrides: Partial<JobBillingRow> = {}): JobBillingRow {
  return {
    billingStageId: idOf(20),
    name: 'Deposit',
    share: { percent: '40' },
    deposit: true,
    due: 'on-acceptance',
    plannedCents: 40_000,
    billedCents: 0,
    paidCents: 0,
    invoice: null,
    ...overrides,
  };
}

export function buildJobCost(overrides: Partial<JobCost> = {}): JobCost {
  return {
    id: idOf(30),
    category: 'material',
    description: 'Maple plywood',
    amountCents: 20_610,
    onDate: '2027-01-12',
    supplier: 'Mill Street Lumber',
    reversesId: null,
    reversedById: null,
    reason: '',
    recordedBy: 'Ada Fenwick',
    createdAt: AT,
    ...overrides,
  };
}

export function buildJobFile(overrides: Partial<JobFile> = {}): JobFile {
  return {
    id: idOf(40),
    name: 'Stone wall.jpg',
    mediaType: 'image/jpeg',
    bytes: 2_400_000,
    sha256: 'a'.repeat(64),
    hasThumbnail: true,
    uploadedBy: 'Sam Orr',
    createdAt: AT,
    ...overrides,
  };
}
