import { ChangeDetectionStrategy, Component, computed, inject, input, type OnInit } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import type { CardPaymentStatus } from '@bookmatch/common/shops/shops-contract';
import { Store } from '@ngrx/store';
import { injectCan } from '../../platform/session/ability';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { StatusChip, type Tone } from '../../ui/status-chip/status-chip';
import { SettingsPage } from '../state/settings.actions';
import { settingsFeature } from '../state/settings.state';

type Standing = { chip: string; tone: Tone; text: string; action: string | null };
const STANDINGS: Record<CardPaymentStatus, Standing> = {
  'not-set-up': {
    chip: 'Not set up',
    tone: 'neutral',
    text: 'Customers pay by check, cash or transfer. Set up card payments, and every invoice carries a button to pay it.',
    action: 'Set up card payments',
  },
  'in-progress': {
    chip: 'Not finished',
    tone: 'over',
    text: 'The payment provider still needs something from you, or looks your details over. Until then nobody can pay by card.',
    action: 'Go on at the payment provider',
  },
  ready: {
    chip: 'Ready',
    tone: 'good',
    text: 'Every invoice carries a button to pay it by card.',
    action: null,
  },
};

/** Whether customers can pay by card, and the way to it. */
@Component({
  selector: 'bm-card-payments',
  imports: [MatButton, MatIcon, PageHead, Panel, ProblemNote, Skeleton, StatusChip],
  templateUrl: './card-payments.html',
  styleUrl: './card-payments.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CardPayments implements OnInit {
  /** From the address: `provider` on the way back from its page. */
  readonly from = input<string>();
  /** From the address: `expired` when the provider's link was too old. */
  readonly link = input<string>();

  private readonly store = inject(Store);
  protected readonly can = injectCan();
  private readonly shop = this.store.selectSignal(settingsFeature.selectShop);
  protected readonly problem = this.store.selectSignal(settingsFeature.selectProblem);
  protected readonly setUp = this.store.selectSignal(settingsFeature.selectCardSetUp);
  protected readonly standing = computed(() => {
    const shop = this.shop();
    return shop ? STANDINGS[shop.cardPayments] : null;
  });
  protected readonly isLeaving = computed(
    () => this.setUp().status === 'saving' || this.setUp().status === 'saved',
  );

  ngOnInit(): void {
    this.load();
  }

  protected load(): void {
    this.store.dispatch(SettingsPage.opened());
    if (this.from() === 'provider' && this.can('manage', 'PaymentAccount'))
      this.store.dispatch(SettingsPage.returnedFromProvider());
  }

  protected go(): void {
    this.store.dispatch(SettingsPage.cardPaymentsPressed());
  }
}
