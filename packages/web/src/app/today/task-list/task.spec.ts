import { buildLeadRow } from '@bookmatch/common/testing/build-lead';
import {
  buildEstimateRow,
  buildInvoiceRow,
  buildJobInHand,
  buildOnTheClock,
  buildPaymentRow,
  ON,
} from '../testing/build-today';
import {
  clockedTask,
  draftTask,
  estimateTask,
  installTask,
  leadTask,
  overdueTask,
  paymentTask,
} from './task';

const ZONE = 'America/New_York';

describe('what waits', () => {
  it('of a lead: a call, and how late it is', () => {
    const lead = buildLeadRow({ nextStepOn: '2027-01-13', phone: '555 0114' });
    expect(leadTask(lead, ON)).toMatchObject({
      line: 'Call back about measurements · Wren Halloway',
      chip: { text: '1 day late', tone: 'over' },
      action: { name: 'Call', href: 'tel:555 0114' },
    });
    const unreachable = leadTask(buildLeadRow({ nextStepOn: ON, phone: '', nextStep: '' }), ON);
    expect(unreachable).toMatchObject({
      line: 'Follow up · Wren Halloway',
      chip: { text: 'Today' },
      action: { name: 'Follow up', link: `/leads/${unreachable.id}` },
    });
  });

  it('of an estimate: an answer first, else a follow-up', () => {
    expect(estimateTask(buildEstimateRow({ openQuestions: 2 }), ZONE, ON)).toMatchObject({
      title: '318 Library wall',
      line: 'Ines Calder · sent Tue, Jan 12',
      chip: { text: '2 questions' },
      action: { name: 'Answer' },
    });
    const silent = estimateTask(buildEstimateRow(), ZONE, ON);
    expect(silent.action?.name).toBe('Follow up');
    expect(silent.chip).toBeUndefined();
  });

  it('of an overdue invoice: what is still owed of it', () => {
    expect(overdueTask(buildInvoiceRow({ balanceCents: 100_000 }))).toMatchObject({
      title: '2231 Wren Halloway',
      line: 'Job 1042 · Ready to finish',
      chip: { text: 'Overdue 6 days', tone: 'over' },
      cents: 100_000,
    });
  });

  it('of a draft: that it has no number yet', () => {
    const draft = buildInvoiceRow({ number: null, standing: 'draft', jobNumber: null, stageName: null });
    expect(draftTask(draft, ZONE, ON)).toMatchObject({
      title: 'Wren Halloway',
      line: 'drafted Sat, Dec 19, 2026',
      action: { name: 'Issue' },
    });
  });

  it('of a payment: what was taken or given back is said', () => {
    expect(paymentTask(buildPaymentRow(), ON)).toMatchObject({
      line: 'Invoice 2230 · Check · Tue, Jan 12',
      cents: 250_000,
    });
    expect(paymentTask(buildPaymentRow({ kind: 'reversal', amountCents: -250_000 }), ON)).toMatchObject({
      chip: { text: 'Taken back' },
      cents: -250_000,
    });
  });

  it.each([
    ['2027-01-13', 'over'],
    [ON, 'built'],
    ['2027-01-15', 'planned'],
  ])('of an install on %s', (installOn, tone) => {
    expect(installTask(buildJobInHand({ installOn }), ON).chip?.tone).toBe(tone);
  });

  it('of somebody on the clock: on what, since when on the wall of the shop', () => {
    expect(clockedTask(buildOnTheClock(), ZONE)).toMatchObject({
      title: 'Tomas Reed',
      line: 'Face frames · 1042 Mudroom lockers',
      chip: { text: 'since 9:31 am' },
    });
    const away = buildOnTheClock({ kind: 'meal-break', jobId: null, jobNumber: null, operationName: null });
    expect(clockedTask(away, ZONE)).toMatchObject({ line: 'Meal break', chip: { tone: 'neutral' } });
    expect(clockedTask(away, ZONE).link).toBeUndefined();
  });
});
