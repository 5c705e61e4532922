import { buildTimeEntry } from '@bookmatch/common/testing/build-time-entry';
import { Actions } from '@ngrx/effects';
import type { Action } from '@ngrx/store';
import { firstValueFrom, NEVER, of, Subject, throwError, toArray } from 'rxjs';
import { ApiProblem } from '../../platform/api/api-problem';
import type { Notices } from '../../platform/page/notices';
import { buildJobs } from '../testing/build-punch';
import { buildMemberWeek, buildShopWeek, MEMBER_ID } from '../testing/build-week';
import type { TimeApiClient } from '../time-api';
import { WeeksApi, WeeksPage } from './weeks.actions';
import * as effects from './weeks.effects';

const entry = buildTimeEntry();
const week = buildMemberWeek();
const problem = { type: '', title: '', status: 412, code: 'stale-version', detail: 'Somebody changed this.' };
const refused = () => throwError(() => new ApiProblem(problem));
const actions = (...list: Action[]) => new Actions(of(...list));
const api = (methods: Partial<TimeApiClient>) => methods as TimeApiClient;

describe('weeks effects', () => {
  it('show only the answer to the last week asked for', async () => {
    const slowThenQuick = jest.fn().mockReturnValueOnce(NEVER).mockReturnValueOnce(of(week));
    const asked = actions(
      WeeksPage.memberWeekOpened({ memberId: null, of: '2027-01-04' }),
      WeeksPage.memberWeekOpened({ memberId: MEMBER_ID, of: undefined }),
    );
    const loaded = effects.loadMemberWeek(asked, api({ memberWeek: slowThenQuick }));
    expect(await firstValueFrom(loaded.pipe(toArray()))).toEqual([WeeksApi.memberWeekLoaded({ week })]);
    expect(slowThenQuick.mock.calls).toEqual([
      [null, '2027-01-04'],
      [MEMBER_ID, undefined],
    ]);
  });

  it('read everybody’s week, or say why not', async () => {
    const opened = actions(WeeksPage.shopWeekOpened({ of: undefined }));
    const shop = buildShopWeek();
    expect(await firstValueFrom(effects.loadShopWeek(opened, api({ shopWeek: () => of(shop) })))).toEqual(
      WeeksApi.shopWeekLoaded({ week: shop }),
    );
    expect(await firstValueFrom(effects.loadShopWeek(opened, api({ shopWeek: refused })))).toEqual(
      WeeksApi.shopWeekFailed({ problem }),
    );
  });

  it('read a page of entries, and what they can be put on', async () => {
    const page = { rows: [], next: null, total: 0 };
    const listed = effects.loadList(
      actions(WeeksPage.listOpened({ query: {} })),
      api({ list: () => of(page) }),
    );
    expect(await firstValueFrom(listed)).toEqual(WeeksApi.listLoaded({ page }));
    const work = buildJobs();
    const wanted = effects.loadWork(actions(WeeksPage.workWanted()), api({ clockJobs: () => of(work) }));
    expect(await firstValueFrom(wanted)).toEqual(WeeksApi.workLoaded({ work }));
  });

  it('read the history of an entry that a form is opened for, and nothing for a new one', async () => {
    const read = jest.fn(() => of(entry));
    const opened = actions(
      WeeksPage.formOpened({ entryId: null }),
      WeeksPage.formOpened({ entryId: entry.id }),
    );
    const loaded = effects.loadEntry(opened, api({ entry: read }));
    expect(await firstValueFrom(loaded.pipe(toArray()))).toEqual([WeeksApi.entryLoaded({ entry })]);
    expect(read.mock.calls).toEqual([[entry.id]]);
  });

  it('take no second press while an entry is being added', async () => {
    const answer = new Subject<typeof entry>();
    const add = jest.fn(() => answer);
    const fields = { ...entry, endedAt: entry.startedAt, reason: 'Forgot' };
    const press = WeeksPage.addSubmitted({ fields });
    const results = firstValueFrom(effects.add(actions(press, press), api({ add })).pipe(toArray()));
    answer.next(entry);
    answer.complete();
    expect(await results).toEqual([WeeksApi.saved({ entry })]);
    expect(add).toHaveBeenCalledTimes(1);
  });

  it('send a correction with the version it was made from, and read the newer one after a conflict', async () => {
    const fields = { reason: 'Left early' };
    const press = WeeksPage.correctionSubmitted({ entry, fields });
    const correct = jest.fn(refused);
    expect(await firstValueFrom(effects.correct(actions(press), api({ correct })))).toEqual(
      WeeksApi.saveFailed({ problem }),
    );
    expect(correct).toHaveBeenCalledWith(entry, fields);

    const stream = new Subject<Action>();
    const seen: Action[] = [];
    const newer = { ...entry, version: 2 };
    effects
      .reloadAfterConflict(new Actions(stream), api({ entry: () => of(newer) }))
      .subscribe((action) => seen.push(action));
    stream.next(press);
    stream.next(WeeksApi.saveFailed({ problem: { ...problem, code: 'conflict' } }));
    stream.next(WeeksApi.saveFailed({ problem }));
    expect(seen).toEqual([WeeksApi.entryLoaded({ entry: newer })]);
  });

  it('void an entry with its reason, and go on after a refusal', async () => {
    const press = WeeksPage.voidConfirmed({ entry, reason: 'Twice' });
    const voided = jest.fn().mockImplementationOnce(refused).mockReturnValueOnce(of(entry));
    const results = effects.voidEntry(actions(press, press), api({ void: voided }));
    expect(await firstValueFrom(results.pipe(toArray()))).toEqual([
      WeeksApi.voidFailed({ problem }),
      WeeksApi.voided({ entry }),
    ]);
    expect(voided).toHaveBeenCalledWith(entry, 'Twice');
  });

  it('say what was done, and why a command was refused', async () => {
    const notices = { say: jest.fn(), problem: jest.fn() };
    const told = actions(WeeksApi.saved({ entry }), WeeksApi.voided({ entry }));
    await firstValueFrom(effects.say(told, notices as unknown as Notices).pipe(toArray()));
    expect(notices.say.mock.calls).toEqual([['Time saved.'], ['Entry voided.']]);
    const failed = actions(WeeksApi.voidFailed({ problem }));
    await firstValueFrom(effects.sayProblem(failed, notices as unknown as Notices));
    expect(notices.problem).toHaveBeenCalledWith(problem);
  });
});
