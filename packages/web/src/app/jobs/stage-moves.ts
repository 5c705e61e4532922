import { inject, Injectable } from '@angular/core';
import { JOB_STAGE_NAMES, skippedStages } from '@bookmatch/common/jobs/job-stages';
import type { Job, JobStage } from '@bookmatch/common/jobs/jobs-contract';
import { Store } from '@ngrx/store';
import { Confirm } from '../ui/confirm/confirm';
import { JobsPage } from './state/jobs.actions';

/** Takes a job to a stage, asking first when stages are skipped. */
@Injectable({ providedIn: 'root' })
export class StageMoves {
  private readonly store = inject(Store);
  private readonly confirm = inject(Confirm);

  ask({ id, version, stage: from }: Pick<Job, 'id' | 'version' | 'stage'>, to: JobStage): void {
    const move = { stage: to, confirmSkip: false, reason: '' };
    const skipped = skippedStages(from, to);
    if (skipped.length === 0) {
      this.store.dispatch(JobsPage.moveChosen({ job: { id, version }, move }));
      return;
    }
    const question = {
      title: `Go on to ${JOB_STAGE_NAMES[to]}?`,
      text: `This skips ${skipped.map((stage) => JOB_STAGE_NAMES[stage]).join(', ')}.`,
      action: to === 'closed' ? 'Close job' : `Move to ${JOB_STAGE_NAMES[to]}`,
    };
    this.confirm.ask(question).subscribe((answer) => {
      if (answer)
        this.store.dispatch(
          JobsPage.moveChosen({ job: { id, version }, move: { ...move, confirmSkip: true } }),
        );
    });
  }
}
