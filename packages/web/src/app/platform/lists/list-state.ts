import type { Problem } from '@bookmatch/common/problems/problem';
import type { Page } from '@bookmatch/common/wire/list';
import { createEntityAdapter, type EntityState } from '@ngrx/entity';

/** One page of a server-paged list in the store. */
export type ListState<Row> = EntityState<Row> & {
  status: 'idle' | 'loading' | 'loaded' | 'failed';
  next: string | null;
  /** Counted by the server on the first page only, kept while paging on. */
  total: number | null;
  problem: Problem | null;
};

/**
 * The reducers and selectors of a list, the same in every slice. The rows of the last answer stay while the next one
 * is under way, so that a table dims instead of jumping.
 */
export function createListState<Row extends { id: string }>() {
  const adapter = createEntityAdapter<Row>();
  const { selectAll } = adapter.getSelectors();
  const initial: ListState<Row> = adapter.getInitialState({
    status: 'idle',
    next: null,
    total: null,
    problem: null,
  });
  return {
    initial,
    selectRows: selectAll,
    requested: (list: ListState<Row>): ListState<Row> => ({ ...list, status: 'loading', problem: null }),
    loaded: (list: ListState<Row>, page: Page<Row>): ListState<Row> =>
      adapter.setAll(page.rows, {
        ...list,
        status: 'loaded',
        next: page.next,
        total: page.total ?? list.total,
      }),
    failed: (list: ListState<Row>, problem: Problem): ListState<Row> => ({
      ...list,
      status: 'failed',
      problem,
    }),
    changed: (list: ListState<Row>, row: Row): ListState<Row> =>
      adapter.updateOne({ id: row.id, changes: row }, list),
    removed: (list: ListState<Row>, id: string): ListState<Row> => adapter.removeOne(id, list),
  };
}
