import { createSelector } from '@ngrx/store';
import { timelineOf } from '../timeline/timeline-entry';
import type { LeadFormName } from './leads.actions';
import { leadList, leadsFeature } from './leads.state';

const { selectList, selectBoard, selectOpened, selectNotes, selectSaves } = leadsFeature;

export const { selectOpenProblem, selectMoving } = leadsFeature;

/** All that the list's screen shows. */
export const selectLeadList = createSelector(selectList, (list) => ({
  rows: leadList.selectRows(list),
  loading: list.status === 'idle' || list.status === 'loading',
  problem: list.problem,
  next: list.next,
  total: list.total,
}));

export const selectLeadBoard = createSelector(selectBoard, selectMoving, (board, moving) => ({
  columns: board.columns.map((column) => ({
    ...column,
    rows: column.rows.map((row) => ({ ...row, busy: moving.includes(row.id) })),
    /** How many more there are than cards. */
    more: Math.max(0, column.count - column.rows.length),
  })),
  loading: board.status === 'idle' || board.status === 'loading',
  problem: board.problem,
  empty: board.status === 'loaded' && board.columns.every(({ count }) => count === 0),
}));
export type ShownColumn = ReturnType<typeof selectLeadBoard>['columns'][number];
export type LeadCardRow = ShownColumn['rows'][number];

export const selectLead = (id: string) =>
  createSelector(selectOpened, ({ entities }) => entities[id] ?? null);

/** Notes and steps of a lead in one line of time, the newest first. */
export const selectTimeline = (id: string) =>
  createSelector(selectLead(id), selectNotes, (lead, { leadId, notes }) =>
    lead ? timelineOf(lead, leadId === id ? notes : []) : [],
  );
export const selectNotesProblem = createSelector(selectNotes, ({ problem }) => problem);

export const selectSave = (form: LeadFormName) => createSelector(selectSaves, (saves) => saves[form]);
export const selectBoardQuestion = createSelector(selectBoard, ({ status, query }) => ({
  asked: status !== 'idle',
  query,
}));
