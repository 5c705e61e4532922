import fc from 'fast-check';
import { sumCents } from '../money/cents.js';
import { creditShare, refuseCredit, refusePayment, type PayableInvoice } from './payment-rules.js';

const today = '2027-03-15';
const invoice = (overrides: Partial<PayableInvoice> = {}): PayableInvoice => ({
  status: 'issued',
  currency: 'USD',
  totalCents: 564_000,
  paidCents: 100_000,
  creditedCents: 0,
  ...overrides,
});
const pay = (amountCents: number, of = invoice(), receivedOn = today) =>
  refusePayment(of, { amountCents, receivedOn }, today);

describe('a payment', () => {
  it('is taken in whole or in part', () => {
    expect(pay(464_000)).toBeNull();
    expect(pay(1)).toBeNull();
  });

  it('is refused above the balance, which it names', () => {
    expect(pay(464_001)?.detail).toBe('This payment is more than the $4,640.00 that is owed.');
  });

  it('is refused at zero, below it, and from the future', () => {
    expect(pay(0)?.fields?.[0]?.path).toBe('amountCents');
    expect(pay(-5)).not.toBeNull();
    expect(pay(1, invoice(), '2027-03-16')?.fields?.[0]?.path).toBe('receivedOn');
  });

  it.each(['draft', 'paid', 'credited'] as const)('is refused on an invoice that is %s', (status) => {
    expect(pay(1, invoice({ status }))?.code).toBe('conflict');
  });
});

describe('a credit', () => {
  it('can be of all that is still owed, and of no more', () => {
    expect(refuseCredit(invoice(), 464_000)).toBeNull();
    expect(refuseCredit(invoice(), 464_001)?.detail).toMatch(/credit is more than the \$4,640.00/);
  });

  it('takes back net and tax in the proportion of the invoice', () => {
    expect(creditShare({ netCents: 100_000, taxCents: 8_250 }, 0, 54_125)).toEqual({
      netCents: 50_000,
      taxCents: 4_125,
    });
  });

  it('gives all of the net and the tax back, in however many credits', () => {
    fc.assert(
      fc.property(
        fc.nat(1_000_000),
        fc.nat(100_000),
        fc.array(fc.integer({ min: 1, max: 50_000 }), { maxLength: 12 }),
        (netCents, taxCents, wanted) => {
          fc.pre(netCents >= taxCents && netCents > 0);
          let before = 0;
          const credits = [];
          for (const amount of [...wanted, netCents + taxCents]) {
            const credited = Math.min(amount, netCents + taxCents - before);
            credits.push(creditShare({ netCents, taxCents }, before, credited));
            before += credited;
          }
          expect(sumCents(credits.map((credit) => credit.netCents))).toBe(netCents);
          expect(sumCents(credits.map((credit) => credit.taxCents))).toBe(taxCents);
          credits.forEach((credit) =>
            expect(Math.min(credit.netCents, credit.taxCents)).toBeGreaterThanOrEqual(0),
          );
        },
      ),
    );
  });
});
