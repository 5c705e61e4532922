import type { Problem } from '@bookmatch/common/problems/problem';
import type { Operation } from '@bookmatch/common/shops/operations-contract';
import { createEntityAdapter, type EntityState } from '@ngrx/entity';
import { createFeature, createReducer, createSelector, on } from '@ngrx/store';
import { notSaved, saved, saveFailed, saving, type SaveState } from '../../platform/forms/save-state';
import { OperationsApi, OperationsPage } from './operations.actions';

export type OperationsState = {
  operations: EntityState<Operation>;
  loaded: boolean;
  problem: Problem | null;
  dialog: SaveState;
};

export const operationRows = createEntityAdapter<Operation>({
  sortComparer: (a, b) => a.position - b.position || a.id.localeCompare(b.id),
});

export const initialOperations: OperationsState = {
  operations: operationRows.getInitialState(),
  loaded: false,
  problem: null,
  dialog: notSaved,
};

export const operationsFeature = createFeature({
  name: 'operations',
  reducer: createReducer(
    initialOperations,
    on(OperationsPage.opened, (state): OperationsState => ({ ...state, problem: null })),
    on(OperationsApi.loaded, OperationsApi.reordered, (state, { operations }): OperationsState => ({
      ...state,
      loaded: true,
      operations: operationRows.setAll(operations, state.operations),
    })),
    on(OperationsApi.loadFailed, (state, { problem }): OperationsState => ({ ...state, problem })),
    on(OperationsPage.dialogOpened, (state): OperationsState => ({ ...state, dialog: notSaved })),
    on(OperationsPage.addSubmitted, OperationsPage.changeSubmitted, (state): OperationsState => ({
      ...state,
      dialog: saving,
    })),
    on(OperationsApi.saved, (state, { operation }): OperationsState => ({
      ...state,
      operations: operationRows.setOne(operation, state.operations),
      dialog: saved,
    })),
    on(OperationsApi.saveFailed, (state, { problem }): OperationsState => ({
      ...state,
      dialog: saveFailed(problem),
    })),
    on(OperationsApi.archived, (state, { operation }): OperationsState => ({
      ...state,
      operations: operationRows.setOne(operation, state.operations),
    })),
    // Shown at once; a refusal reads the order that holds.
    on(OperationsPage.moved, (state, { operationIds }): OperationsState => ({
      ...state,
      operations: operationRows.updateMany(
        operationIds.map((id, index) => ({ id, changes: { position: index + 1 } })),
        state.operations,
      ),
    })),
  ),
  extraSelectors: ({ selectOperations }) => {
    const selectAll = createSelector(selectOperations, operationRows.getSelectors().selectAll);
    return {
      selectInUse: createSelector(selectAll, (all) => all.filter(({ archived }) => !archived)),
      selectArchived: createSelector(selectAll, (all) => all.filter(({ archived }) => archived)),
    };
  },
});
