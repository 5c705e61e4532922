import { buildTimeEntryRow } from '@bookmatch/common/testing/build-time-entry';
import { addTimeEntrySchema, correctTimeEntrySchema } from '@bookmatch/common/time/time-contract';
import { buildJobs, BOXES, FRAMES } from '../../testing/build-punch';
import {
  addedFields,
  correctedFields,
  instantsOf,
  missingIn,
  typedOf,
  type TypedEntry,
} from './entry-form-group';
import { jobChoices, operationChoices } from './work-choices';

const zone = 'America/New_York';
const MEMBER = '01940000-0000-7000-8000-0000000000d1';
const typed = (fields: Partial<TypedEntry> = {}): TypedEntry => ({
  ...{ kind: 'work', jobId: FRAMES.job, operationId: FRAMES.operation, on: '2027-01-12', from: '09:31' },
  ...{ to: '11:45', note: '', reason: 'Forgot', ...fields },
});
// 9:31 to 11:45 am in New York.
const entry = buildTimeEntryRow({
  ...{ jobId: FRAMES.job, operationId: FRAMES.operation },
  ...{ startedAt: '2027-01-12T14:31:00.000Z', endedAt: '2027-01-12T16:45:00.000Z' },
});

describe('the times of an entry', () => {
  it('are shown as the shop’s wall shows them', () => {
    expect(typedOf(entry, '', zone)).toMatchObject({
      on: '2027-01-12',
      from: '09:31',
      to: '11:45',
      reason: '',
    });
    expect(typedOf(null, '2027-01-13', zone)).toMatchObject({ on: '2027-01-13', from: '', to: '' });
    expect(typedOf({ ...entry, endedAt: null }, '', zone).to).toBe('');
  });

  it('run into the next day when the end is earlier on the wall than the start', () => {
    expect(instantsOf(typed({ from: '22:00', to: '01:30' }), zone)).toEqual({
      startedAt: '2027-01-13T03:00:00.000Z',
      endedAt: '2027-01-13T06:30:00.000Z',
    });
  });
});

describe('what is sent', () => {
  it('is a whole entry when one is added', () => {
    const fields = addedFields(typed({ note: ' Pencil list ' }), MEMBER, zone);
    expect(addTimeEntrySchema.safeParse(fields).success).toBe(true);
    expect(fields).toMatchObject({
      memberId: MEMBER,
      jobId: FRAMES.job,
      startedAt: '2027-01-12T14:31:00.000Z',
      endedAt: '2027-01-12T16:45:00.000Z',
      note: 'Pencil list',
    });
  });

  it('is of no job and no operation for a meal break, whatever was chosen before', () => {
    const fields = addedFields(typed({ kind: 'meal-break' }), MEMBER, zone);
    expect([fields.jobId, fields.operationId]).toEqual([null, null]);
  });

  it('is only what was changed when one is corrected', () => {
    const fields = correctedFields(typed({ to: '11:15', reason: ' Left early ' }), entry, zone);
    expect(fields).toEqual({ reason: 'Left early', endedAt: '2027-01-12T16:15:00.000Z' });
    expect(correctTimeEntrySchema.safeParse(fields).success).toBe(true);
    expect(correctedFields(typed(), entry, zone)).toEqual({ reason: 'Forgot' });
    expect(correctedFields(typed({ jobId: '', operationId: BOXES.operation }), entry, zone)).toEqual({
      ...{ reason: 'Forgot', jobId: null, operationId: BOXES.operation },
    });
  });

  it('moves both ends when the day is another', () => {
    expect(correctedFields(typed({ on: '2027-01-11' }), entry, zone)).toMatchObject({
      startedAt: '2027-01-11T14:31:00.000Z',
      endedAt: '2027-01-11T16:45:00.000Z',
    });
  });

  it('leaves a time alone that reads the same, in the hour that comes twice in fall', () => {
    // 1:30 am in New York for the second time.
    const second = { ...entry, startedAt: '2027-11-07T06:30:00.000Z', endedAt: '2027-11-07T09:00:00.000Z' };
    const shown = { ...typedOf(second, '', zone), to: '04:30', reason: 'Longer' };
    expect(correctedFields(shown, second, zone)).toEqual({
      reason: 'Longer',
      endedAt: '2027-11-07T09:30:00.000Z',
    });
  });
});

describe('before anything is sent', () => {
  const paths = (fields: Partial<TypedEntry>, mayStayOpen = false) =>
    missingIn(typed(fields), zone, mayStayOpen).map(({ path }) => path);

  it.each<[Partial<TypedEntry>, string[]]>([
    [{}, []],
    [{ on: '' }, ['on']],
    [{ from: '' }, ['from']],
    [{ to: '' }, ['to']],
    [{ operationId: '' }, ['operationId']],
    [{ operationId: '', kind: 'meal-break' }, []],
    [{ reason: '  ' }, ['reason']],
  ])('%j is missing %j', (fields, missing) => {
    expect(paths(fields)).toEqual(missing);
  });

  it('lets an open entry stay open', () => {
    expect(paths({ to: '' }, true)).toEqual([]);
  });
});

describe('what an entry can be put on', () => {
  it('is an open job, and the one it is on although that is closed', () => {
    const names = jobChoices(buildJobs(), { ...entry, jobId: 'gone', jobNumber: 990, jobTitle: 'Bench' });
    expect(names.map(({ name }) => name)).toEqual([
      '990 · Bench',
      '1042 · Mudroom lockers',
      '1039 · Kitchen, Alder Court',
    ]);
    expect(jobChoices(null, null)).toEqual([]);
  });

  it('is an operation that goes with the job, or with none', () => {
    const names = (jobId: string, of = entry) =>
      operationChoices(buildJobs(), of, jobId).map(({ name }) => name);
    expect(names(FRAMES.job)).toEqual(['Assemble boxes', 'Face frames']);
    expect(names('')).toEqual(['Shop, not on a job']);
    expect(names(FRAMES.job, { ...entry, operationId: 'old', operationName: 'Turn legs' })).toContain(
      'Turn legs',
    );
  });
});
