import type { AddressInfo } from 'node:net';
import { Faults } from './faults.js';
import { makeInboxApp } from './http-out.js';
import { MailboxFile } from './mailbox-file.js';
import { Mailbox } from './mailbox.js';
import { makeSmtpServer } from './smtp-in.js';

export interface MailFakeOptions {
  /** 0 or left out: any free port. */
  smtpPort?: number;
  httpPort?: number;
  /** Loopback unless said otherwise. */
  host?: string;
  /** A file to keep the messages in between starts; without one they live in memory. */
  stateFile?: string;
}

export interface MailFake {
  smtpPort: number;
  httpPort: number;
  /** Where people and tests look at the messages. */
  inboxUrl: string;
  mailbox: Mailbox;
  faults: Faults;
  stop(): Promise<void>;
}

/** Starts the fake mail service in this process: SMTP in, a web inbox and JSON out. */
export async function startMailFake(options: MailFakeOptions = {}): Promise<MailFake> {
  const { smtpPort = 0, httpPort = 0, host = '127.0.0.1', stateFile } = options;
  const mailbox = openMailbox(stateFile);
  const faults = new Faults();
  const smtp = makeSmtpServer(mailbox, faults);
  smtp.on('error', (fault: Error) => console.error(`mail fake: ${fault.message}`));
  await started(smtp.listen(smtpPort, host));
  const web = makeInboxApp(mailbox, faults).listen(httpPort, host);
  await started(web);
  const { port } = web.address() as AddressInfo;
  return {
    smtpPort: (smtp.server.address() as AddressInfo).port,
    httpPort: port,
    inboxUrl: `http://${host}:${port}`,
    mailbox,
    faults,
    stop: async () => {
      web.closeAllConnections();
      await Promise.all([
        new Promise<void>((resolve) => smtp.close(() => resolve())),
        new Promise<void>((resolve) => web.close(() => resolve())),
      ]);
    },
  };
}

function openMailbox(stateFile: string | undefined): Mailbox {
  if (!stateFile) return new Mailbox();
  const file = new MailboxFile(stateFile);
  return new Mailbox(file.load(), file);
}

interface Listening {
  listening: boolean;
  once(event: string, listener: (fault: Error) => void): unknown;
}

function started(server: Listening): Promise<void> {
  return new Promise((resolve, reject) => {
    if (server.listening) return resolve();
    server.once('listening', () => resolve());
    server.once('error', reject);
  });
}
