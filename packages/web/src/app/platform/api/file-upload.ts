import { HttpClient, HttpEventType, type HttpEvent } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { catchError, defer, filter, map, switchMap, throwError, throwIfEmpty, type Observable } from 'rxjs';
import type { AnswerShape } from './api-client';
import { ApiProblem, toProblem } from './api-problem';
import { isSignedOut } from './problem-kinds';
import { SESSION_RENEWAL } from './session-renewal';

/** How far an upload is: a share from 0 to 1 while it is sent, then the answer. */
export type UploadStep<Answer> = { sent: number } | { answer: Answer };

/** Sends one file as a form and tells how far it is, which the client for everything else need not. */
@Injectable({ providedIn: 'root' })
export class FileUpload {
  private readonly http = inject(HttpClient);
  private readonly renewSession = inject(SESSION_RENEWAL);

  /** Fails with an `ApiProblem`. A session that ended is renewed and the file sent again. */
  send<Answer>(url: string, file: File, answer: AnswerShape<Answer>): Observable<UploadStep<Answer>> {
    const once = defer(() => {
      const form = new FormData();
      form.append('file', file, file.name);
      return this.http.post(url, form, { reportProgress: true, observe: 'events' });
    }).pipe(catchError((error: unknown) => throwError(() => new ApiProblem(toProblem(error)))));
    return once.pipe(
      catchError((error: ApiProblem) =>
        isSignedOut(error.problem)
          ? this.renewSession().pipe(
              switchMap(() => once),
              throwIfEmpty(() => error),
            )
          : throwError(() => error),
      ),
      map((event) => stepOf(event, answer)),
      filter((step) => step !== null),
    );
  }
}

function stepOf<Answer>(event: HttpEvent<unknown>, answer: AnswerShape<Answer>): UploadStep<Answer> | null {
  if (event.type === HttpEventType.UploadProgress)
    return { sent: event.total ? event.loaded / event.total : 0 };
  return event.type === HttpEventType.Response ? { answer: answer.parse(event.body) } : null;
}
