import { pino, type Logger } from 'pino';

/** JSON lines. What could carry a secret is masked at the root, so that no call site has to remember. */
export function createLogger(level: string): Logger {
  return pino({
    level,
    base: null,
    timestamp: pino.stdTimeFunctions.isoTime,
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
  });
}
export type { Logger };
