import { Actions } from '@ngrx/effects';
import type { Action, Store } from '@ngrx/store';
import { buildEstimate, buildRevision, buildRevisionContent } from '@bookmatch/common/testing/build-estimate';
import type { Revision } from '@bookmatch/common/estimates/revision-contract';
import { BehaviorSubject, firstValueFrom, map, of, Subject, throwError, toArray } from 'rxjs';
import { ApiProblem } from '../../platform/api/api-problem';
import type { EstimatesApiClient } from '../estimates-api';
import { EstimatesApi, EstimatesPage } from './estimates.actions';
import * as effects from './estimates.effects';
import { estimatesFeature, initialEstimates } from './estimates.state';

const estimate = buildEstimate();
const draft = { estimateId: estimate.id, revisionId: estimate.currentRevision.id };
const content = buildRevisionContent();
const stale = { type: '', title: '', status: 412, code: 'stale-version', detail: 'Somebody changed this.' };
const actions = (...list: Action[]) => new Actions(of(...list));
const api = (methods: Partial<EstimatesApiClient>) => methods as EstimatesApiClient;
const all = <Value>(stream: { pipe: Subject<Value>['pipe'] }) => firstValueFrom(stream.pipe(toArray()));

/** A store with the reducer and nothing else. */
function storeWith(...list: Parameters<typeof estimatesFeature.reducer>[1][]) {
  const state = new BehaviorSubject(list.reduce(estimatesFeature.reducer, initialEstimates));
  return {
    dispatch: (action: Parameters<typeof estimatesFeature.reducer>[1]) =>
      state.next(estimatesFeature.reducer(state.value, action)),
    store: {
      select: (selector: (from: object) => unknown) =>
        state.pipe(map((value) => selector({ estimates: value }))),
    } as unknown as Store,
  };
}

describe('estimates effects', () => {
  it('saves one draft after the other, each with the version the one before it brought', async () => {
    const { store, dispatch } = storeWith(EstimatesApi.estimateLoaded({ estimate }));
    const first = new Subject<Revision>();
    const saveRevision = jest.fn().mockReturnValueOnce(first).mockReturnValueOnce(new Subject<Revision>());
    const edit = EstimatesPage.draftEdited({ draft, content });
    const seen: Action[] = [];
    effects.saveDraft(actions(edit, edit), api({ saveRevision }), store).subscribe((action) => {
      seen.push(action);
      dispatch(action as Parameters<typeof dispatch>[0]);
    });
    expect(saveRevision).toHaveBeenCalledTimes(1);
    first.next(buildRevision({ id: draft.revisionId, version: 2 }));
    first.complete();
    expect(saveRevision).toHaveBeenCalledTimes(2);
    expect(saveRevision).toHaveBeenNthCalledWith(1, draft, 1, content);
    expect(saveRevision).toHaveBeenNthCalledWith(2, draft, 2, content);
    expect(seen.map(({ type }) => type)).toEqual([EstimatesApi.draftSaved.type]);
  });

  it('keeps saving after a save was refused, and reads the newer version after a conflict', async () => {
    const { store } = storeWith(EstimatesApi.estimateLoaded({ estimate }));
    const saveRevision = jest
      .fn()
      .mockReturnValueOnce(throwError(() => new ApiProblem(stale)))
      .mockReturnValueOnce(of(estimate.currentRevision));
    const edit = EstimatesPage.draftEdited({ draft, content });
    const results = await all(effects.saveDraft(actions(edit, edit), api({ saveRevision }), store));
    expect(results.map(({ type }) => type)).toEqual([
      EstimatesApi.draftFailed.type,
      EstimatesApi.draftSaved.type,
    ]);
    const reload = await all(effects.reloadAfterConflict(actions(...results)));
    expect(reload).toEqual([EstimatesPage.estimateOpened({ id: estimate.id })]);
  });

  it('sends what was seen last: the versions of the estimate and of its revision', async () => {
    const { store } = storeWith(EstimatesApi.estimateLoaded({ estimate: { ...estimate, version: 7 } }));
    const send = jest.fn(() => of(estimate));
    const submitted = EstimatesPage.sendSubmitted({
      estimateId: estimate.id,
      to: 'ines@calder.test',
      message: '',
    });
    await all(effects.send(actions(submitted, submitted), api({ send }), store));
    expect(send).toHaveBeenCalledWith(expect.objectContaining({ id: estimate.id, version: 7 }), {
      to: 'ines@calder.test',
      message: '',
      revisionVersion: 1,
    });
  });

  it('puts what was typed into a revision that was sent meanwhile into a new one', async () => {
    const next = buildEstimate({
      id: estimate.id,
      currentRevision: buildRevision({ number: 2, version: 1 }),
    });
    const read = jest.fn().mockReturnValueOnce(of(estimate)).mockReturnValueOnce(of(next));
    const createRevision = jest.fn(() => of(next));
    const saveRevision = jest.fn(() => of(next.currentRevision));
    const pressed = EstimatesPage.rescuePressed({ estimateId: estimate.id, content });
    const results = await all(effects.rescue(actions(pressed), api({ read, createRevision, saveRevision })));
    expect(createRevision).toHaveBeenCalledWith(estimate);
    expect(saveRevision).toHaveBeenCalledWith(
      { estimateId: estimate.id, revisionId: next.currentRevision.id },
      1,
      content,
    );
    expect(results).toEqual([EstimatesApi.revisionStarted({ estimate: next })]);
  });

  it('reads the links again after a letter went out, since it carries a new one', async () => {
    const links = jest.fn(() => of({ rows: [] }));
    await all(effects.loadLinks(actions(EstimatesApi.sent({ estimate })), api({ links })));
    expect(links).toHaveBeenCalledWith(estimate.id);
  });
});
