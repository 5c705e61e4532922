import Stripe from 'stripe';
import type { NextFunction, Request, RequestHandler, Response } from 'express';
import { newId } from '../ids.js';
import type { Provider } from '../provider.js';
import type { Call, Work } from './call.js';
import { ApiError } from './error.js';
import type { Fault } from './faults.js';
import { decodeForm } from './form.js';
import { claimKey, fingerprintOf, keepAnswer, releaseKey, type KeyedRequest } from './idempotency.js';
import { checkKey } from './key.js';
import { accountFrom } from './scope.js';

/** One request on its way through: what every step needs to know of it. */
interface Passage {
  provider: Provider;
  request: Request;
  response: Response;
  account: string | null;
  requestId: string;
  keyed: KeyedRequest | null;
  fault: Fault | null;
}

/**
 * Key, account, set faults, parameters, idempotency key, work: in this order, so that a request refused for its
 * parameters leaves its idempotency key free, as at the provider.
 */
export function answerCall(provider: Provider, call: Call): RequestHandler {
  return async (request, response) => {
    const requestId = newId('req_', 14);
    openAnswer(request, response, requestId);
    checkKey(request.get('authorization'), provider.config.key);
    checkVersion(request.get('stripe-version'));
    const account = accountFrom(provider.state, request.get('stripe-account'));
    const fault = provider.faults.take(request.method, request.path);
    if (fault !== null && failBefore(fault, response)) return;
    const form = formOf(request);
    const work = call.prepare(decodeForm(form));
    const keyed = keyedRequest(request, account, form);
    await pass({ provider, request, response, account, requestId, keyed, fault }, work);
  };
}

function openAnswer(request: Request, response: Response, requestId: string): void {
  response.set('request-id', requestId);
  response.set('stripe-version', Stripe.API_VERSION);
  const key = request.get('idempotency-key');
  const account = request.get('stripe-account');
  if (key !== undefined) response.set('idempotency-key', key);
  if (account !== undefined) response.set('stripe-account', account);
}

/** This provider speaks the one version that the installed SDK is written for. */
function checkVersion(version: string | undefined): void {
  if (version === undefined || version === Stripe.API_VERSION) return;
  throw new ApiError(400, {
    type: 'invalid_request_error',
    message: `Invalid Stripe API version: ${version}`,
  });
}

function formOf(request: Request): string {
  if (request.method === 'POST') return typeof request.body === 'string' ? request.body : '';
  const mark = request.originalUrl.indexOf('?');
  return mark === -1 ? '' : request.originalUrl.slice(mark + 1);
}

/** Only POST keeps idempotency keys; the other methods are idempotent by themselves. */
function keyedRequest(request: Request, account: string | null, form: string): KeyedRequest | null {
  const key = request.get('idempotency-key');
  if (key === undefined || request.method !== 'POST') return null;
  if (key.length > 255) {
    throw new ApiError(400, {
      type: 'invalid_request_error',
      message: 'Idempotency key longer than 255 characters',
    });
  }
  const sorted = [...new URLSearchParams(form)].sort(([a], [b]) => (a < b ? -1 : 1));
  const fingerprint = fingerprintOf(request.method, request.path, JSON.stringify(sorted));
  return { scope: account ?? 'platform', key, fingerprint };
}

async function pass(passage: Passage, work: Work): Promise<void> {
  const { provider, keyed, response, fault } = passage;
  const before = keyed === null ? null : claimKey(provider.state, keyed, provider.now());
  if (before !== null) {
    response.set('idempotent-replayed', 'true').set('original-request', before.requestId);
    return sendBody(response, before.status, before.body);
  }
  if (fault?.kind === 'slow') await new Promise((resolve) => setTimeout(resolve, fault.delayMs));
  const { status, body } = perform(passage, work);
  if (keyed !== null) keepAnswer(provider.state, keyed, { status, body, requestId: passage.requestId });
  provider.changed();
  if (fault !== null && failAfter(fault, response)) return;
  sendBody(response, status, body);
}

/** Does the work. A refusal is an answer to keep; a crash is not. */
function perform(passage: Passage, work: Work): { status: number; body: string } {
  const { provider, account, requestId, keyed } = passage;
  const desk = provider.desk(account, { requestId, idempotencyKey: keyed?.key ?? null });
  const { id } = passage.request.params;
  try {
    return { status: 200, body: JSON.stringify(work(desk, typeof id === 'string' ? id : ''), null, 2) };
  } catch (error) {
    if (error instanceof ApiError)
      return { status: error.status, body: JSON.stringify({ error: error.body }) };
    if (keyed !== null) releaseKey(provider.state, keyed);
    throw error;
  }
}

function failBefore(fault: Fault, response: Response): boolean {
  return fault.kind.endsWith('-before') && fail(fault, response);
}

function failAfter(fault: Fault, response: Response): boolean {
  return fault.kind.endsWith('-after') && fail(fault, response);
}

function fail(fault: Fault, response: Response): true {
  if (fault.kind.startsWith('reset')) response.socket?.resetAndDestroy();
  else if (fault.kind.startsWith('error')) sendBody(response, 500, JSON.stringify({ error: OUT_OF_ORDER }));
  return true;
}

const OUT_OF_ORDER = { type: 'api_error', message: 'Something went wrong on our end.' };

function sendBody(response: Response, status: number, body: string): void {
  response.status(status).type('application/json').send(body);
}

export function unknownAddress(request: Request): never {
  const address = `${request.method}: ${request.originalUrl.split('?')[0] ?? ''}`;
  const message = `Unrecognized request URL (${address}).`;
  throw new ApiError(404, { type: 'invalid_request_error', message });
}

/** Every error as the provider's JSON. Express calls this with four arguments only. */
export function sendError(error: unknown, _request: Request, response: Response, next: NextFunction): void {
  if (response.headersSent) return next(error);
  if (error instanceof ApiError)
    return sendBody(response, error.status, JSON.stringify({ error: error.body }));
  const status = statusOf(error);
  if (status >= 500) console.error(error);
  const body =
    status >= 500 ? OUT_OF_ORDER : { type: 'invalid_request_error', message: 'Invalid request body' };
  sendBody(response, status, JSON.stringify({ error: body }));
}

/** Body readers throw errors that carry their own 4xx. */
function statusOf(error: unknown): number {
  const status = typeof error === 'object' && error !== null && 'status' in error ? error.status : 500;
  return typeof status === 'number' && status >= 400 && status < 500 ? status : 500;
}
