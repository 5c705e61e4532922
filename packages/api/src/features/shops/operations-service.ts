import { DEFAULT_OPERATIONS } from '@bookmatch/common/shops/default-operations';
import type {
  CreateOperation,
  Operation as OperationView,
  UpdateOperation,
} from '@bookmatch/common/shops/operations-contract';
import { isDuplicateKey } from '../../platform/database/retry.js';
import type { ShopScope } from '../../platform/database/scope.js';
import { conflict, invalid } from '../../platform/http/problem-error.js';
import { Operation } from './operation.entity.js';

const MAX_OPERATIONS = 100;

/** The kinds of work a shop plans and clocks. */
export class OperationsService {
  async list(scope: ShopScope): Promise<OperationView[]> {
    const rows = await scope.rows(Operation).findBy({}, 'position');
    return rows.map((row) => view(scope, row));
  }

  /** Adds it at the end. */
  async create(scope: ShopScope, input: CreateOperation): Promise<OperationView> {
    const rows = await scope.rows(Operation).findBy({}, 'position', true);
    if (rows.length >= MAX_OPERATIONS)
      throw conflict(`A shop can have at most ${MAX_OPERATIONS} operations.`);
    const position = Math.max(0, ...rows.map((row) => row.position)) + 1;
    const values = { ...input, id: scope.newId(), position, archivedAt: null };
    return view(scope, await named(scope.rows(Operation).insert(values)));
  }

  /** Time already clocked keeps the category and cost it was clocked at only where it was closed with them. */
  async update(
    scope: ShopScope,
    id: string,
    input: UpdateOperation,
    version: number,
  ): Promise<OperationView> {
    const { archived, ...fields } = input;
    const operations = scope.rows(Operation);
    const row = await operations.getForUpdate(id);
    const archivedAt =
      archived === undefined ? row.archivedAt : archived ? (row.archivedAt ?? scope.now) : null;
    return view(scope, await named(operations.update(row, { ...fields, archivedAt }, version)));
  }

  /** @throws invalid-input unless every operation of the shop is named, and none else */
  async reorder(scope: ShopScope, ids: readonly string[]): Promise<OperationView[]> {
    const operations = scope.rows(Operation);
    const rows = new Map((await operations.findBy({}, 'position', true)).map((row) => [row.id, row]));
    if (rows.size !== ids.length || !ids.every((id) => rows.has(id)))
      throw invalid('operationIds', 'The operations were changed meanwhile. Load them again and repeat.');
    const ordered: Operation[] = [];
    for (const [index, id] of ids.entries())
      ordered.push(await operations.update(rows.get(id)!, { position: index + 1 }));
    return ordered.map((row) => view(scope, row));
  }
}

/** What a new shop starts with. Called once, at sign-up. */
export async function createDefaultOperations(scope: ShopScope): Promise<void> {
  await scope.rows(Operation).insertMany(
    DEFAULT_OPERATIONS.map((operation, index) => ({
      ...operation,
      id: scope.newId(),
      position: index + 1,
      archivedAt: null,
    })),
  );
}

async function named(work: Promise<Operation>): Promise<Operation> {
  try {
    return await work;
  } catch (error) {
    throw isDuplicateKey(error) ? invalid('name', 'There is an operation of this name already.') : error;
  }
}

function view(scope: ShopScope, row: Operation): OperationView {
  const { id, version, name, position, costCategory, onJob, archivedAt, defaultRateCentsPerHour } = row;
  const money = scope.can('read', 'Operation', 'money') ? { defaultRateCentsPerHour } : {};
  return { id, version, name, position, costCategory, onJob, archived: archivedAt !== null, ...money };
}
