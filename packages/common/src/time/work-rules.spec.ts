import { refuseFacts, refusePairing, refuseWork, type Work } from './work-rules.js';

const onJob = { onJob: true, archived: false };
const offJob = { onJob: false, archived: false };
const open = { closed: false };

describe('what time is clocked to', () => {
  it.each<[string, Work]>([
    ['an operation on an open job', { job: open, operation: onJob }],
    ['shop time on no job', { job: null, operation: offJob }],
  ])('can be %s', (_, work) => {
    expect(refuseWork(work)).toBeNull();
  });

  it.each<[string, Work, string]>([
    ['a closed job', { job: { closed: true }, operation: onJob }, 'jobId'],
    ['an archived operation', { job: open, operation: { ...onJob, archived: true } }, 'operationId'],
    ['shop time on a job', { job: open, operation: offJob }, 'operationId'],
    ['work on no job', { job: null, operation: onJob }, 'jobId'],
  ])('cannot be %s', (_, work, path) => {
    expect(refuseWork(work)?.fields?.[0]?.path).toBe(path);
  });

  it('may stay on a closed job and an archived operation where it was clocked to them', () => {
    expect(refusePairing({ job: { closed: true }, operation: { onJob: true, archived: true } })).toBeNull();
  });
});

describe('an entry', () => {
  const facts = { startedAt: '2027-01-14T15:00:00.000Z', endedAt: null, note: '' };

  it.each([
    ['work without an operation', { kind: 'work', jobId: null, operationId: null }],
    ['a meal break on a job', { kind: 'meal-break', jobId: 'a', operationId: null }],
    ['a meal break of an operation', { kind: 'meal-break', jobId: null, operationId: 'b' }],
  ] as const)('cannot be %s', (_, what) => {
    expect(refuseFacts({ ...facts, ...what })).not.toBeNull();
  });

  it('can be work of an operation, or a meal break of nothing', () => {
    expect(refuseFacts({ ...facts, kind: 'work', jobId: null, operationId: 'b' })).toBeNull();
    expect(refuseFacts({ ...facts, kind: 'meal-break', jobId: null, operationId: null })).toBeNull();
  });
});
