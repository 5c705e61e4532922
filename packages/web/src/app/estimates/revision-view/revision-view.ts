import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { COST_CATEGORY_NAMES } from '@bookmatch/common/estimates/cost-categories';
import type { Revision } from '@bookmatch/common/estimates/revision-contract';
import { BILLING_DUE_WORDS } from '@bookmatch/common/estimates/tax-words';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { Panel } from '../../ui/panel/panel';
import { PricePanel } from '../price-panel/price-panel';

/** A revision as it stands, to be read: what was sent, or a draft for those who may not write. */
@Component({
  selector: 'bm-revision-view',
  imports: [DateTextPipe, MoneyPipe, Panel, PricePanel],
  templateUrl: './revision-view.html',
  styleUrl: './revision-view.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RevisionView {
  readonly revision = input.required<Revision>();
  protected readonly kindNames = COST_CATEGORY_NAMES;
  protected readonly dueWords = BILLING_DUE_WORDS;
}
