import { HttpClient, HttpHeaders } from '@angular/common/http';
import { inject, Injectable, isDevMode } from '@angular/core';
import { catchError, defer, map, switchMap, tap, throwError, throwIfEmpty, type Observable } from 'rxjs';
import { ActionKeys } from './action-keys';
import { ApiProblem, toProblem } from './api-problem';
import { isSignedOut, isUncertain, isUnverified } from './problem-kinds';
import { queryParams, type Query } from './query-params';
import { SESSION_RENEWAL } from './session-renewal';

/** What a contract's schema offers here; the shape is checked while developing and testing, and trusted after. */
export type AnswerShape<T> = { parse(value: unknown): T };

export type CallOptions<T> = {
  /** The contract's response schema. Without it the answer is ignored. */
  answer?: AnswerShape<T>;
  query?: Query;
  /** The version of the row as it was read; sent as `If-Match`. */
  version?: number;
  /** `fail` for what must work signed out: no sign-in dialog, the problem goes to the caller. */
  whenSignedOut?: 'renew' | 'fail';
};

type Method = 'GET' | 'POST' | 'PATCH' | 'PUT' | 'DELETE';

/**
 * The one way to the API. Every failure is an `ApiProblem`. A session that ended is renewed in place and the request
 * repeated with the same key, so that what was typed stays.
 */
@Injectable({ providedIn: 'root' })
export class ApiClient {
  private readonly http = inject(HttpClient);
  private readonly keys = inject(ActionKeys);
  private readonly renewSession = inject(SESSION_RENEWAL);

  get<T = void>(url: string, options: CallOptions<T> = {}): Observable<T> {
    return this.call('GET', url, undefined, options);
  }

  /** Carries an `Idempotency-Key` of its own; a repeat of the same unanswered action carries the same one. */
  post<T = void>(url: string, body: unknown, options: CallOptions<T> = {}): Observable<T> {
    return defer(() => {
      const headers = { 'Idempotency-Key': this.keys.keyFor(url, body) };
      return this.call('POST', url, body ?? {}, options, headers);
    }).pipe(
      tap(() => this.keys.settle(url, body)),
      catchError((error: unknown) => {
        if (!isUncertain(toProblem(error))) this.keys.settle(url, body);
        return throwError(() => error);
      }),
    );
  }

  patch<T = void>(url: string, body: unknown, options: CallOptions<T> = {}): Observable<T> {
    return this.call('PATCH', url, body, options);
  }

  put<T = void>(url: string, body: unknown, options: CallOptions<T> = {}): Observable<T> {
    return this.call('PUT', url, body, options);
  }

  delete<T = void>(url: string, options: CallOptions<T> = {}): Observable<T> {
    return this.call('DELETE', url, undefined, options);
  }

  private call<T>(
    method: Method,
    url: string,
    body: unknown,
    options: CallOptions<T>,
    extraHeaders: Record<string, string> = {},
  ): Observable<T> {
    const headers = new HttpHeaders({ ...extraHeaders, ...versionHeader(options.version) });
    const params = queryParams(options.query);
    const once = defer(() => this.http.request<unknown>(method, url, { body, headers, params })).pipe(
      catchError((error: unknown) => throwError(() => new ApiProblem(toProblem(error)))),
    );
    return once.pipe(
      catchError((error: ApiProblem) => this.again(error, once, options)),
      map((answer) => checked(answer, options.answer)),
    );
  }

  private again(
    error: ApiProblem,
    once: Observable<unknown>,
    { whenSignedOut = 'renew' }: CallOptions<unknown>,
  ): Observable<unknown> {
    if (isUnverified(error.problem)) return once;
    if (whenSignedOut === 'fail' || !isSignedOut(error.problem)) return throwError(() => error);
    return this.renewSession().pipe(
      switchMap(() => once),
      throwIfEmpty(() => error),
    );
  }
}

function versionHeader(version: number | undefined): Record<string, string> {
  return version === undefined ? {} : { 'If-Match': `"${version}"` };
}

function checked<T>(answer: unknown, shape: AnswerShape<T> | undefined): T {
  return shape && isDevMode() ? shape.parse(answer) : (answer as T);
}
