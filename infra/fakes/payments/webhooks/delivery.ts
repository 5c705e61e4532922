/** One event on its way to one receiver. */
export interface Delivery {
  /** Rises with each delivery, so that the given order is known. */
  sequence: number;
  eventId: string;
  eventType: string;
  url: string;
  /** `held` waits for a flush, `dropped` is never sent, `failed` has used up its attempts. */
  status: 'pending' | 'held' | 'dropped' | 'delivered' | 'failed';
  /** Real time in milliseconds from which it may be sent. */
  dueAtMs: number;
  attempts: number;
  /** HTTP status of the last attempt, 0 when no answer came, null before the first. */
  lastStatus: number | null;
}

const MAX_ATTEMPTS = 8;
const LONGEST_WAIT_MS = 60_000;

/** Writes down an attempt: any 2xx ends it, anything else waits twice as long as before and tries again. */
export function noteAttempt(delivery: Delivery, status: number, retryBaseMs: number, nowMs: number): void {
  delivery.attempts += 1;
  delivery.lastStatus = status;
  if (status >= 200 && status < 300) delivery.status = 'delivered';
  else if (delivery.attempts >= MAX_ATTEMPTS) delivery.status = 'failed';
  else {
    delivery.status = 'pending';
    delivery.dueAtMs = nowMs + Math.min(LONGEST_WAIT_MS, retryBaseMs * 2 ** (delivery.attempts - 1));
  }
}
