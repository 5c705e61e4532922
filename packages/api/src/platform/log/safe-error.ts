import { pino } from 'pino';

/** What tells one failure from another. */
const KEPT = ['type', 'message', 'stack', 'code', 'errno', 'statusCode', 'responseCode', 'requestId'];

/**
 * An error as the log keeps it. A statement that failed comes with all it was about to write, letters with the secrets of
 * links among it, and a call that failed with what was sent: none of that is kept.
 */
export function safeError(error: unknown): unknown {
  const written: unknown = error instanceof Error ? pino.stdSerializers.err(error) : error;
  if (typeof written !== 'object' || written === null) return written;
  return Object.fromEntries(Object.entries(written).filter(([key]) => KEPT.includes(key)));
}
