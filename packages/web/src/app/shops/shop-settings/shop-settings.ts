import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  type ElementRef,
  inject,
  signal,
  viewChild,
} from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatHint, MatLabel, MatSuffix } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatRadioButton, MatRadioGroup } from '@angular/material/radio';
import type { Shop } from '@bookmatch/common/shops/shops-contract';
import { Store } from '@ngrx/store';
import { HOME_ZONES, otherZones } from '../../accounts/accounts-public';
import { AddressFields } from '../../customers/customers-public';
import { injectCan } from '../../platform/session/ability';
import { changedFields } from '../../ui/form-errors/changed-fields';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { PercentInput } from '../../ui/percent-input/percent-input';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { warnBeforeUnload, type HasUnsavedChanges } from '../../ui/unsaved-changes/unsaved-changes';
import { BillingScheduleFields } from '../billing-schedule-fields/billing-schedule-fields';
import { SettingsPage } from '../state/settings.actions';
import { settingsFeature } from '../state/settings.state';
import {
  fillShopSettings,
  SHOP_FIELD_LABELS,
  shopSettingsForm,
  shopSettingsSchema,
} from './shop-settings-form';

/** What the shop says about itself, and what new estimates and invoices start from. */
@Component({
  selector: 'bm-shop-settings',
  imports: [
    AddressFields,
    BillingScheduleFields,
    ErrorOf,
    FormErrors,
    MatButton,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    MatRadioButton,
    MatRadioGroup,
    MatSuffix,
    PageHead,
    Panel,
    PercentInput,
    ProblemNote,
    ReactiveFormsModule,
    Skeleton,
  ],
  templateUrl: './shop-settings.html',
  styleUrl: './shop-settings.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ShopSettings implements HasUnsavedChanges {
  private readonly store = inject(Store);
  private readonly builder = inject(NonNullableFormBuilder);
  private readonly element = viewChild<ElementRef<HTMLFormElement>>('element');
  private readonly can = injectCan();
  protected readonly form = shopSettingsForm(this.builder);
  protected readonly homeZones = HOME_ZONES;
  protected readonly otherZones = otherZones();

  protected readonly shop = this.store.selectSignal(settingsFeature.selectShop);
  protected readonly problem = this.store.selectSignal(settingsFeature.selectProblem);
  protected readonly save = this.store.selectSignal(settingsFeature.selectSave);
  protected readonly mayChange = computed(() => this.can('update', 'Shop'));

  /** What the form was filled with; compared with what is stored when somebody else was quicker. */
  private readonly filledFrom = signal<Shop | null>(null);
  protected readonly changedMeanwhile = computed(() => {
    const [before, now] = [this.filledFrom(), this.shop()];
    if (!before || !now || before.version === now.version || this.save().status === 'saved') return null;
    return changedFields(before, now, SHOP_FIELD_LABELS).join(', ');
  });
  /** The conflict is told with its fields then, and not a second time without them. */
  protected readonly isTold = computed(
    () => this.save().problem?.code === 'stale-version' && Boolean(this.changedMeanwhile()),
  );

  constructor() {
    this.store.dispatch(SettingsPage.formOpened());
    this.load();
    warnBeforeUnload(() => this.hasUnsavedChanges());
    effect(() => this.fill(this.shop(), this.save().status));
    effect(() => {
      if (!this.mayChange()) this.form.disable({ emitEvent: false });
    });
  }

  hasUnsavedChanges(): boolean {
    return this.form.dirty;
  }

  protected load(): void {
    this.store.dispatch(SettingsPage.opened());
  }

  protected submit(): void {
    const shop = this.shop();
    const fields = checkForm(this.form, shopSettingsSchema(this.form));
    if (!fields || !shop) {
      const form = this.element()?.nativeElement;
      if (form) focusFirstInvalid(form);
      return;
    }
    this.store.dispatch(SettingsPage.saveSubmitted({ version: shop.version, fields }));
  }

  /** Nothing typed is overwritten: only an untouched form follows what is stored, and one that was just saved. */
  private fill(shop: Shop | null, status: string): void {
    if (!shop || (this.form.dirty && status !== 'saved')) return;
    fillShopSettings(this.form, this.builder, shop);
    this.form.markAsPristine();
    this.filledFrom.set(shop);
    if (!this.mayChange()) this.form.disable({ emitEvent: false });
  }
}
