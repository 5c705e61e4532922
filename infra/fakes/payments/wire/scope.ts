import type { State } from '../state/state.js';
import { ApiError } from './error.js';

/**
 * The connected account a request acts for, null for the platform itself.
 * Errors: 403 for an account that is not connected to this platform.
 */
export function accountFrom(state: State, header: string | undefined): string | null {
  if (header === undefined || header === state.platformId) return null;
  if (Object.hasOwn(state.accounts, header)) return header;
  throw new ApiError(403, {
    type: 'invalid_request_error',
    code: 'account_invalid',
    message: `The key has no access to account '${header}', or there is no such account.`,
  });
}
