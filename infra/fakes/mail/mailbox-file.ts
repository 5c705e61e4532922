import { appendFileSync, existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { type MailboxListener, mailboxLimit } from './mailbox.js';
import type { KeptMessage } from './message.js';

type Line = { added: KeptMessage } | { repeated: string };

/**
 * Keeps a mailbox in a file of JSON lines, one an event. Each event is written before the sender gets its answer, so a
 * killed fake has lost nothing it acknowledged; a line cut short by the kill is left out when reading.
 */
export class MailboxFile implements MailboxListener {
  private lines = 0;

  constructor(private readonly path: string) {
    mkdirSync(dirname(path), { recursive: true });
  }

  /** Reads the kept messages, oldest first, and writes the file anew without what has fallen out. */
  load(): KeptMessage[] {
    const messages = replay(existsSync(this.path) ? readFileSync(this.path, 'utf8') : '').slice(
      -mailboxLimit,
    );
    this.rewrite(messages);
    return messages;
  }

  added(message: KeptMessage): void {
    this.append({ added: message });
  }

  repeated(id: string): void {
    this.append({ repeated: id });
  }

  cleared(): void {
    this.rewrite([]);
  }

  private append(line: Line): void {
    appendFileSync(this.path, `${JSON.stringify(line)}\n`, { mode: 0o600 });
    this.lines += 1;
    if (this.lines > 2 * mailboxLimit) this.load();
  }

  private rewrite(messages: KeptMessage[]): void {
    const draft = `${this.path}.new`;
    writeFileSync(draft, messages.map((added) => `${JSON.stringify({ added })}\n`).join(''), { mode: 0o600 });
    renameSync(draft, this.path);
    this.lines = messages.length;
  }
}

function replay(text: string): KeptMessage[] {
  const byId = new Map<string, KeptMessage>();
  for (const line of text.split('\n').map(parseLine)) {
    if (line && 'added' in line) byId.set(line.added.id, line.added);
    const repeated = line && 'repeated' in line ? byId.get(line.repeated) : undefined;
    if (repeated) repeated.deliveries += 1;
  }
  return [...byId.values()];
}

function parseLine(text: string): Line | undefined {
  try {
    return JSON.parse(text) as Line;
  } catch {
    return undefined;
  }
}
