import type { KeptMessage } from './message.js';

/** How many messages are kept before the oldest goes. */
export const mailboxLimit = 500;

/** What to look for; a missing field does not narrow. */
export interface MailboxFilter {
  /** A whole address, compared without case. */
  to?: string;
  /** A part of the subject, compared without case. */
  subject?: string;
  /** A UTC ISO instant: messages received then or later. */
  since?: string;
}

/** What happens to the mailbox, for whoever keeps it on disk. */
export interface MailboxListener {
  added(message: KeptMessage): void;
  repeated(id: string): void;
  cleared(): void;
}

/** The messages received, oldest first. A message delivered again is counted, not kept twice. */
export class Mailbox {
  private messages: KeptMessage[];

  constructor(
    kept: KeptMessage[] = [],
    private readonly listener?: MailboxListener,
  ) {
    this.messages = kept.slice(-mailboxLimit);
  }

  /** Keeps the message, or counts one more delivery when its Message-ID is known. */
  add(message: KeptMessage): 'kept' | 'repeated' {
    const known = this.messages.find((other) => other.messageId === message.messageId);
    if (known) {
      known.deliveries += 1;
      this.listener?.repeated(known.id);
      return 'repeated';
    }
    this.messages = [...this.messages, message].slice(-mailboxLimit);
    this.listener?.added(message);
    return 'kept';
  }

  /** The matching messages, newest first. */
  list(filter: MailboxFilter = {}): KeptMessage[] {
    return this.messages.filter((message) => matches(message, filter)).reverse();
  }

  find(id: string): KeptMessage | undefined {
    return this.messages.find((message) => message.id === id);
  }

  clear(): void {
    this.messages = [];
    this.listener?.cleared();
  }
}

function matches(message: KeptMessage, { to, subject, since }: MailboxFilter): boolean {
  if (to && !message.to.includes(to.toLowerCase())) return false;
  if (subject && !message.subject.toLowerCase().includes(subject.toLowerCase())) return false;
  return !since || message.receivedAt >= since;
}
