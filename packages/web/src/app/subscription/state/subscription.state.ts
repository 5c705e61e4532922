import type { Problem } from '@bookmatch/common/problems/problem';
import type { Subscription } from '@bookmatch/common/subscription/subscription-contract';
import { createFeature, createReducer, on } from '@ngrx/store';
import { notSaved, saved, saveFailed, saving, type SaveState } from '../../platform/forms/save-state';
import { SubscriptionApi, SubscriptionPage } from './subscription.actions';

export type SubscriptionState = {
  subscription: Subscription | null;
  problem: Problem | null;
  /** The way to a page of the payment provider. */
  leaving: SaveState;
};

export const initialSubscription: SubscriptionState = {
  subscription: null,
  problem: null,
  leaving: notSaved,
};

export const subscriptionFeature = createFeature({
  name: 'subscription',
  reducer: createReducer(
    initialSubscription,
    on(SubscriptionPage.opened, SubscriptionPage.returnedFromProvider, (state): SubscriptionState => ({
      ...state,
      problem: null,
      leaving: notSaved,
    })),
    on(SubscriptionApi.loaded, SubscriptionApi.refreshed, (state, { subscription }): SubscriptionState => ({
      ...state,
      subscription,
    })),
    on(SubscriptionApi.loadFailed, (state, { problem }): SubscriptionState => ({ ...state, problem })),
    on(SubscriptionPage.subscribePressed, SubscriptionPage.managePressed, (state): SubscriptionState => ({
      ...state,
      leaving: saving,
    })),
    on(SubscriptionApi.providerPageReady, (state): SubscriptionState => ({ ...state, leaving: saved })),
    on(SubscriptionApi.providerPageFailed, (state, { problem }): SubscriptionState => ({
      ...state,
      leaving: saveFailed(problem),
    })),
  ),
});
