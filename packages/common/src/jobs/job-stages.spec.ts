import { JOB_STAGES } from './jobs-contract.js';
import { JOB_TRANSITIONS, nextStage, refuseClosing, refuseMove, skippedStages } from './job-stages.js';

describe("a job's stages", () => {
  it('follow one another to the closed job', () => {
    const walked = ['accepted'];
    for (let stage = nextStage('accepted'); stage; stage = nextStage(stage)) walked.push(stage);
    expect(walked).toEqual(JOB_STAGES);
  });

  it('go on by one, and back, without a word', () => {
    expect(refuseMove({ from: 'building', to: 'finishing', confirmSkip: false })).toBeNull();
    expect(refuseMove({ from: 'finishing', to: 'measured', confirmSkip: false })).toBeNull();
    expect(refuseMove({ from: 'installing', to: 'closed', confirmSkip: false })).toBeNull();
  });

  it('are skipped only by who confirms it, having read which', () => {
    const refusal = refuseMove({ from: 'accepted', to: 'building', confirmSkip: false });
    expect(refusal?.detail).toBe(
      'This skips Measured, Drawings approved and Materials in. Confirm it to go on.',
    );
    expect(refuseMove({ from: 'accepted', to: 'building', confirmSkip: true })).toBeNull();
    expect(skippedStages('building', 'accepted')).toEqual([]);
  });

  it('do not lead to where the job is', () => {
    for (const stage of JOB_STAGES) {
      expect(JOB_TRANSITIONS[stage]).not.toContain(stage);
      expect(refuseMove({ from: stage, to: stage, confirmSkip: true })?.code).toBe('conflict');
    }
  });

  it('lead out of closed to installing only, even when confirmed', () => {
    expect(refuseMove({ from: 'closed', to: 'installing', confirmSkip: false })).toBeNull();
    expect(refuseMove({ from: 'closed', to: 'building', confirmSkip: true })?.detail).toMatch(/Installing/);
  });
});

describe('closing a job', () => {
  const facts = { clockedIn: [], unbilledStages: [], reason: '' };

  it('is refused while somebody is clocked in, whatever the reason', () => {
    const refusal = refuseClosing({ ...facts, clockedIn: ['Ada', 'Sam'], reason: 'Done' });
    expect(refusal?.detail).toBe('Ada and Sam are clocked in to this job.');
  });

  it('asks for a reason while a stage is not billed', () => {
    const refusal = refuseClosing({ ...facts, unbilledStages: ['Installed'] });
    expect(refusal).toMatchObject({ code: 'conflict', fields: [{ path: 'reason' }] });
    expect(refuseClosing({ ...facts, unbilledStages: ['Installed'], reason: 'Given as a gift' })).toBeNull();
  });

  it('asks nothing when all is billed and nobody is at work', () => {
    expect(refuseClosing(facts)).toBeNull();
  });
});
