import { buildTimeEntry, buildTimeEntryRow } from '@bookmatch/common/testing/build-time-entry';
import { buildMemberWeek, buildShopWeek, MEMBER_ID } from '../testing/build-week';
import { WeeksApi, WeeksPage } from './weeks.actions';
import { initialWeeks, weeksFeature, type WeeksState } from './weeks.state';

type Action = Parameters<typeof weeksFeature.reducer>[1];
const run = (...actions: Action[]): WeeksState => actions.reduce(weeksFeature.reducer, initialWeeks);
const problem = { type: '', title: '', status: 409, code: 'conflict', detail: 'This overlaps.' };
const week = buildMemberWeek();

describe('weeks', () => {
  it('keep a member’s week on the screen while another of the same is on its way', () => {
    const loaded = run(WeeksApi.memberWeekLoaded({ week }));
    const next = (memberId: string | null) =>
      weeksFeature.reducer(loaded, WeeksPage.memberWeekOpened({ memberId, of: '2027-01-04' })).memberWeek
        .value;
    expect(next(MEMBER_ID)).toBe(week);
    expect(next('somebody else')).toBeNull();
  });

  it('say why one could not be read', () => {
    expect(run(WeeksApi.memberWeekFailed({ problem })).memberWeek).toEqual({ value: null, problem });
    const shop = run(
      WeeksApi.shopWeekLoaded({ week: buildShopWeek() }),
      WeeksApi.shopWeekFailed({ problem }),
    );
    expect(shop.shopWeek).toEqual({ value: null, problem });
  });
});

describe('the form of an entry', () => {
  const entry = buildTimeEntry();

  it('opens without what the one before left behind', () => {
    const state = run(
      WeeksApi.entryLoaded({ entry }),
      WeeksApi.saveFailed({ problem }),
      WeeksPage.formOpened({ entryId: null }),
    );
    expect([state.entry, state.save.status]).toEqual([null, 'idle']);
  });

  it('tells saving, saved and refused apart', () => {
    const press = WeeksPage.correctionSubmitted({ entry, fields: { reason: 'Wrong' } });
    expect(run(press).save.status).toBe('saving');
    expect(run(press, WeeksApi.saved({ entry })).save.status).toBe('saved');
    expect(run(press, WeeksApi.saveFailed({ problem })).save).toEqual({ status: 'failed', problem });
    expect(run(WeeksApi.entryFailed({ problem })).save.problem).toBe(problem);
  });

  it('changes the entry’s row in the list', () => {
    const row = buildTimeEntryRow({ id: entry.id, note: 'Before' });
    const listed = run(WeeksApi.listLoaded({ page: { rows: [row], next: null, total: 1 } }));
    const state = weeksFeature.reducer(listed, WeeksApi.voided({ entry: { ...entry, note: 'After' } }));
    const list = weeksFeature.selectEntryList({ weeks: state });
    expect(list).toMatchObject({ loading: false, total: 1, rows: [{ note: 'After' }] });
  });
});
