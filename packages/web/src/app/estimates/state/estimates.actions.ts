import type { CreatedLink, Link } from '@bookmatch/common/customer-page/links-contract';
import type { Question } from '@bookmatch/common/customer-page/questions-contract';
import type {
  CreateEstimate,
  Estimate,
  EstimateRow,
  UpdateEstimate,
} from '@bookmatch/common/estimates/estimates-contract';
import type { Revision, SaveRevision } from '@bookmatch/common/estimates/revision-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import type { Operation } from '@bookmatch/common/shops/operations-contract';
import type { Page } from '@bookmatch/common/wire/list';
import { createActionGroup, emptyProps, props } from '@ngrx/store';
import type { ListQuery } from '../../platform/lists/list-address';
import type { RevisionRef, Versioned } from '../estimates-api';

/** What happened on the screens. */
export const EstimatesPage = createActionGroup({
  source: 'Estimates Page',
  events: {
    listOpened: props<{ query: ListQuery }>(),
    formOpened: emptyProps(),
    createSubmitted: props<{ fields: CreateEstimate }>(),
    estimateOpened: props<{ id: string }>(),
    editorOpened: emptyProps(),
    draftEdited: props<{ draft: RevisionRef; content: SaveRevision }>(),
    /** What was typed into a revision that was sent meanwhile goes into a new one. */
    rescuePressed: props<{ estimateId: string; content: SaveRevision }>(),
    headEdited: props<{ estimate: Versioned; fields: UpdateEstimate }>(),
    revisionOpened: props<{ revision: RevisionRef }>(),
    sendOpened: emptyProps(),
    sendSubmitted: props<{ estimateId: string; to: string; message: string }>(),
    newRevisionPressed: props<{ estimate: Versioned }>(),
    duplicatePressed: props<{ id: string }>(),
    declineConfirmed: props<{ estimate: Versioned; reason: string }>(),
    answerSubmitted: props<{ estimateId: string; questionId: string; body: string }>(),
    linksOpened: props<{ estimateId: string }>(),
    linkAsked: props<{ estimateId: string }>(),
    linkRevoked: props<{ id: string }>(),
  },
});

/** What the server said. */
export const EstimatesApi = createActionGroup({
  source: 'Estimates API',
  events: {
    listLoaded: props<{ page: Page<EstimateRow> }>(),
    listFailed: props<{ problem: Problem }>(),
    created: props<{ estimate: Estimate }>(),
    createFailed: props<{ problem: Problem }>(),
    estimateLoaded: props<{ estimate: Estimate }>(),
    estimateFailed: props<{ problem: Problem }>(),
    operationsLoaded: props<{ operations: Operation[] }>(),
    draftSaved: props<{ draft: RevisionRef; revision: Revision }>(),
    draftFailed: props<{ draft: RevisionRef; problem: Problem }>(),
    headSaved: props<{ estimate: Estimate }>(),
    revisionLoaded: props<{ revision: Revision }>(),
    sent: props<{ estimate: Estimate }>(),
    sendFailed: props<{ problem: Problem }>(),
    revisionStarted: props<{ estimate: Estimate }>(),
    declined: props<{ estimate: Estimate }>(),
    answered: props<{ estimateId: string; question: Question }>(),
    linksLoaded: props<{ links: Link[] }>(),
    linkMade: props<{ link: CreatedLink }>(),
    linkEnded: props<{ link: Link }>(),
    /** A command without a form of its own was refused. */
    commandFailed: props<{ problem: Problem }>(),
  },
});
