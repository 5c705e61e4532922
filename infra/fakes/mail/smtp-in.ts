import { setTimeout as pause } from 'node:timers/promises';
import { SMTPServer, type SMTPServerDataStream, type SMTPServerSession } from 'smtp-server';
import type { Faults } from './faults.js';
import type { Mailbox } from './mailbox.js';
import { readMessage } from './read-message.js';

const sizeLimitBytes = 25 * 1024 * 1024;

/** The side that takes messages in. Anyone may send, with any password or none; nothing is sent on. */
export function makeSmtpServer(mailbox: Mailbox, faults: Faults): SMTPServer {
  return new SMTPServer({
    name: 'mail.fake.test',
    banner: 'Bookmatch test mail, nothing leaves this machine',
    size: sizeLimitBytes,
    rejectOversized: true,
    disableReverseLookup: true,
    // A certificate of our own would be refused by the sender, so encryption is not offered.
    disabledCommands: ['STARTTLS'],
    authOptional: true,
    allowInsecureAuth: true,
    onAuth: (auth, _session, answer) => answer(null, { user: auth.username ?? 'anyone' }),
    onData: (stream, session, answer) => {
      receive(stream, session, mailbox, faults).then(
        (text) => answer(null, text),
        (fault: unknown) => answer(asSmtpError(fault)),
      );
    },
  });
}

async function receive(
  stream: SMTPServerDataStream,
  session: SMTPServerSession,
  mailbox: Mailbox,
  faults: Faults,
): Promise<string> {
  const message = await readMessage(
    stream,
    session.envelope.rcptTo.map(({ address }) => address),
  );
  const { delayMs, rejection } = faults.next();
  if (delayMs > 0) await pause(delayMs);
  const keep = !stream.sizeExceeded && (!rejection || rejection.kept);
  const outcome = keep ? mailbox.add(message) : 'refused';
  if (rejection) throw new SmtpRefusal(rejection.code, 'Refused, as this test ordered');
  return `OK: ${outcome} as ${message.id}`;
}

class SmtpRefusal extends Error {
  constructor(
    readonly responseCode: number,
    text: string,
  ) {
    super(text);
  }
}

function asSmtpError(fault: unknown): Error {
  return fault instanceof Error ? fault : new SmtpRefusal(451, String(fault));
}
