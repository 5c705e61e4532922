import type { Router } from '@angular/router';
import { buildLead } from '@bookmatch/common/testing/build-lead';
import { Actions } from '@ngrx/effects';
import type { Action, Store } from '@ngrx/store';
import { firstValueFrom, NEVER, of, Subject, throwError, toArray, type Observable } from 'rxjs';
import { ApiProblem } from '../../platform/api/api-problem';
import type { Notices } from '../../platform/page/notices';
import type { LeadsApiClient } from '../leads-api';
import { LeadsApi, LeadsPage } from './leads.actions';
import * as effects from './leads.effects';

const lead = buildLead({ version: 3 });
const { id } = lead;
const ref = { id, version: 3 };
const problem = { type: '', title: '', status: 412, code: 'stale-version', detail: 'Somebody changed this.' };
const refused = () => throwError(() => new ApiProblem(problem));
const actions = (...list: Action[]) => new Actions(of(...list));
const api = (methods: Partial<LeadsApiClient>) => methods as LeadsApiClient;
const all = <T>(stream: Observable<T>) => firstValueFrom(stream.pipe(toArray()));

describe('leads effects', () => {
  it('shows only the answer to the last question', async () => {
    const board = { columns: [] };
    const slowThenQuick = jest.fn().mockReturnValueOnce(NEVER).mockReturnValueOnce(of(board));
    const asked = actions(LeadsPage.boardOpened({ query: { q: 'w' } }), LeadsPage.boardOpened({ query: {} }));
    expect(await all(effects.loadBoard(asked, api({ board: slowThenQuick })))).toEqual([
      LeadsApi.boardLoaded({ board }),
    ]);
  });

  it('moves two cards at once, each with the version it was read at', async () => {
    const answer = new Subject<typeof lead>();
    const move = jest.fn(() => answer);
    const other = { id: 'another', version: 1 };
    const results = all(
      effects.changeStage(
        actions(
          LeadsPage.stagePicked({ lead, stage: 'contacted' }),
          LeadsPage.stagePicked({ lead: other, stage: 'new' }),
        ),
        api({ move }),
      ),
    );
    expect(move.mock.calls).toEqual([
      [ref, 'contacted'],
      [other, 'new'],
    ]);
    answer.next(lead);
    answer.complete();
    expect(await results).toHaveLength(2);
  });

  it('reads the newer lead after a conflict, and after nothing else', async () => {
    const read = jest.fn(() => of(lead));
    const other = { ...problem, code: 'conflict', status: 409 };
    const told = actions(
      LeadsApi.saveFailed({ form: 'lead', id: null, problem }),
      LeadsApi.stageRefused({ id, problem: other }),
      LeadsApi.saveFailed({ form: 'loss', id, problem }),
    );
    expect(await all(effects.reloadAfterConflict(told, api({ read })))).toEqual([
      LeadsApi.leadLoaded({ lead }),
    ]);
    expect(read).toHaveBeenCalledTimes(1);
  });

  it('asks for the board again after a refusal, if there is one', async () => {
    const store = (asked: boolean) =>
      ({ select: () => of({ asked, query: { q: 'w' } }) }) as unknown as Store;
    const told = () => actions(LeadsApi.stageRefused({ id, problem }));
    expect(await all(effects.reloadBoardAfterRefusal(told(), store(true)))).toEqual([
      LeadsPage.boardOpened({ query: { q: 'w' } }),
    ]);
    expect(await all(effects.reloadBoardAfterRefusal(told(), store(false)))).toEqual([]);
  });

  it('hands over why a loss was refused', async () => {
    const press = LeadsPage.lossSubmitted({ lead, loss: { reason: 'price', note: '' } });
    expect(await all(effects.lose(actions(press), api({ lose: refused })))).toEqual([
      LeadsApi.saveFailed({ form: 'loss', id, problem }),
    ]);
  });

  it('goes on to the estimate that was started', async () => {
    const startEstimate = jest.fn(() => of({ estimateId: 'e1' }));
    const press = LeadsPage.estimateSubmitted({ lead, estimate: { title: 'Library' } });
    const [started] = await all(effects.startEstimate(actions(press, press), api({ startEstimate })));
    expect(started).toEqual(LeadsApi.estimateStarted({ estimateId: 'e1' }));
    const router = { navigate: jest.fn(() => Promise.resolve(true)) };
    await all(effects.openEstimate(actions(started as Action), router as unknown as Router));
    expect(router.navigate).toHaveBeenCalledWith(['/estimates', 'e1']);
  });

  it('opens what was saved by its form, and stays where a dialog was', async () => {
    const router = { navigate: jest.fn(() => Promise.resolve(true)) };
    const saved = (form: 'lead' | 'loss') => actions(LeadsApi.saved({ form, lead }));
    await all(effects.openSaved(saved('loss'), router as unknown as Router));
    expect(router.navigate).not.toHaveBeenCalled();
    await all(effects.openSaved(saved('lead'), router as unknown as Router));
    expect(router.navigate).toHaveBeenCalledWith(['/leads', id]);
  });

  it('says what was done, and why a step was refused', async () => {
    const notices = { say: jest.fn(), problem: jest.fn() };
    const told = actions(
      LeadsApi.created({ lead }),
      LeadsApi.saved({ form: 'loss', lead }),
      LeadsApi.saved({ form: 'estimate', lead }),
    );
    await all(effects.say(told, notices as unknown as Notices));
    expect(notices.say.mock.calls).toEqual([['Lead saved.'], ['Lead lost. It can be reopened.']]);
    await all(
      effects.sayProblem(actions(LeadsApi.stageRefused({ id, problem })), notices as unknown as Notices),
    );
    expect(notices.problem).toHaveBeenCalledWith(problem);
  });
});
