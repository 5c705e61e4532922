import { nextId } from '../testing/ids.js';
import { clockInSchema, correctTimeEntrySchema } from './time-contract.js';

const punch = {
  entryId: nextId(),
  jobId: nextId(),
  operationId: nextId(),
  kind: 'work',
  at: '2027-01-12T15:31:00.000Z',
  source: 'phone',
};

describe('a punch', () => {
  it.each([
    ['work on a job', {}],
    ['work on no job', { jobId: null }],
    ['a meal break', { kind: 'meal-break', jobId: null, operationId: null }],
  ])('can be %s', (_, overrides) => {
    expect(clockInSchema.safeParse({ ...punch, ...overrides }).success).toBe(true);
  });

  it.each([
    ['work without an operation', { operationId: null }],
    ['a meal break on a job', { kind: 'meal-break' }],
    ['of somebody else', { memberId: nextId() }],
    ['entered as a correction', { source: 'correction' }],
    ['at a time on the wall', { at: '2027-01-12 09:31' }],
  ])('cannot be %s', (_, overrides) => {
    expect(clockInSchema.safeParse({ ...punch, ...overrides }).success).toBe(false);
  });
});

it('a correction needs a reason, and leaves alone what it does not name', () => {
  expect(correctTimeEntrySchema.safeParse({ endedAt: '2027-01-12T17:45:00.000Z' }).success).toBe(false);
  expect(correctTimeEntrySchema.parse({ jobId: null, reason: 'Wrong job' })).toEqual({
    jobId: null,
    reason: 'Wrong job',
  });
});
