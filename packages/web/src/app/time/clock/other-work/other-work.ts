import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { SearchField } from '../../../ui/search-field/search-field';
import type { PunchedWork } from '../../punches/punch';
import { leftOf } from '../choice-words';
import { ClockFace } from '../clock-face';
import { findJobs, operationsFor, type OfferedOperation } from './offered-work';

/** Begins at a job, when one is named. */
export type OtherWorkQuestion = { jobId: string | null };

/** Finds work that is not among the choices: first the job, or none, then the operation. */
@Component({
  selector: 'bm-other-work',
  imports: [MatButton, MatDialogActions, MatDialogContent, MatDialogTitle, SearchField],
  templateUrl: './other-work.html',
  styleUrl: './other-work.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OtherWork {
  private readonly jobs = inject(ClockFace).jobs;
  private readonly dialog = inject<MatDialogRef<OtherWork, PunchedWork>>(MatDialogRef);
  private readonly asked = inject<OtherWorkQuestion>(MAT_DIALOG_DATA);

  protected readonly leftOf = leftOf;
  protected readonly search = signal('');
  /** A job's id, `none` for work that belongs to no job, or null while none is chosen. */
  protected readonly chosen = signal<string | null>(this.asked.jobId);
  protected readonly found = computed(() => findJobs(this.jobs(), this.search()));
  protected readonly hasOffJob = computed(() => this.jobs()?.operations.some(({ onJob }) => !onJob) ?? false);
  protected readonly job = computed(
    () => this.jobs()?.jobs.find(({ jobId }) => jobId === this.chosen()) ?? null,
  );
  protected readonly operations = computed(() => operationsFor(this.jobs(), this.job()));
  protected readonly choosesOperation = computed(() => this.job() !== null || this.chosen() === 'none');

  protected readonly heading = computed(() => {
    const job = this.job();
    if (job) return `${job.jobNumber} · ${job.jobTitle}`;
    return this.choosesOperation() ? 'Not on a job' : 'Which job?';
  });

  protected pick({ operationId, operationName }: OfferedOperation): void {
    const job = this.job();
    this.dialog.close({
      ...{ kind: 'work', operationId, operationName },
      ...{ jobId: job?.jobId ?? null, jobNumber: job?.jobNumber ?? null, jobTitle: job?.jobTitle ?? null },
    });
  }

  protected back(): void {
    if (this.choosesOperation()) this.chosen.set(null);
    else this.dialog.close();
  }
}
