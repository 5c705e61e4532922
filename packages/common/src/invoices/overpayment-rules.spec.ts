import { applyReceived, cardTakes, refuseRefund, refuseReversal } from './overpayment-rules.js';

describe('money that came although less was owed', () => {
  it.each([
    [10_000, 10_000, 10_000, 0],
    [10_000, 4_000, 4_000, 6_000],
    [10_000, 0, 0, 10_000],
    [4_000, 10_000, 4_000, 0],
  ])('splits %i against a balance of %i', (amount, balance, appliedCents, excessCents) => {
    expect(applyReceived(amount, balance)).toEqual({ appliedCents, excessCents });
  });

  it('is given back only as far as it is held, and not in the future', () => {
    const refuse = (amountCents: number, paidOn = '2026-06-01') =>
      refuseRefund(6_000, { amountCents, paidOn }, '2026-06-01', 'USD');
    expect(refuse(6_000)).toBeNull();
    expect(refuse(6_001)).toMatchObject({ detail: 'This is more than the $60.00 that is held.' });
    expect(refuse(100, '2026-06-02')).toMatchObject({ fields: [{ path: 'paidOn' }] });
    expect(refuseRefund(0, { amountCents: 1, paidOn: '2026-06-01' }, '2026-06-01', 'USD')).not.toBeNull();
  });
});

describe('taking a payment back', () => {
  it('is for payments recorded by hand, once', () => {
    const check = { kind: 'payment', method: 'check', reversed: false } as const;
    expect(refuseReversal(check)).toBeNull();
    expect(refuseReversal({ ...check, reversed: true })).not.toBeNull();
    expect(refuseReversal({ ...check, method: 'card' })).not.toBeNull();
    expect(refuseReversal({ ...check, kind: 'reversal' })).not.toBeNull();
    expect(refuseReversal({ ...check, kind: 'refund' })).not.toBeNull();
  });
});

it('knows what a card can be charged', () => {
  expect([49, 50, 99_999_999, 100_000_000].map(cardTakes)).toEqual([false, true, true, false]);
});
