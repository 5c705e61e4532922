import type { DataSource, EntityManager, ObjectLiteral, SelectQueryBuilder } from 'typeorm';
import type { ColumnMetadata } from 'typeorm/metadata/ColumnMetadata.js';
import type { ShopRow } from './rows.js';

/** A column that is read back by its own kind; what is computed in SQL is not among them. */
export type Picked = { output: string; column: ColumnMetadata | null };
/** One thing a query asks. The key says it in full, so that equal keys mean equal SQL. */
export type Step = {
  key: string;
  apply(builder: SelectQueryBuilder<ObjectLiteral>, picked: Picked[]): unknown;
};
export type Compiled = { sql: string; columns: (Picked & { column: ColumnMetadata })[] };

/** Shapes come from code, so there are some hundreds at most; the bound only guards against a mistake. */
const MOST_SHAPES = 2_000;
const cache = new WeakMap<DataSource, Map<string, Compiled>>();

/**
 * The SQL of a query with its parameters still named. Writing it through the query builder costs several times what
 * running it does, so each shape is written once a process.
 */
export function compiled(
  manager: EntityManager,
  entity: new () => ShopRow,
  alias: string,
  steps: readonly Step[],
): Compiled {
  const shapes = shapesOf(manager.connection);
  const key = `${entity.name} ${alias}\n${steps.map((step) => step.key).join('\n')}`;
  const known = shapes.get(key);
  if (known) return known;
  const made = compile(manager, entity, alias, steps);
  if (shapes.size >= MOST_SHAPES) shapes.clear();
  shapes.set(key, made);
  return made;
}

function compile(
  manager: EntityManager,
  entity: new () => ShopRow,
  alias: string,
  steps: readonly Step[],
): Compiled {
  const builder = manager
    .createQueryBuilder(entity as new () => ObjectLiteral, alias)
    .where(`${alias}.shopId = :shopId`)
    .select([]);
  const picked: Picked[] = [];
  for (const step of steps) step.apply(builder, picked);
  return {
    sql: builder.getQuery(),
    columns: picked.filter((pick): pick is Compiled['columns'][number] => pick.column !== null),
  };
}

function shapesOf(dataSource: DataSource): Map<string, Compiled> {
  const known = cache.get(dataSource);
  if (known) return known;
  const made = new Map<string, Compiled>();
  cache.set(dataSource, made);
  return made;
}
