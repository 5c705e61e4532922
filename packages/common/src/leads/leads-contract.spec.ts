import { nextId } from '../testing/ids.js';
import { convertLeadSchema, loseLeadSchema, moveLeadSchema, updateLeadSchema } from './leads-contract.js';

const customer = { kind: 'homeowner', name: 'Wren Halloway' };

it('a lead is moved by hand between open stages only', () => {
  expect(moveLeadSchema.safeParse({ stage: 'site-visit' }).success).toBe(true);
  expect(moveLeadSchema.safeParse({ stage: 'won' }).success).toBe(false);
  expect(moveLeadSchema.safeParse({ stage: 'lost' }).success).toBe(false);
});

it('a lead is lost for a reason', () => {
  expect(loseLeadSchema.safeParse({ reason: 'price' }).success).toBe(true);
  expect(loseLeadSchema.safeParse({ note: 'No idea' }).success).toBe(false);
});

it('a lead becomes one customer, new or known', () => {
  expect(convertLeadSchema.safeParse({ customer }).success).toBe(true);
  expect(convertLeadSchema.safeParse({ customerId: nextId(), site: { name: 'House' } }).success).toBe(true);
  expect(convertLeadSchema.safeParse({}).success).toBe(false);
  expect(convertLeadSchema.safeParse({ customerId: nextId(), customer }).success).toBe(false);
});

it('a change of a lead empties nothing that it does not name', () => {
  expect(updateLeadSchema.parse({ nextStep: 'Call' })).toEqual({ nextStep: 'Call' });
});
