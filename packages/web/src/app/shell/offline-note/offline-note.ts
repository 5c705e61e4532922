import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatIcon } from '@angular/material/icon';
import { Connection } from '../../platform/page/connection';

/** Says when there is no network, and that nothing is lost by it. */
@Component({
  selector: 'bm-offline-note',
  imports: [MatIcon],
  template: `
    <div role="status">
      @if (!online()) {
        <p>
          <mat-icon svgIcon="offline" />No network. What you see may be out of date, and changes have to wait.
        </p>
      }
    </div>
  `,
  styleUrl: './offline-note.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OfflineNote {
  protected readonly online = inject(Connection).online;
}
