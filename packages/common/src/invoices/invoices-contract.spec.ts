import { buildInvoiceLine } from '../testing/build-invoice.js';
import { nextId } from '../testing/ids.js';
import { createInvoiceSchema, recordPaymentSchema, updateInvoiceSchema } from './invoices-contract.js';

const free = { from: 'lines', customerId: nextId(), lines: [buildInvoiceLine()], taxRate: '0.0825' };
const payment = { method: 'check', amountCents: 100, receivedOn: '2027-01-14' };

describe('a new invoice', () => {
  it.each([
    ['a billing stage', { from: 'stage', jobId: nextId(), billingStageId: nextId() }],
    ['lines of its own', free],
    ['lines that take something off', { ...free, lines: [buildInvoiceLine({ unitPriceCents: -500 })] }],
  ])('is made from %s', (_, request) => {
    expect(createInvoiceSchema.safeParse(request).success).toBe(true);
  });

  const same = buildInvoiceLine();
  it.each([
    [
      'a stage with an amount of its own',
      { from: 'stage', jobId: nextId(), billingStageId: nextId(), lines: [] },
    ],
    ['a number of its own', { ...free, number: 1 }],
    ['part of a cent', { ...free, lines: [buildInvoiceLine({ unitPriceCents: 0.5 })] }],
    ['a line twice', { ...free, lines: [same, same] }],
    [
      'more than the books can hold',
      { ...free, lines: [buildInvoiceLine({ quantity: '1000', unitPriceCents: 5_000_000 })] },
    ],
  ])('is refused with %s', (_, request) => {
    expect(createInvoiceSchema.safeParse(request).success).toBe(false);
  });
});

it('a change of a draft leaves alone what it does not name', () => {
  expect(updateInvoiceSchema.parse({ dueOn: null })).toEqual({ dueOn: null });
});

it.each([
  { amountCents: 0 },
  { amountCents: -1 },
  { amountCents: 1.5 },
  { amountCents: '100' },
  { method: 'card' },
])('a payment is not recorded by hand with %j', (overrides) => {
  expect(recordPaymentSchema.safeParse(payment).success).toBe(true);
  expect(recordPaymentSchema.safeParse({ ...payment, ...overrides }).success).toBe(false);
});
