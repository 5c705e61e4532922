import { DestroyRef, inject, Injectable, signal } from '@angular/core';
import { MAX_JOB_FILE_BYTES } from '@bookmatch/common/jobs/job-files-contract';
import { Store } from '@ngrx/store';
import type { Subscription } from 'rxjs';
import { toProblem } from '../../platform/api/api-problem';
import { Notices } from '../../platform/page/notices';
import { JobsApiClient } from '../jobs-api';
import { JobsPage } from '../state/jobs.actions';

/** A file on its way: waiting, part sent, or refused with the sentence why. */
export type QueuedUpload = {
  key: number;
  jobId: string;
  file: File;
  state: 'waiting' | 'sending' | 'failed';
  /** From 0 to 1. */
  sent: number;
  problem: string | null;
};

const AT_ONCE = 2;

/** The files somebody chose, sent a few at a time. One that fails stays, to be sent again or let go. */
@Injectable()
export class UploadQueue {
  private readonly api = inject(JobsApiClient);
  private readonly store = inject(Store);
  private readonly notices = inject(Notices);
  private readonly queue = signal<readonly QueuedUpload[]>([]);
  private readonly underWay = new Map<number, Subscription>();
  private lastKey = 0;
  readonly uploads = this.queue.asReadonly();

  constructor() {
    inject(DestroyRef).onDestroy(() => this.underWay.forEach((sending) => sending.unsubscribe()));
  }

  add(jobId: string, files: readonly File[]): void {
    this.queue.update((queue) => [...queue, ...files.map((file) => this.entry(jobId, file))]);
    this.sendNext();
  }

  retry(key: number): void {
    this.change(key, { state: 'waiting', sent: 0, problem: null });
    this.sendNext();
  }

  /** Stops it when it is being sent. */
  letGo(key: number): void {
    this.underWay.get(key)?.unsubscribe();
    this.finish(key);
  }

  private entry(jobId: string, file: File): QueuedUpload {
    const problem = file.size > MAX_JOB_FILE_BYTES ? 'A file can have at most 25 MB.' : null;
    this.lastKey += 1;
    return { key: this.lastKey, jobId, file, state: problem ? 'failed' : 'waiting', sent: 0, problem };
  }

  private sendNext(): void {
    const free = AT_ONCE - this.underWay.size;
    const waiting = this.queue().filter(({ state }) => state === 'waiting');
    for (const upload of waiting.slice(0, Math.max(0, free))) this.send(upload);
  }

  private send({ key, jobId, file }: QueuedUpload): void {
    this.change(key, { state: 'sending' });
    const sending = this.api.upload(jobId, file).subscribe({
      next: (step) => {
        if ('sent' in step) {
          this.change(key, { sent: step.sent });
          return;
        }
        const { alreadyHere, ...kept } = step.answer;
        if (alreadyHere) this.notices.say(`${file.name} is here already.`);
        this.store.dispatch(JobsPage.fileUploaded({ jobId, file: kept }));
        this.finish(key);
      },
      error: (error: unknown) => {
        this.underWay.delete(key);
        this.change(key, { state: 'failed', problem: toProblem(error).detail });
        this.sendNext();
      },
    });
    if (this.queue().some((upload) => upload.key === key)) this.underWay.set(key, sending);
  }

  private finish(key: number): void {
    this.underWay.delete(key);
    this.queue.update((queue) => queue.filter((upload) => upload.key !== key));
    this.sendNext();
  }

  private change(key: number, changes: Partial<QueuedUpload>): void {
    this.queue.update((queue) =>
      queue.map((upload) => (upload.key === key ? { ...upload, ...changes } : upload)),
    );
  }
}
