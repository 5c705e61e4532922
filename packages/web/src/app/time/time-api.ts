import { inject, Injectable } from '@angular/core';
import {
  clockJobsSchema,
  clockStateSchema,
  punchedSchema,
  type ClockJobs,
  type ClockState,
  type Punched,
} from '@bookmatch/common/time/clock-contract';
import {
  timeEntryPageSchema,
  timeEntrySchema,
  type AddTimeEntry,
  type ClockInInput,
  type CorrectTimeEntry,
  type TimeEntry,
  type TimeEntryRow,
} from '@bookmatch/common/time/time-contract';
import {
  memberWeekSchema,
  shopWeekSchema,
  type MemberWeek,
  type ShopWeek,
} from '@bookmatch/common/time/week-contract';
import type { Page } from '@bookmatch/common/wire/list';
import type { Observable } from 'rxjs';
import { ApiClient, type CallOptions } from '../platform/api/api-client';
import { withQuery } from '../platform/api/query-params';
import type { ListQuery } from '../platform/lists/list-address';
import { injectShopUrl } from '../platform/session/current-shop';
import type { Punch, PunchIn } from './punches/punch';

/** A time entry as it was read. */
export type EntryRef = Pick<TimeEntry, 'id' | 'version'>;
type WhenSignedOut = NonNullable<CallOptions<unknown>['whenSignedOut']>;

/** The routes of the clock, of time entries and of weeks, one method each. */
@Injectable({ providedIn: 'root' })
export class TimeApiClient {
  private readonly api = inject(ApiClient);
  private readonly shopUrl = injectShopUrl();

  clock(): Observable<ClockState> {
    return this.api.get(this.shopUrl('/time/clock'), { answer: clockStateSchema, whenSignedOut: 'fail' });
  }

  clockJobs(): Observable<ClockJobs> {
    return this.api.get(this.shopUrl('/time/clock/jobs'), { answer: clockJobsSchema, whenSignedOut: 'fail' });
  }

  send(punch: Punch, whenSignedOut: WhenSignedOut): Observable<Punched> {
    const options = { answer: punchedSchema, whenSignedOut };
    if (punch.type === 'in') return this.api.post(this.shopUrl('/time/clock-in'), bodyOf(punch), options);
    const url = this.shopUrl(`/time/entries/${punch.entryId}/clock-out`);
    return this.api.post(url, { at: punch.at }, options);
  }

  /** @param memberId one's own when left out */
  memberWeek(memberId: string | null, of: string | undefined): Observable<MemberWeek> {
    const path = memberId === null ? '/time/week' : `/time/weeks/${memberId}`;
    return this.api.get(this.shopUrl(path), { answer: memberWeekSchema, query: { of } });
  }

  shopWeek(of: string | undefined): Observable<ShopWeek> {
    return this.api.get(this.shopUrl('/time/weeks'), { answer: shopWeekSchema, query: { of } });
  }

  weekExportUrl(of: string): string {
    return withQuery(this.shopUrl('/time/weeks/export'), { of });
  }

  list(query: ListQuery): Observable<Page<TimeEntryRow>> {
    return this.api.get(this.shopUrl('/time/entries'), { answer: timeEntryPageSchema, query });
  }

  entry(id: string): Observable<TimeEntry> {
    return this.api.get(this.shopUrl(`/time/entries/${id}`), { answer: timeEntrySchema });
  }

  add(fields: AddTimeEntry): Observable<TimeEntry> {
    return this.api.post(this.shopUrl('/time/entries'), fields, { answer: timeEntrySchema });
  }

  correct({ id, version }: EntryRef, fields: CorrectTimeEntry): Observable<TimeEntry> {
    return this.api.patch(this.shopUrl(`/time/entries/${id}`), fields, { answer: timeEntrySchema, version });
  }

  void({ id, version }: EntryRef, reason: string): Observable<TimeEntry> {
    const url = this.shopUrl(`/time/entries/${id}/void`);
    return this.api.post(url, { reason }, { answer: timeEntrySchema, version });
  }
}

function bodyOf({ entryId, at, source, work }: PunchIn): ClockInInput {
  const { jobId, operationId, kind } = work;
  return { entryId, jobId, operationId, kind, at, source };
}
