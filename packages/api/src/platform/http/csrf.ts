import { createHmac, randomBytes, timingSafeEqual } from 'node:crypto';
import type { RequestHandler } from 'express';
import { ProblemError } from './problem-error.js';

export const CSRF_COOKIE = 'bookmatch-csrf';
const UNSAFE = new Set(['POST', 'PUT', 'PATCH', 'DELETE']);

/**
 * Refuses unsafe requests that another site's page could have sent: a foreign `Origin`, or a token header that does not
 * equal the cookie only our own pages can read. The token is signed, so that a neighbor subdomain cannot plant one.
 */
export function csrf(options: { origin: string; secret: string; secure: boolean }): RequestHandler {
  const sign = (value: string) =>
    createHmac('sha256', options.secret).update(`csrf:${value}`).digest('base64url');
  const isOurs = (token: string) => {
    const [value = '', signature = ''] = token.split('.');
    return sameText(signature, sign(value));
  };
  return (request, response, next) => {
    const cookie = cookieOf(request.headers.cookie, CSRF_COOKIE);
    if (cookie === undefined || (UNSAFE.has(request.method) && !isOurs(cookie))) {
      const value = randomBytes(18).toString('base64url');
      response.cookie(CSRF_COOKIE, `${value}.${sign(value)}`, {
        sameSite: 'lax',
        secure: options.secure,
        path: '/',
      });
    }
    if (UNSAFE.has(request.method)) refuseForeign(request.get('origin'), options.origin);
    if (
      UNSAFE.has(request.method) &&
      !(cookie !== undefined && isOurs(cookie) && sameText(request.get('x-csrf-token') ?? '', cookie))
    )
      throw new ProblemError('cross-site', 'Load the page again and repeat what you did.');
    next();
  };
}

function refuseForeign(origin: string | undefined, ours: string): void {
  if (origin !== ours) throw new ProblemError('cross-site', 'This request did not come from a page of ours.');
}

export function cookieOf(header: string | undefined, name: string): string | undefined {
  return header
    ?.split(';')
    .map((part) => part.trim())
    .find((part) => part.startsWith(`${name}=`))
    ?.slice(name.length + 1);
}

function sameText(a: string, b: string): boolean {
  const [first, second] = [Buffer.from(a), Buffer.from(b)];
  return first.length === second.length && timingSafeEqual(first, second);
}
