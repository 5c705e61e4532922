import { buildInvoice } from '@bookmatch/common/testing/build-invoice';
import { nextStep } from './next-step';

const sent = { id: 'a', document: 'invoice', to: 'a@b.test', sentAt: '2027-01-11T15:00:00.000Z' } as const;

describe('the next step of an invoice', () => {
  it('goes from the draft to the letter to the money', () => {
    expect(nextStep(buildInvoice({ status: 'draft', issueRefusals: ['Add a line.'] }))).toBe('finish');
    expect(nextStep(buildInvoice({ status: 'draft' }))).toBe('issue');
    expect(nextStep(buildInvoice())).toBe('send');
    expect(nextStep(buildInvoice({ sends: [sent] }))).toBe('pay');
    expect(nextStep(buildInvoice({ status: 'paid' }))).toBe('none');
    expect(nextStep(buildInvoice({ status: 'credited' }))).toBe('none');
  });

  it('takes a receipt for no letter of the invoice, and puts money that is held first', () => {
    expect(nextStep(buildInvoice({ sends: [{ ...sent, document: 'payment-receipt' }] }))).toBe('send');
    expect(nextStep(buildInvoice({ status: 'paid', overpaidCents: 1 }))).toBe('refund');
  });
});
