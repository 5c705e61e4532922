import type { EstimateRoom } from '@bookmatch/common/estimates/revision-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { ProblemError } from '../../platform/http/problem-error.js';
import { Operation } from '../shops/shops-public.js';

/** @throws invalid-input naming each line whose operation is none of this shop's */
export async function refuseUnknownOperations(
  scope: ShopScope,
  rooms: readonly EstimateRoom[],
): Promise<void> {
  const named = rooms.flatMap((room, roomIndex) =>
    room.lines.map(({ operationId }, lineIndex) => ({
      operationId,
      path: `rooms.${roomIndex}.lines.${lineIndex}.operationId`,
    })),
  );
  const ids = [...new Set(named.flatMap(({ operationId }) => operationId ?? []))];
  if (ids.length === 0) return;
  const known = new Set((await scope.rows(Operation).findBy({ id: ids })).map(({ id }) => id));
  const message = 'Choose one of the shop’s operations.';
  const fields = named
    .filter(({ operationId }) => operationId !== null && !known.has(operationId))
    .map(({ path }) => ({ path, message }));
  if (fields.length > 0) throw new ProblemError('invalid-input', message, { fields });
}
