import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import type { Job } from '@bookmatch/common/jobs/jobs-contract';
import { injectCan } from '../../platform/session/ability';
import { Panel } from '../../ui/panel/panel';
import { CrewForm } from '../crew-form/crew-form';

/** Who works on the job, and who of the crew sees it. */
@Component({
  selector: 'bm-job-crew',
  imports: [MatButton, Panel],
  template: `
    <bm-panel heading="Crew">
      @if (can('update', 'Job')) {
        <button matButton="outlined" bmPanelAction type="button" (click)="change()">Assign</button>
      }
      @if (job().assignedMembers.length > 0) {
        <ul>
          @for (member of job().assignedMembers; track member.memberId) {
            <li>{{ member.name }}</li>
          }
        </ul>
      } @else {
        <p>Nobody is assigned yet.</p>
      }
      <p class="bm-quiet">
        {{
          job().openToCrew
            ? 'All of the crew see this job.'
            : 'Of the crew, only those assigned see this job.'
        }}
      </p>
    </bm-panel>
  `,
  styles: `
    ul {
      display: grid;
      gap: 4px;
      margin: 0 0 8px;
      padding: 0;
      list-style: none;
      font-weight: 600;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JobCrew {
  readonly job = input.required<Job>();
  private readonly dialog = inject(MatDialog);
  protected readonly can = injectCan();

  protected change(): void {
    this.dialog.open(CrewForm, { data: this.job().id, width: '440px', disableClose: true });
  }
}
