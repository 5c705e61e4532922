import type {
  ConvertLead,
  CreateLead,
  Lead,
  LeadBoard,
  LeadNote,
  LeadRow,
  LoseLead,
  OpenLeadStage,
  StartEstimate,
  UpdateLead,
} from '@bookmatch/common/leads/leads-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import type { Page } from '@bookmatch/common/wire/list';
import { createActionGroup, props } from '@ngrx/store';
import type { ListQuery } from '../../platform/lists/list-address';
import type { LeadRef } from '../leads-api';

/** The forms of this slice, each with a saving of its own. */
export type LeadFormName = 'lead' | 'next-step' | 'loss' | 'conversion' | 'estimate' | 'note';

/** What happened on the screens. */
export const LeadsPage = createActionGroup({
  source: 'Leads Page',
  events: {
    listOpened: props<{ query: ListQuery }>(),
    boardOpened: props<{ query: ListQuery }>(),
    leadOpened: props<{ id: string }>(),
    formOpened: props<{ form: LeadFormName }>(),
    createSubmitted: props<{ fields: CreateLead }>(),
    editSubmitted: props<{ lead: LeadRef; fields: UpdateLead }>(),
    nextStepSubmitted: props<{ lead: LeadRef; fields: UpdateLead }>(),
    stagePicked: props<{ lead: LeadRef; stage: OpenLeadStage }>(),
    winConfirmed: props<{ lead: LeadRef }>(),
    lossSubmitted: props<{ lead: LeadRef; loss: LoseLead }>(),
    reopenPressed: props<{ lead: LeadRef }>(),
    conversionSubmitted: props<{ lead: LeadRef; conversion: ConvertLead }>(),
    estimateSubmitted: props<{ lead: LeadRef; estimate: StartEstimate }>(),
    noteSubmitted: props<{ id: string; body: string }>(),
  },
});

/** What the server said. */
export const LeadsApi = createActionGroup({
  source: 'Leads API',
  events: {
    listLoaded: props<{ page: Page<LeadRow> }>(),
    listFailed: props<{ problem: Problem }>(),
    boardLoaded: props<{ board: LeadBoard }>(),
    boardFailed: props<{ problem: Problem }>(),
    leadLoaded: props<{ lead: Lead }>(),
    leadFailed: props<{ problem: Problem }>(),
    notesLoaded: props<{ leadId: string; notes: LeadNote[] }>(),
    notesFailed: props<{ problem: Problem }>(),
    created: props<{ lead: Lead }>(),
    saved: props<{ form: LeadFormName; lead: Lead }>(),
    saveFailed: props<{ form: LeadFormName; id: string | null; problem: Problem }>(),
    estimateStarted: props<{ estimateId: string }>(),
    noteAdded: props<{ leadId: string; note: LeadNote }>(),
    stageChanged: props<{ lead: Lead }>(),
    stageRefused: props<{ id: string; problem: Problem }>(),
  },
});
