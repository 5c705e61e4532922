import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { ShopIdentity } from '@bookmatch/common/customer-page/customer-page-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import { Store } from '@ngrx/store';
import { addressLines } from '../../customers/customers-public';
import { SHOP_CURRENCY, SHOP_ZONE } from '../../ui/formats/shop-settings';
import { Panel } from '../../ui/panel/panel';
import { PublicFrame } from '../../ui/public-frame/public-frame';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { CustomerEstimatePart } from '../customer-estimate/customer-estimate';
import { CustomerInvoice } from '../customer-invoice/customer-invoice';
import { CustomerScreen as Screen } from '../state/customer-page.actions';
import { customerPageFeature } from '../state/customer-page.state';

/** What a customer sees behind a link: the shop's name around it, and what the link is about. */
@Component({
  selector: 'bm-customer-screen',
  imports: [CustomerEstimatePart, CustomerInvoice, MatButton, Panel, PublicFrame, Skeleton],
  providers: [
    {
      provide: SHOP_ZONE,
      useFactory: () => inject(Store).selectSignal(customerPageFeature.selectZone),
    },
    {
      provide: SHOP_CURRENCY,
      useFactory: () => inject(Store).selectSignal(customerPageFeature.selectCurrency),
    },
  ],
  templateUrl: './customer-screen.html',
  styleUrl: './customer-screen.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CustomerScreen {
  /** From the address. */
  readonly token = input.required<string>();

  private readonly store = inject(Store);
  protected readonly page = this.store.selectSignal(customerPageFeature.selectPage);
  private readonly failure = this.store.selectSignal(customerPageFeature.selectProblem);
  protected readonly shopName = computed(() => this.page()?.shop.name ?? '');
  protected readonly contact = computed(() => contactOf(this.page()?.shop));
  protected readonly dead = computed(() => deadLink(this.failure()));
  protected readonly about = computed(() => {
    const page = this.page();
    if (!page) return this.dead()?.title ?? 'One moment';
    return page.subject === 'estimate'
      ? `Estimate ${page.estimate.document.estimateNumber}`
      : `Invoice ${page.invoice.number}`;
  });

  constructor() {
    effect(() => this.load());
  }

  protected load(): void {
    const token = this.token();
    untracked(() => this.store.dispatch(Screen.opened({ token })));
  }
}

function contactOf(shop: ShopIdentity | undefined): string[] {
  if (!shop) return [];
  return [...addressLines(shop.address), shop.phone, shop.email].filter(Boolean);
}

/** Why there is nothing to see, in the words of somebody who only has a letter with a link. */
function deadLink(problem: Problem | null): { title: string; text: string; again: boolean } | null {
  if (!problem) return null;
  if (problem.status === 410)
    return {
      title: 'This link no longer works',
      text: 'Links end after a while, or when the shop ends them. Ask the shop for a new one: a reply to its letter is enough.',
      again: false,
    };
  if (problem.status === 404)
    return {
      title: 'This link is not complete',
      text: 'Part of the address may be missing. Open it from the letter again, or copy the whole of it.',
      again: false,
    };
  return { title: 'This page could not be loaded', text: problem.detail, again: true };
}
