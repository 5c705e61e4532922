import { spawn, type ChildProcess } from 'node:child_process';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';

const FOLDER = join(__dirname, '../..');

/** The API as a process of its own, to be killed. Runs the sources, so that nothing has to be built but the rules. */
export class ApiProcess {
  private child: ChildProcess | undefined;

  constructor(
    private readonly env: Record<string, string>,
    private readonly origin: string,
  ) {}

  async start(): Promise<void> {
    const child = spawn(process.execPath, ['--import', 'tsx', 'src/main.ts'], {
      cwd: FOLDER,
      env: { ...process.env, ...this.env },
      stdio: ['ignore', 'ignore', 'inherit'],
    });
    this.child = child;
    for (let tries = 0; tries < 300; tries += 1) {
      if (child.exitCode !== null) throw new Error('The API process ended by itself.');
      const isReady = await fetch(`${this.origin}/api/ready`).then(
        (answer) => answer.ok,
        () => false,
      );
      if (isReady) return;
      await pause(100);
    }
    throw new Error('The API process did not get ready.');
  }

  /** Ends it without any warning, as a lost machine would. */
  kill(): Promise<void> {
    return this.end('SIGKILL');
  }

  /** Ends it as a deployment would; answers when it has finished what it had in hand. */
  stop(): Promise<void> {
    return this.end('SIGTERM');
  }

  private async end(signal: NodeJS.Signals): Promise<void> {
    const { child } = this;
    if (!child || child.exitCode !== null || child.signalCode !== null) return;
    const ended = new Promise((resolve) => child.once('exit', resolve));
    child.kill(signal);
    await ended;
  }
}
