import { mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import type { State } from './state.js';

const WRITE_DELAY_MS = 50;

/** The state a file keeps, or null when there is no such file yet. A damaged file is an error, not a fresh start. */
export function readSnapshot(file: string): State | null {
  try {
    return JSON.parse(readFileSync(file, 'utf8')) as State;
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOENT') return null;
    throw error;
  }
}

/** Keeps the state in one file. Written beside and renamed, so that a crash leaves the old or the new one whole. */
export class Snapshot {
  private timer: NodeJS.Timeout | null = null;

  constructor(
    private readonly file: string | undefined,
    private readonly state: State,
  ) {}

  /** Writes soon; changes that follow at once share the write. */
  changed(): void {
    if (this.file === undefined || this.timer !== null) return;
    this.timer = setTimeout(() => this.write(), WRITE_DELAY_MS);
  }

  /** Writes what is still waiting. */
  close(): void {
    if (this.timer !== null) this.write();
  }

  private write(): void {
    if (this.timer !== null) clearTimeout(this.timer);
    this.timer = null;
    if (this.file === undefined) return;
    mkdirSync(dirname(this.file), { recursive: true });
    const beside = `${this.file}.${process.pid}.part`;
    writeFileSync(beside, JSON.stringify(this.state));
    renameSync(beside, this.file);
  }
}
