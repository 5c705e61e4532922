import { OutboxMessage } from '@bookmatch/api/platform/outbox/outbox-message.entity';
import type { Platform } from '@bookmatch/api/platform/platform';
import { v7 } from '@bookmatch/api/platform/database/ids';
import { insertRows } from '@bookmatch/api/platform/database/statements';

/** An outbox message that is done already: the last thing the demo writes, and how the next start knows it is whole. */
const DEMO_MADE = 'demo-made';

export async function isMade({ dataSource }: Platform): Promise<boolean> {
  return dataSource.manager
    .createQueryBuilder(OutboxMessage, 'message')
    .where('message.kind = :kind and message.finishedAt is not null', { kind: DEMO_MADE })
    .getExists();
}

export async function markAsMade({ dataSource }: Platform, at: Date): Promise<void> {
  const message: Omit<OutboxMessage, never> = {
    ...{ id: v7(at), createdAt: at, shopId: null, kind: DEMO_MADE, payload: {} },
    ...{ attempts: 0, dueAt: at, finishedAt: at, givenUpAt: null, lastError: null },
  };
  await insertRows(dataSource.manager, OutboxMessage, [message]);
}
