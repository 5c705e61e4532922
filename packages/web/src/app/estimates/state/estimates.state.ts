import type { Link } from '@bookmatch/common/customer-page/links-contract';
import type { Estimate, EstimateRow } from '@bookmatch/common/estimates/estimates-contract';
import type { Revision } from '@bookmatch/common/estimates/revision-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import type { Operation } from '@bookmatch/common/shops/operations-contract';
import { createEntityAdapter, type EntityState } from '@ngrx/entity';
import { createFeature, createReducer, on } from '@ngrx/store';
import { notSaved, saved, saveFailed, saving, type SaveState } from '../../platform/forms/save-state';
import { createListState, type ListState } from '../../platform/lists/list-state';
import { EstimatesApi, EstimatesPage } from './estimates.actions';

export type EstimatesState = {
  list: ListState<EstimateRow>;
  /** The estimates that were opened, each with its current revision. */
  opened: EntityState<Estimate>;
  openProblem: Problem | null;
  /** Older revisions that were looked into. */
  revisions: EntityState<Revision>;
  operations: Operation[];
  create: SaveState;
  /** How the last save of the draft went; it saves by itself while somebody types. */
  draft: SaveState;
  send: SaveState;
  links: Link[];
  /** The address of the link made last, shown this once. */
  newLinkUrl: string | null;
};

export const estimateList = createListState<EstimateRow>();
export const openedEstimates = createEntityAdapter<Estimate>();
export const openedRevisions = createEntityAdapter<Revision>();

export const initialEstimates: EstimatesState = {
  list: estimateList.initial,
  opened: openedEstimates.getInitialState(),
  openProblem: null,
  revisions: openedRevisions.getInitialState(),
  operations: [],
  create: notSaved,
  draft: notSaved,
  send: notSaved,
  links: [],
  newLinkUrl: null,
};

export const estimatesFeature = createFeature({
  name: 'estimates',
  reducer: createReducer(
    initialEstimates,
    on(EstimatesPage.listOpened, (state): EstimatesState => ({
      ...state,
      list: estimateList.requested(state.list),
    })),
    on(EstimatesApi.listLoaded, (state, { page }): EstimatesState => ({
      ...state,
      list: estimateList.loaded(state.list, page),
    })),
    on(EstimatesApi.listFailed, (state, { problem }): EstimatesState => ({
      ...state,
      list: estimateList.failed(state.list, problem),
    })),
    on(EstimatesPage.formOpened, (state): EstimatesState => ({ ...state, create: notSaved })),
    on(EstimatesPage.createSubmitted, (state): EstimatesState => ({ ...state, create: saving })),
    on(EstimatesApi.createFailed, (state, { problem }): EstimatesState => ({
      ...state,
      create: saveFailed(problem),
    })),
    on(EstimatesApi.created, (state, { estimate }): EstimatesState => ({
      ...withEstimate(state, estimate),
      create: saved,
    })),
    on(EstimatesPage.estimateOpened, EstimatesPage.revisionOpened, (state): EstimatesState => ({
      ...state,
      openProblem: null,
    })),
    on(EstimatesApi.estimateFailed, (state, { problem }): EstimatesState => ({
      ...state,
      openProblem: problem,
    })),
    on(
      EstimatesApi.estimateLoaded,
      EstimatesApi.headSaved,
      EstimatesApi.revisionStarted,
      EstimatesApi.declined,
      (state, { estimate }): EstimatesState => withEstimate(state, estimate),
    ),
    on(EstimatesApi.operationsLoaded, (state, { operations }): EstimatesState => ({ ...state, operations })),
    on(EstimatesPage.editorOpened, (state): EstimatesState => ({ ...state, draft: notSaved })),
    on(EstimatesPage.draftEdited, (state): EstimatesState => ({ ...state, draft: saving })),
    on(EstimatesApi.draftSaved, (state, { draft, revision }): EstimatesState => ({
      ...withDraft(state, draft.estimateId, revision),
      draft: saved,
    })),
    on(EstimatesApi.draftFailed, (state, { problem }): EstimatesState => ({
      ...state,
      draft: saveFailed(problem),
    })),
    on(EstimatesApi.revisionLoaded, (state, { revision }): EstimatesState => ({
      ...state,
      revisions: openedRevisions.upsertOne(revision, state.revisions),
    })),
    on(EstimatesPage.sendOpened, (state): EstimatesState => ({ ...state, send: notSaved })),
    on(EstimatesPage.sendSubmitted, (state): EstimatesState => ({ ...state, send: saving })),
    on(EstimatesApi.sendFailed, (state, { problem }): EstimatesState => ({
      ...state,
      send: saveFailed(problem),
    })),
    on(EstimatesApi.sent, (state, { estimate }): EstimatesState => ({
      ...withEstimate(state, estimate),
      send: saved,
    })),
    on(EstimatesApi.answered, (state, { estimateId, question }): EstimatesState =>
      change(state, estimateId, ({ questions }) => ({
        questions: questions.map((other) => (other.id === question.id ? question : other)),
      })),
    ),
    on(EstimatesPage.linksOpened, (state): EstimatesState => ({ ...state, links: [], newLinkUrl: null })),
    on(EstimatesApi.linksLoaded, (state, { links }): EstimatesState => ({ ...state, links })),
    on(EstimatesApi.linkMade, (state, { link: { url, ...link } }): EstimatesState => ({
      ...state,
      links: [link, ...state.links],
      newLinkUrl: url,
    })),
    on(EstimatesApi.linkEnded, (state, { link }): EstimatesState => ({
      ...state,
      links: state.links.map((other) => (other.id === link.id ? link : other)),
    })),
  ),
});

function withEstimate(state: EstimatesState, estimate: Estimate): EstimatesState {
  return { ...state, opened: openedEstimates.upsertOne(estimate, state.opened) };
}

/** A saved draft is the current revision with a new version and new totals. */
function withDraft(state: EstimatesState, estimateId: string, revision: Revision): EstimatesState {
  return change(state, estimateId, ({ revisions }) => ({
    currentRevision: revision,
    revisions: revisions.map((row) =>
      row.id === revision.id ? { ...row, totalCents: revision.totals.totalCents } : row,
    ),
  }));
}

function change(
  state: EstimatesState,
  id: string,
  changes: (estimate: Estimate) => Partial<Estimate>,
): EstimatesState {
  const estimate = state.opened.entities[id];
  if (!estimate) return state;
  return {
    ...state,
    opened: openedEstimates.updateOne({ id, changes: changes(estimate) }, state.opened),
  };
}
