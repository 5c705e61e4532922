import { isOpenLead, nextStepStanding, refuseLeadMove, reopenedStage } from './lead-stages.js';
import { LEAD_STAGES, OPEN_LEAD_STAGES } from './leads-contract.js';

describe('a lead', () => {
  it('moves freely between open stages', () => {
    for (const from of OPEN_LEAD_STAGES)
      for (const to of OPEN_LEAD_STAGES) expect(refuseLeadMove(from, to, 'move') === null).toBe(from !== to);
  });

  it.each(OPEN_LEAD_STAGES)('at %s is won and lost by their commands only', (from) => {
    expect(refuseLeadMove(from, 'won', 'win')).toBeNull();
    expect(refuseLeadMove(from, 'lost', 'lose')).toBeNull();
    expect(refuseLeadMove(from, 'won', 'move')).not.toBeNull();
    expect(refuseLeadMove(from, 'lost', 'move')).not.toBeNull();
  });

  it('stays won', () => {
    for (const to of LEAD_STAGES)
      for (const by of ['move', 'win', 'lose', 'reopen'] as const)
        expect(refuseLeadMove('won', to, by)?.detail).toMatch(/won/i);
  });

  it('comes back from lost to where it was, when it is reopened', () => {
    expect(refuseLeadMove('lost', reopenedStage('site-visit'), 'reopen')).toBeNull();
    expect(reopenedStage('site-visit')).toBe('site-visit');
    expect(reopenedStage(null)).toBe('contacted');
    expect(refuseLeadMove('lost', 'contacted', 'move')?.detail).toMatch(/reopened first/);
  });

  it('is won after all when a customer who was given up accepts', () => {
    expect(refuseLeadMove('lost', 'won', 'win')).toBeNull();
  });

  it('is open until it is won or lost', () => {
    expect(LEAD_STAGES.filter(isOpenLead)).toEqual([...OPEN_LEAD_STAGES]);
  });

  it.each([
    ['new', '2027-03-14', 'overdue'],
    ['new', '2027-03-15', 'today'],
    ['new', '2027-03-16', 'ahead'],
    ['new', null, null],
    ['lost', '2027-03-14', null],
  ] as const)('at %s with a next step on %s is %s', (stage, nextStepOn, expected) => {
    expect(nextStepStanding({ stage, nextStepOn }, '2027-03-15')).toBe(expected);
  });
});
