import { pino, type DestinationStream, type Logger } from 'pino';
import { safeError } from './safe-error.js';

/** JSON lines. What could carry a secret is masked at the root, so that no call site has to remember. */
export function createLogger(level: string, destination: DestinationStream = pino.destination()): Logger {
  return pino(
    {
      level,
      base: null,
      timestamp: pino.stdTimeFunctions.isoTime,
      serializers: { err: safeError },
      redact: {
        paths: [
          'req.headers.cookie',
          'req.headers.authorization',
          'req.headers["x-csrf-token"]',
          'res.headers["set-cookie"]',
          '*.password',
          '*.token',
        ],
        censor: '[masked]',
      },
    },
    destination,
  );
}
export type { Logger };
