import type { Response } from 'express';
import type { Readable } from 'node:stream';
import type { Answered } from './idempotency.js';
import type { Download } from './route.js';

export async function sendAnswer(response: Response, answered: Answered | Download): Promise<void> {
  response.set('Cache-Control', 'no-store');
  if ('download' in answered) {
    await sendDownload(response, answered);
    return;
  }
  const { status, body } = answered;
  if (body === undefined || body === null) {
    response.status(status === 200 ? 204 : status).end();
    return;
  }
  setVersion(response, body);
  setNext(response, body);
  response.status(status).json(body);
}

function setVersion(response: Response, body: unknown): void {
  const { version } = body as { version?: unknown };
  if (typeof version === 'number') response.set('ETag', `"${version}"`);
}

/** RFC 8288: the address of a list's next page. */
function setNext(response: Response, body: unknown): void {
  const { next } = body as { next?: unknown };
  if (typeof next !== 'string') return;
  const here = new URL(response.req.originalUrl, 'http://local');
  here.searchParams.set('after', next);
  response.set('Link', `<${here.pathname}${here.search}>; rel="next"`);
}

/**
 * A file never runs in our origin: it is an attachment unless the route vouches for its type, and even then it is
 * sandboxed and not sniffed.
 */
async function sendDownload(response: Response, { download }: Download): Promise<void> {
  const { name, type, inline, body } = download;
  if (!Buffer.isBuffer(body)) await firstBytes(body);
  response.set({
    'Content-Type': type,
    'Content-Disposition': `${inline ? 'inline' : 'attachment'}; filename*=UTF-8''${encodeURIComponent(name)}`,
    'Content-Security-Policy': "sandbox; default-src 'none'; style-src 'unsafe-inline'; img-src 'self'",
    'X-Content-Type-Options': 'nosniff',
  });
  if (Buffer.isBuffer(body)) response.send(body);
  else sendStream(response, body);
}

/** A stream that breaks cuts the answer off, so that nobody takes half a file for the whole; the log says why. */
function sendStream(response: Response, body: Readable): void {
  body.on('error', (error) => {
    response.req.log.error({ err: error }, 'a download broke');
    response.destroy();
  });
  response.on('close', () => body.destroy());
  body.pipe(response);
}

/** Waits until a stream has something to give or has ended. What fails before is answered as a refusal, not cut off. */
function firstBytes(body: Readable): Promise<void> {
  return new Promise((resolve, reject) => {
    body.once('readable', resolve).once('end', resolve).once('error', reject);
  });
}
