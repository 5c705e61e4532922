import type { EntityManager, EntityMetadata } from 'typeorm';
import { AuditEntry } from './audit-entry.entity.js';
import { v7 } from './ids.js';
import type { Stamp } from './stamp.js';
import { insertRows } from './statements.js';

type Plain = Record<string, unknown>;

/** Properties that never go into the audit trail: secrets and what only repeats the row's bookkeeping. */
const HIDDEN = new Set(['passwordHash', 'tokenHash', 'version', 'updatedAt']);

export type Change = {
  action: 'insert' | 'update' | 'delete';
  rowId: string;
  before?: object;
  after?: object;
};

/** Writes the audit rows of changes to one table, in their transaction and as one statement. */
export async function recordChanges(
  manager: EntityManager,
  { tableName }: EntityMetadata,
  shopId: string | null,
  stamp: Stamp,
  changes: readonly Change[],
): Promise<void> {
  const entries = changes.map((change) => entryOf(tableName, shopId, stamp, change));
  await insertRows(manager, AuditEntry, entries);
}

function entryOf(
  tableName: string,
  shopId: string | null,
  { author, requestId, now }: Stamp,
  { rowId, action, before, after }: Change,
): Omit<AuditEntry, never> {
  return {
    id: v7(now),
    createdAt: now,
    shopId,
    personId: author.kind === 'member' || author.kind === 'person' ? author.personId : null,
    actor: author.kind,
    requestId,
    tableName,
    rowId,
    action,
    before: before ? visible(before) : null,
    after: after ? visible(after) : null,
  };
}

function visible(values: object): Plain {
  return Object.fromEntries(Object.entries(values as Plain).filter(([key]) => !HIDDEN.has(key)));
}

/** The part of `patch` that differs from `row`, and what stood there: both empty when nothing changes. */
export function difference(row: Plain, patch: Plain): { before: Plain; after: Plain } {
  const changed = Object.keys(patch).filter((key) => text(row[key]) !== text(patch[key]));
  return {
    before: Object.fromEntries(changed.map((key) => [key, row[key]])),
    after: Object.fromEntries(changed.map((key) => [key, patch[key]])),
  };
}
const text = (value: unknown) => JSON.stringify(value ?? null);
