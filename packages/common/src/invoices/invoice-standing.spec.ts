import { balanceOf, invoiceStanding, statusAfter } from './invoice-standing.js';

const today = '2027-03-15';

describe('where an invoice stands', () => {
  it.each([
    ['draft', 0, null, 'draft', 0],
    ['issued', 0, today, 'due', 0],
    ['issued', 500, '2027-04-01', 'part-paid', 0],
    ['issued', 0, '2027-03-14', 'overdue', 1],
    ['issued', 500, '2027-03-09', 'overdue', 6],
    // Counted in calendar days, across the change of the clocks on March 14, 2027.
    ['issued', 0, '2027-03-01', 'overdue', 14],
    ['paid', 1_000, '2027-03-01', 'paid', 0],
    ['credited', 0, '2027-03-01', 'credited', 0],
  ] as const)('%s with %i paid, due %s, is %s (%i days)', (status, paid, dueOn, standing, days) => {
    expect(invoiceStanding(status, paid, dueOn, today)).toEqual({ standing, daysOverdue: days });
  });

  it.each([
    [{ totalCents: 1_000, paidCents: 0, creditedCents: 0 }, 'issued', 1_000],
    [{ totalCents: 1_000, paidCents: 400, creditedCents: 599 }, 'issued', 1],
    [{ totalCents: 1_000, paidCents: 1_000, creditedCents: 0 }, 'paid', 0],
    [{ totalCents: 1_000, paidCents: 1, creditedCents: 999 }, 'paid', 0],
    [{ totalCents: 1_000, paidCents: 0, creditedCents: 1_000 }, 'credited', 0],
  ] as const)('%j is %s with %i owed', (amounts, status, balance) => {
    expect(statusAfter(amounts)).toBe(status);
    expect(balanceOf(amounts)).toBe(balance);
  });
});
