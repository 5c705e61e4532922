import { createHash } from 'node:crypto';
import type { KeyRecord, State } from '../state/state.js';
import { ApiError } from './error.js';

const KEPT_SECONDS = 24 * 60 * 60;

export interface KeyedRequest {
  scope: string;
  key: string;
  /** Method, address and parameters: what must be the same for a replay. */
  fingerprint: string;
}

export function fingerprintOf(method: string, path: string, body: string): string {
  return createHash('sha256').update(`${method}\n${path}\n${body}`).digest('hex');
}

function nameOf(request: KeyedRequest): string {
  return `${request.scope}/${request.key}`;
}

/**
 * The answer to give again, or null when this request is the first of its key (which it then holds).
 * Errors: 400 `idempotency_error` for the same key with another request, 409 while the first still runs.
 */
export function claimKey(state: State, request: KeyedRequest, now: number): KeyRecord['answer'] {
  forgetOldKeys(state, now);
  const held = Object.hasOwn(state.keys, nameOf(request)) ? state.keys[nameOf(request)] : undefined;
  if (held === undefined) {
    state.keys[nameOf(request)] = { fingerprint: request.fingerprint, createdAt: now, answer: null };
    return null;
  }
  if (held.fingerprint !== request.fingerprint) throw otherRequest(request.key);
  if (held.answer === null) throw stillRunning(request.key);
  return held.answer;
}

export function keepAnswer(
  state: State,
  request: KeyedRequest,
  answer: NonNullable<KeyRecord['answer']>,
): void {
  const held = state.keys[nameOf(request)];
  if (held !== undefined) held.answer = answer;
}

/** A request that crashed or was cut before doing anything leaves its key free. */
export function releaseKey(state: State, request: KeyedRequest): void {
  delete state.keys[nameOf(request)];
}

function forgetOldKeys(state: State, now: number): void {
  for (const [name, record] of Object.entries(state.keys)) {
    if (record.createdAt < now - KEPT_SECONDS) delete state.keys[name];
  }
}

function otherRequest(key: string): ApiError {
  return new ApiError(400, {
    type: 'idempotency_error',
    message: `Idempotency key ${key} was first used with another address or other parameters.`,
  });
}

function stillRunning(key: string): ApiError {
  return new ApiError(409, {
    type: 'invalid_request_error',
    code: 'idempotency_key_in_use',
    message: `Another request with idempotency key ${key} is still running.`,
  });
}
