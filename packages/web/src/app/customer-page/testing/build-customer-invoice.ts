import type { CustomerInvoice } from '@bookmatch/common/customer-page/customer-page-contract';

/** An invoice of $433.00 that is due and can be paid by card. */
export function buildCustomerInvoice(overrides: Partial<CustomerInvoice> = {}): CustomerInvoice {
  return {
    number: 2207,
    customerName: 'Wren Halloway',
    jobTitle: 'Mudroom lockers',
    stageName: 'Deposit',
    standing: 'due',
    daysOverdue: 0,
    issuedOn: '2027-01-11',
    dueOn: '2027-01-25',
    currency: 'USD',
    lines: [{ description: 'Deposit', quantity: '1', unitPriceCents: 40_000, amountCents: 40_000 }],
    netCents: 40_000,
    taxCents: 3300,
    totalCents: 43_300,
    payments: [],
    creditedCents: 0,
    paidCents: 0,
    balanceCents: 43_300,
    heldCents: 0,
    memo: '',
    canPayByCard: true,
    ...overrides,
  };
}
