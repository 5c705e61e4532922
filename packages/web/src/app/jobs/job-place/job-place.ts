import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { JOB_STAGE_NAMES } from '@bookmatch/common/jobs/job-stages';
import type { Job } from '@bookmatch/common/jobs/jobs-contract';
import { addressLines } from '../../customers/customers-public';
import { injectCan } from '../../platform/session/ability';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { Panel } from '../../ui/panel/panel';

/** Where the work goes, what is noted about it, and how it came this far. */
@Component({
  selector: 'bm-job-place',
  imports: [DateTextPipe, Panel, RouterLink],
  templateUrl: './job-place.html',
  styles: `
    dd {
      white-space: normal;
    }

    .notes {
      white-space: pre-line;
    }

    ol {
      margin: 0;
      padding: 0;
      list-style: none;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JobPlace {
  readonly job = input.required<Job>();
  protected readonly can = injectCan();
  protected readonly stageNames = JOB_STAGE_NAMES;
  protected readonly address = computed(() => {
    const site = this.job().site;
    return site ? addressLines(site.address) : [];
  });
}
