import type { Problem } from '@bookmatch/common/problems/problem';
import type { Shop } from '@bookmatch/common/shops/shops-contract';
import { createFeature, createReducer, on } from '@ngrx/store';
import { notSaved, saved, saveFailed, saving, type SaveState } from '../../platform/forms/save-state';
import { SettingsApi, SettingsPage } from './settings.actions';

export type SettingsState = {
  shop: Shop | null;
  problem: Problem | null;
  save: SaveState;
  /** The way to the page of the payment provider. */
  cardSetUp: SaveState;
};

export const initialSettings: SettingsState = {
  shop: null,
  problem: null,
  save: notSaved,
  cardSetUp: notSaved,
};

export const settingsFeature = createFeature({
  name: 'shopSettings',
  reducer: createReducer(
    initialSettings,
    on(SettingsPage.opened, (state): SettingsState => ({ ...state, problem: null, cardSetUp: notSaved })),
    on(SettingsApi.loaded, (state, { shop }): SettingsState => ({ ...state, shop })),
    on(SettingsApi.loadFailed, (state, { problem }): SettingsState => ({ ...state, problem })),
    on(SettingsPage.formOpened, (state): SettingsState => ({ ...state, save: notSaved })),
    on(SettingsPage.saveSubmitted, (state): SettingsState => ({ ...state, save: saving })),
    on(SettingsApi.saved, (state, { shop }): SettingsState => ({ ...state, shop, save: saved })),
    on(SettingsApi.saveFailed, (state, { problem }): SettingsState => ({
      ...state,
      save: saveFailed(problem),
    })),
    on(SettingsPage.cardPaymentsPressed, (state): SettingsState => ({ ...state, cardSetUp: saving })),
    on(SettingsApi.providerPageReady, (state): SettingsState => ({ ...state, cardSetUp: saved })),
    on(SettingsApi.cardPaymentsFailed, (state, { problem }): SettingsState => ({
      ...state,
      cardSetUp: saveFailed(problem),
    })),
  ),
});
