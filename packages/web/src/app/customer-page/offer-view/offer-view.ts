import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { AcceptedDocument } from '@bookmatch/common/estimates/accepted-document-contract';
import { BILLING_DUE_WORDS, taxWords } from '@bookmatch/common/estimates/tax-words';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { Panel } from '../../ui/panel/panel';

/** The estimate as its customer reads it: what, for how much, when it is paid. */
@Component({
  selector: 'bm-offer-view',
  imports: [MoneyPipe, Panel],
  templateUrl: './offer-view.html',
  styleUrl: './offer-view.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OfferView {
  readonly document = input.required<AcceptedDocument>();
  protected readonly tax = computed(() => taxWords(this.document()));
  protected readonly dueWords = BILLING_DUE_WORDS;
}
