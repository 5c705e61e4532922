import { ApiError } from './error.js';

function shown(key: string): string {
  return key.length <= 12 ? '****' : `${key.slice(0, 8)}****${key.slice(-4)}`;
}

function keyFrom(authorization: string | undefined): string | null {
  if (authorization === undefined) return null;
  if (authorization.startsWith('Bearer ')) return authorization.slice('Bearer '.length);
  if (!authorization.startsWith('Basic ')) return null;
  const decoded = Buffer.from(authorization.slice('Basic '.length), 'base64').toString('utf8');
  return decoded.split(':')[0] ?? null;
}

/** Errors: 401 when the secret key is absent or not ours. */
export function checkKey(authorization: string | undefined, expected: string): void {
  const key = keyFrom(authorization);
  if (key === expected) return;
  const message =
    key === null ? 'You did not provide an API key.' : `Invalid API Key provided: ${shown(key)}`;
  throw new ApiError(401, { type: 'invalid_request_error', message });
}
