import type { Problem } from '@bookmatch/common/problems/problem';
import type {
  CreateOperation,
  Operation,
  UpdateOperation,
} from '@bookmatch/common/shops/operations-contract';
import { createActionGroup, emptyProps, props } from '@ngrx/store';
import type { RowRef } from '../shops-api';

export const OperationsPage = createActionGroup({
  source: 'Operations Page',
  events: {
    opened: emptyProps(),
    dialogOpened: emptyProps(),
    addSubmitted: props<{ fields: CreateOperation }>(),
    changeSubmitted: props<{ operation: RowRef; fields: UpdateOperation }>(),
    archiveSet: props<{ operation: RowRef; archived: boolean }>(),
    /** All operations in their new order. */
    moved: props<{ operationIds: string[] }>(),
  },
});

export const OperationsApi = createActionGroup({
  source: 'Operations API',
  events: {
    loaded: props<{ operations: Operation[] }>(),
    loadFailed: props<{ problem: Problem }>(),
    saved: props<{ operation: Operation }>(),
    saveFailed: props<{ problem: Problem }>(),
    archived: props<{ operation: Operation }>(),
    reordered: props<{ operations: Operation[] }>(),
    commandFailed: props<{ problem: Problem }>(),
  },
});
