import { createListState } from './list-state';

type Row = { id: string; name: string };
const list = createListState<Row>();
const a = { id: 'a', name: 'Wren' };
const b = { id: 'b', name: 'Alder' };
const problem = { type: '', title: '', status: 500, code: 'fault', detail: '' };

describe('a list in the store', () => {
  it("keeps the server's order and its cursor", () => {
    const state = list.loaded(list.requested(list.initial), { rows: [b, a], next: 'c', total: 7 });
    expect(list.selectRows(state)).toEqual([b, a]);
    expect(state).toMatchObject({ status: 'loaded', next: 'c', total: 7 });
  });

  it('keeps its rows while the next page is under way, and the total that only the first page has', () => {
    const first = list.loaded(list.initial, { rows: [a], next: 'c', total: 2 });
    const waiting = list.requested(first);
    expect(list.selectRows(waiting)).toEqual([a]);
    expect(list.loaded(waiting, { rows: [b], next: null })).toMatchObject({
      ids: ['b'],
      total: 2,
      next: null,
    });
  });

  it('forgets a failure with the next question', () => {
    const failed = list.failed(list.initial, problem);
    expect(failed).toMatchObject({ status: 'failed', problem });
    expect(list.requested(failed).problem).toBeNull();
  });

  it('changes and removes a row it has', () => {
    const state = list.loaded(list.initial, { rows: [a, b], next: null });
    expect(list.selectRows(list.changed(state, { ...a, name: 'Wrenna' }))[0]?.name).toBe('Wrenna');
    expect(list.selectRows(list.removed(state, 'a'))).toEqual([b]);
  });
});
