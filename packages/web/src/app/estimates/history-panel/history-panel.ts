import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { Estimate } from '@bookmatch/common/estimates/estimates-contract';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { Panel } from '../../ui/panel/panel';
import { REVISION_STATUS_NAMES } from '../estimate-names';

/** The revisions of an estimate, the newest first, and who accepted which. */
@Component({
  selector: 'bm-history-panel',
  imports: [DateTextPipe, MoneyPipe, Panel, RouterLink],
  template: `
    <bm-panel heading="Revisions">
      <ul>
        @for (revision of estimate().revisions.toReversed(); track revision.id) {
          <li>
            <span>
              <a [routerLink]="['/estimates', estimate().id, 'revisions', revision.id]"
                >Revision {{ revision.number }}</a
              >
              <span class="bm-quiet">
                {{ names[revision.status] }}
                @if (revision.sentAt) {
                  {{ revision.sentAt | dateText }}
                }
              </span>
            </span>
            <span>{{ revision.totalCents | money }}</span>
          </li>
        }
      </ul>
      @if (estimate().acceptance; as acceptance) {
        <dl class="bm-facts">
          <dt>Accepted by</dt>
          <dd>{{ acceptance.name }}</dd>
          <dt>On</dt>
          <dd>{{ acceptance.acceptedAt | dateText: 'day-and-time' }}</dd>
          <dt>From</dt>
          <dd>{{ acceptance.address }}</dd>
          <dt>Fingerprint</dt>
          <dd class="hash">{{ acceptance.documentHash }}</dd>
        </dl>
      }
      @if (estimate().declineReason; as reason) {
        <dl class="bm-facts">
          <dt>Declined</dt>
          <dd>{{ reason }}</dd>
        </dl>
      }
    </bm-panel>
  `,
  styles: `
    ul {
      margin: 0;
      padding: 0;
      list-style: none;
    }
    li {
      display: flex;
      gap: 8px;
      align-items: baseline;
      justify-content: space-between;
      padding: 8px 0;
      border-top: 1px solid var(--mat-sys-outline-variant);
    }
    dl {
      margin-top: 12px;
    }
    .hash {
      font-size: 0.75rem;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HistoryPanel {
  readonly estimate = input.required<Estimate>();
  protected readonly names = REVISION_STATUS_NAMES;
}
