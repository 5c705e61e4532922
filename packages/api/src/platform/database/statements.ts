import type { EntityManager, ObjectLiteral } from 'typeorm';

type Plain = Record<string, unknown>;
type EntityClass = new () => ObjectLiteral;

/** The three writes, as single statements through the entity's column kinds. TypeORM's `save()` is never used. */

export async function insertRows(
  manager: EntityManager,
  entity: EntityClass,
  rows: readonly object[],
): Promise<void> {
  await manager
    .createQueryBuilder()
    .insert()
    .into(entity)
    .values(rows as ObjectLiteral[])
    .updateEntity(false)
    .execute();
}

/** Answers how many rows were changed. */
export async function updateRow(
  manager: EntityManager,
  entity: EntityClass,
  keys: Plain,
  set: Plain,
): Promise<number> {
  const done = await manager
    .createQueryBuilder()
    .update(entity)
    .set(set)
    .where(keys)
    .updateEntity(false)
    .execute();
  return done.affected ?? 0;
}

export async function deleteRow(manager: EntityManager, entity: EntityClass, keys: Plain): Promise<void> {
  await manager.createQueryBuilder().delete().from(entity).where(keys).execute();
}
