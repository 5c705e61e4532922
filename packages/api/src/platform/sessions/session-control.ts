import type { Request } from 'express';
import type { SessionControl } from '../http/route.js';
import type { SessionStore } from './session-store.js';

/**
 * Who the browser session belongs to, and what a handler may do to it. Signing in always starts a new session under a
 * new id, so that an id planted beforehand is worth nothing.
 */
export function sessionOf(
  request: Request,
  store: SessionStore,
): { personId: string | null; control: SessionControl } {
  const { session } = request;
  const control: SessionControl = {
    id: request.sessionID,
    async signIn(personId) {
      await call((done) => session.regenerate(done));
      request.session.personId = personId;
      await store.begin(request.sessionID, request.session, {
        personId,
        userAgent: request.get('user-agent') ?? '',
        address: request.ip ?? '',
      });
    },
    signOut: () => call((done) => session.destroy(done)),
  };
  return { personId: session.personId ?? null, control };
}

function call(start: (done: (error?: unknown) => void) => void): Promise<void> {
  return new Promise((resolve, reject) => start((error) => (error ? reject(toError(error)) : resolve())));
}
const toError = (error: unknown) => (error instanceof Error ? error : new Error(String(error)));
