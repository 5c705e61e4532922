import { ChangeDetectionStrategy, Component, computed, inject, input, type OnInit } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { RouterLink } from '@angular/router';
import { Store } from '@ngrx/store';
import { injectCan } from '../../platform/session/ability';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { StatusChip } from '../../ui/status-chip/status-chip';
import { SubscriptionPage } from '../state/subscription.actions';
import { subscriptionFeature } from '../state/subscription.state';
import { isSubscribed, wordsOf } from '../subscription-words';

/** How the shop's own subscription stands, what it costs, and the way to the payment provider. */
@Component({
  selector: 'bm-subscription-screen',
  imports: [MatButton, MatIcon, MoneyPipe, PageHead, Panel, ProblemNote, RouterLink, Skeleton, StatusChip],
  providers: [DateTextPipe],
  templateUrl: './subscription-screen.html',
  styleUrl: './subscription-screen.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SubscriptionScreen implements OnInit {
  /** From the address: `provider` on the way back from one of its pages. */
  readonly from = input<string>();

  private readonly store = inject(Store);
  private readonly dates = inject(DateTextPipe);
  protected readonly can = injectCan();
  protected readonly subscription = this.store.selectSignal(subscriptionFeature.selectSubscription);
  protected readonly problem = this.store.selectSignal(subscriptionFeature.selectProblem);
  protected readonly leaving = this.store.selectSignal(subscriptionFeature.selectLeaving);
  protected readonly words = computed(() => {
    const subscription = this.subscription();
    return subscription ? wordsOf(subscription, (instant) => this.dates.transform(instant)) : null;
  });
  protected readonly subscribed = computed(() => {
    const subscription = this.subscription();
    return subscription !== null && isSubscribed(subscription);
  });
  /** Has been at the provider before: bills and the card are there, also once it has ended. */
  protected readonly manageable = computed(
    () => this.subscribed() || this.subscription()?.status === 'canceled',
  );
  protected readonly isLeaving = computed(() => ['saving', 'saved'].includes(this.leaving().status));

  ngOnInit(): void {
    this.load();
  }

  protected load(): void {
    const returned = this.from() === 'provider';
    this.store.dispatch(returned ? SubscriptionPage.returnedFromProvider() : SubscriptionPage.opened());
  }

  protected subscribe(): void {
    this.store.dispatch(SubscriptionPage.subscribePressed());
  }

  protected manage(): void {
    this.store.dispatch(SubscriptionPage.managePressed());
  }
}
