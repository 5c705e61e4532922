import type { Delivery } from './delivery.js';

export const MODE_NAMES = ['normal', 'hold', 'drop', 'delay', 'duplicate', 'reverse'] as const;

/** How fresh events are sent, for tests of a network that loses, repeats, delays and reorders. */
export interface DeliveryMode {
  name: (typeof MODE_NAMES)[number];
  /** `duplicate`: how often each event is sent. */
  copies: number;
  /** `delay`: the wait. `reverse`: the silence after which the batch goes out, last first. */
  delayMs: number;
  /** Only these event types, all when empty. */
  types: string[];
}

export const NORMAL: DeliveryMode = { name: 'normal', copies: 1, delayMs: 0, types: [] };

/** The mode that rules this event: the one set, unless it is for other types. */
export function modeFor(mode: DeliveryMode, type: string): DeliveryMode {
  return mode.types.length === 0 || mode.types.includes(type) ? mode : NORMAL;
}

export function statusUnder(mode: DeliveryMode): Delivery['status'] {
  if (mode.name === 'hold') return 'held';
  return mode.name === 'drop' ? 'dropped' : 'pending';
}

export function copiesUnder(mode: DeliveryMode): number {
  return mode.name === 'duplicate' ? mode.copies : 1;
}

export function waitUnder(mode: DeliveryMode): number {
  return mode.name === 'delay' || mode.name === 'reverse' ? mode.delayMs : 0;
}
