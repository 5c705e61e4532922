import { defaultBillingScheduleSchema } from '../estimates/billing-schedule-contract.js';
import { refuseSchedule } from '../estimates/billing-schedule.js';
import { DEFAULT_OPERATIONS } from './default-operations.js';
import { DEFAULT_BILLING_SCHEDULE } from './new-shop.js';
import {
  createOperationSchema,
  reorderOperationsSchema,
  updateOperationSchema,
} from './operations-contract.js';
import { nextId } from '../testing/ids.js';

describe('a new shop', () => {
  it('starts with operations that it could have typed itself, one of them on no job', () => {
    DEFAULT_OPERATIONS.forEach((operation) =>
      expect(createOperationSchema.parse(operation)).toEqual(operation),
    );
    expect(new Set(DEFAULT_OPERATIONS.map(({ name }) => name)).size).toBe(DEFAULT_OPERATIONS.length);
    expect(DEFAULT_OPERATIONS.filter(({ onJob }) => !onJob).map(({ name }) => name)).toEqual([
      'Shop, not on a job',
    ]);
  });

  it('bills by a schedule that adds up, of the smallest price too', () => {
    expect(defaultBillingScheduleSchema.safeParse(DEFAULT_BILLING_SCHEDULE).success).toBe(true);
    expect([3, 100, 9_999_999].map((cents) => refuseSchedule(DEFAULT_BILLING_SCHEDULE, cents))).toEqual([
      null,
      null,
      null,
    ]);
  });
});

describe('operations', () => {
  it('stand in the order once each', () => {
    const [first, second] = [nextId(), nextId()];
    expect(reorderOperationsSchema.safeParse({ operationIds: [second, first] }).success).toBe(true);
    expect(reorderOperationsSchema.safeParse({ operationIds: [first, first] }).success).toBe(false);
  });

  it('stay on a job or off it: time clocked to them would change its meaning', () => {
    expect(updateOperationSchema.safeParse({ onJob: false }).success).toBe(false);
    expect(updateOperationSchema.parse({ archived: true })).toEqual({ archived: true });
  });
});
