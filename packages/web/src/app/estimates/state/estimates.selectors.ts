import { createSelector } from '@ngrx/store';
import { estimateList, estimatesFeature } from './estimates.state';

const { selectList, selectOpened, selectRevisions } = estimatesFeature;

export const {
  selectCreate,
  selectDraft,
  selectLinks,
  selectNewLinkUrl,
  selectOpenProblem,
  selectOperations,
  selectSend,
} = estimatesFeature;

/** All that the list's screen shows. */
export const selectEstimateList = createSelector(selectList, (list) => ({
  rows: estimateList.selectRows(list),
  loading: list.status === 'idle' || list.status === 'loading',
  problem: list.problem,
  next: list.next,
  total: list.total,
}));

export const selectEstimate = (id: string) =>
  createSelector(selectOpened, ({ entities }) => entities[id] ?? null);

/** A revision of an opened estimate: the current one, or an older one once it was loaded. */
export const selectRevision = (estimateId: string, revisionId: string | null) =>
  createSelector(selectOpened, selectRevisions, (opened, revisions) => {
    const current = opened.entities[estimateId]?.currentRevision ?? null;
    if (revisionId === null || current?.id === revisionId) return current;
    return revisions.entities[revisionId] ?? null;
  });
