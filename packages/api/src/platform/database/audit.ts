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

/** Writes the audit row of one change, in the transaction of the change. */
export async function recordChange(
  manager: EntityManager,
  metadata: EntityMetadata,
  shopId: string | null,
  stamp: Stamp,
  change: Change,
): Promise<void> {
  const { author } = stamp;
  const entry: Omit<AuditEntry, never> = {
    id: v7(stamp.now),
    createdAt: stamp.now,
    shopId,
    personId: author.kind === 'member' || author.kind === 'person' ? author.personId : null,
    actor: author.kind,
    requestId: stamp.requestId,
    tableName: metadata.tableName,
    rowId: change.rowId,
    action: change.action,
    before: change.before ? visible(change.before) : null,
    after: change.after ? visible(change.after) : null,
  };
  await insertRows(manager, AuditEntry, [entry]);
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
