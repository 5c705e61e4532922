import type { ClockJobs } from '@bookmatch/common/time/clock-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import type {
  AddTimeEntry,
  CorrectTimeEntry,
  TimeEntry,
  TimeEntryRow,
} from '@bookmatch/common/time/time-contract';
import type { MemberWeek, ShopWeek } from '@bookmatch/common/time/week-contract';
import type { Page } from '@bookmatch/common/wire/list';
import { createActionGroup, emptyProps, props } from '@ngrx/store';
import type { ListQuery } from '../../platform/lists/list-address';
import type { EntryRef } from '../time-api';

/** Which week: of whom, null for one's own, and any day of it, absent for the current one. */
export type WeekAsked = { memberId: string | null; of: string | undefined };

/** What happened on the screens of weeks and entries. */
export const WeeksPage = createActionGroup({
  source: 'Weeks Page',
  events: {
    memberWeekOpened: props<WeekAsked>(),
    shopWeekOpened: props<{ of: string | undefined }>(),
    listOpened: props<{ query: ListQuery }>(),
    /** The form of an entry, with the one it is about; null adds one. */
    formOpened: props<{ entryId: string | null }>(),
    addSubmitted: props<{ fields: AddTimeEntry }>(),
    correctionSubmitted: props<{ entry: EntryRef; fields: CorrectTimeEntry }>(),
    voidConfirmed: props<{ entry: EntryRef; reason: string }>(),
    workWanted: emptyProps(),
  },
});

/** What the server said. */
export const WeeksApi = createActionGroup({
  source: 'Weeks API',
  events: {
    memberWeekLoaded: props<{ week: MemberWeek }>(),
    memberWeekFailed: props<{ problem: Problem }>(),
    shopWeekLoaded: props<{ week: ShopWeek }>(),
    shopWeekFailed: props<{ problem: Problem }>(),
    listLoaded: props<{ page: Page<TimeEntryRow> }>(),
    listFailed: props<{ problem: Problem }>(),
    entryLoaded: props<{ entry: TimeEntry }>(),
    entryFailed: props<{ problem: Problem }>(),
    saved: props<{ entry: TimeEntry }>(),
    saveFailed: props<{ problem: Problem }>(),
    voided: props<{ entry: TimeEntry }>(),
    voidFailed: props<{ problem: Problem }>(),
    workLoaded: props<{ work: ClockJobs }>(),
    workFailed: props<{ problem: Problem }>(),
  },
});
