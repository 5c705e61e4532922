import { createHash } from 'node:crypto';
import type { EntityManager } from 'typeorm';
import { isDuplicateKey } from '../database/retry.js';
import { insertRows, updateRow } from '../database/statements.js';
import { IdempotencyKey } from './idempotency-key.entity.js';
import { ProblemError } from './problem-error.js';

export type Answered = { status: number; body: unknown };
export type Keyed = { ownerId: string; key: string; requestHash: string; now: Date };

/** What makes two requests the same: method, address and body. */
export function hashRequest(method: string, url: string, body: unknown): string {
  return createHash('sha256')
    .update(`${method} ${url}\n${JSON.stringify(body ?? null)}`)
    .digest('hex');
}

/**
 * Runs `work` once for a key, inside the caller's transaction, and answers the first answer to every repeat.
 * A repeat that arrives while the first is at work waits for it at the primary key.
 *
 * @throws invalid-input when the key was used for another request
 */
export async function answerOnce(
  manager: EntityManager,
  keyed: Keyed,
  work: () => Promise<Answered>,
): Promise<Answered> {
  const { now, ...values } = keyed;
  try {
    await insertRows(manager, IdempotencyKey, [{ ...values, status: 0, answer: '', createdAt: now }]);
  } catch (error) {
    if (isDuplicateKey(error)) return replay(manager, keyed);
    throw error;
  }
  const answered = await work();
  await updateRow(
    manager,
    IdempotencyKey,
    { ownerId: keyed.ownerId, key: keyed.key },
    { status: answered.status, answer: JSON.stringify(answered.body ?? null) },
  );
  return answered;
}

async function replay(manager: EntityManager, keyed: Keyed): Promise<Answered> {
  const earlier = await manager
    .createQueryBuilder(IdempotencyKey, 'row')
    .where('row.ownerId = :ownerId and row.key = :key', { ownerId: keyed.ownerId, key: keyed.key })
    .setLock('pessimistic_read')
    .getOne();
  if (earlier?.requestHash !== keyed.requestHash)
    throw new ProblemError('invalid-input', 'This Idempotency-Key was used for another request.');
  return { status: earlier.status, body: JSON.parse(earlier.answer) as unknown };
}
