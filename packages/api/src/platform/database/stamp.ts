import type { Role } from '@bookmatch/common/access/roles';

/** Who is acting. A customer acts through a signed link, the system by itself (webhooks, schedules). */
export type Author =
  | { kind: 'member'; personId: string; memberId: string; role: Role }
  | { kind: 'person'; personId: string }
  | { kind: 'customer'; linkId: string }
  | { kind: 'system' };

/** What every change is stamped with. */
export type Stamp = { author: Author; requestId: string; now: Date };

/** For work nobody asked for just now: outbox messages and webhooks. `cause` is the message or event that set it off. */
export const systemStamp = (cause: string, now: Date): Stamp => ({
  author: { kind: 'system' },
  requestId: cause,
  now,
});
