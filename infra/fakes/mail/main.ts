/**
 * Runs the fake mail service on its own. Environment: MAIL_FAKE_SMTP_PORT, MAIL_FAKE_HTTP_PORT, and, to keep messages
 * between starts, MAIL_FAKE_STATE_FILE.
 */
import { startMailFake } from './mail-fake.js';

const fake = await startMailFake({
  smtpPort: portOf('MAIL_FAKE_SMTP_PORT'),
  httpPort: portOf('MAIL_FAKE_HTTP_PORT'),
  stateFile: process.env.MAIL_FAKE_STATE_FILE,
});
console.log(`Mail fake: SMTP on port ${fake.smtpPort}, inbox at ${fake.inboxUrl}`);
for (const signal of ['SIGINT', 'SIGTERM'] as const) {
  process.once(signal, () => void fake.stop().then(() => process.exit(0)));
}

function portOf(name: string): number {
  const port = Number(process.env[name] ?? 0);
  if (Number.isInteger(port) && port >= 0 && port < 65_536) return port;
  throw new Error(`${name} must be a port number, not ${process.env[name]}`);
}
