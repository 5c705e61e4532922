import type { Lead, LeadNote, LeadRow } from '@bookmatch/common/leads/leads-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import { createEntityAdapter, type EntityState } from '@ngrx/entity';
import { createFeature, createReducer, on } from '@ngrx/store';
import { notSaved, saved, saveFailed, saving, type SaveState } from '../../platform/forms/save-state';
import type { ListQuery } from '../../platform/lists/list-address';
import { createListState, type ListState } from '../../platform/lists/list-state';
import { cardOf, findCard, placeOnBoard, type BoardColumn } from './board-columns';
import { LeadsApi, LeadsPage, type LeadFormName } from './leads.actions';

export type BoardState = {
  status: 'idle' | 'loading' | 'loaded' | 'failed';
  /** What the board was asked for, so that it can be asked again. */
  query: ListQuery;
  columns: BoardColumn[];
  problem: Problem | null;
};
export type NotesState = { leadId: string | null; notes: LeadNote[]; problem: Problem | null };

export type LeadsState = {
  list: ListState<LeadRow>;
  board: BoardState;
  opened: EntityState<Lead>;
  openProblem: Problem | null;
  notes: NotesState;
  saves: Record<LeadFormName, SaveState>;
  /** Leads whose change of stage is under way: their next one must wait for the version it makes. */
  moving: readonly string[];
};

export const leadList = createListState<LeadRow>();
export const openedLeads = createEntityAdapter<Lead>();
const noNotes: NotesState = { leadId: null, notes: [], problem: null };

export const initialLeads: LeadsState = {
  list: leadList.initial,
  board: { status: 'idle', query: {}, columns: [], problem: null },
  opened: openedLeads.getInitialState(),
  openProblem: null,
  notes: noNotes,
  saves: {
    lead: notSaved,
    'next-step': notSaved,
    loss: notSaved,
    conversion: notSaved,
    estimate: notSaved,
    note: notSaved,
  },
  moving: [],
};

export const leadsFeature = createFeature({
  name: 'leads',
  reducer: createReducer(
    initialLeads,
    on(LeadsPage.listOpened, (state): LeadsState => ({ ...state, list: leadList.requested(state.list) })),
    on(LeadsApi.listLoaded, (state, { page }): LeadsState => ({
      ...state,
      list: leadList.loaded(state.list, page),
    })),
    on(LeadsApi.listFailed, (state, { problem }): LeadsState => ({
      ...state,
      list: leadList.failed(state.list, problem),
    })),

    on(LeadsPage.boardOpened, (state, { query }): LeadsState => ({
      ...state,
      board: { ...state.board, status: 'loading', query, problem: null },
    })),
    on(LeadsApi.boardLoaded, (state, { board }): LeadsState => ({
      ...state,
      board: { ...state.board, status: 'loaded', columns: board.columns },
    })),
    on(LeadsApi.boardFailed, (state, { problem }): LeadsState => ({
      ...state,
      board: { ...state.board, status: 'failed', problem },
    })),

    on(LeadsPage.leadOpened, (state, { id }): LeadsState => ({
      ...state,
      openProblem: null,
      notes: state.notes.leadId === id ? state.notes : { ...noNotes, leadId: id },
    })),
    on(LeadsApi.leadLoaded, LeadsApi.created, (state, { lead }): LeadsState => withLead(state, lead)),
    on(LeadsApi.leadFailed, (state, { problem }): LeadsState => ({ ...state, openProblem: problem })),
    on(LeadsApi.notesLoaded, (state, { leadId, notes }): LeadsState =>
      state.notes.leadId === leadId ? { ...state, notes: { leadId, notes, problem: null } } : state,
    ),
    on(LeadsApi.notesFailed, (state, { problem }): LeadsState => ({
      ...state,
      notes: { ...state.notes, problem },
    })),
    on(LeadsApi.noteAdded, (state, { leadId, note }): LeadsState =>
      withSave(
        state.notes.leadId === leadId
          ? { ...state, notes: { ...state.notes, notes: [note, ...state.notes.notes] } }
          : state,
        'note',
        saved,
      ),
    ),

    on(LeadsPage.formOpened, (state, { form }): LeadsState => withSave(state, form, notSaved)),
    on(LeadsPage.createSubmitted, LeadsPage.editSubmitted, (state): LeadsState =>
      withSave(state, 'lead', saving),
    ),
    on(LeadsPage.nextStepSubmitted, (state): LeadsState => withSave(state, 'next-step', saving)),
    on(LeadsPage.lossSubmitted, (state): LeadsState => withSave(state, 'loss', saving)),
    on(LeadsPage.conversionSubmitted, (state): LeadsState => withSave(state, 'conversion', saving)),
    on(LeadsPage.estimateSubmitted, (state): LeadsState => withSave(state, 'estimate', saving)),
    on(LeadsPage.noteSubmitted, (state): LeadsState => withSave(state, 'note', saving)),
    on(LeadsApi.created, (state): LeadsState => withSave(state, 'lead', saved)),
    on(LeadsApi.estimateStarted, (state): LeadsState => withSave(state, 'estimate', saved)),
    on(LeadsApi.saved, (state, { form, lead }): LeadsState => withSave(withLead(state, lead), form, saved)),
    on(LeadsApi.saveFailed, (state, { form, problem }): LeadsState =>
      withSave(state, form, saveFailed(problem)),
    ),

    on(LeadsPage.stagePicked, (state, { lead, stage }): LeadsState => {
      const card = findCard(state.board.columns, lead.id);
      const moving = [...state.moving, lead.id];
      return card ? { ...onBoard(state, { ...card, stage }), moving } : { ...state, moving };
    }),
    on(LeadsPage.winConfirmed, LeadsPage.reopenPressed, (state, { lead }): LeadsState => ({
      ...state,
      moving: [...state.moving, lead.id],
    })),
    on(LeadsApi.stageChanged, (state, { lead }): LeadsState => ({
      ...withLead(state, lead),
      moving: without(state.moving, lead.id),
    })),
    on(LeadsApi.stageRefused, (state, { id }): LeadsState => ({
      ...state,
      moving: without(state.moving, id),
    })),
  ),
});

/** The newer lead wherever it is shown. */
function withLead(state: LeadsState, lead: Lead): LeadsState {
  const row = cardOf(lead);
  return {
    ...onBoard(state, row),
    opened: openedLeads.upsertOne(lead, state.opened),
    list: leadList.changed(state.list, row),
  };
}

function onBoard(state: LeadsState, row: LeadRow): LeadsState {
  return { ...state, board: { ...state.board, columns: placeOnBoard(state.board.columns, row) } };
}

function withSave(state: LeadsState, form: LeadFormName, save: SaveState): LeadsState {
  return { ...state, saves: { ...state.saves, [form]: save } };
}

const without = (ids: readonly string[], id: string): string[] => ids.filter((other) => other !== id);
