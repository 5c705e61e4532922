import type { NonNullableFormBuilder } from '@angular/forms';
import type { ShopTaxRule } from '@bookmatch/common/estimates/tax-rules';
import type { UnitSystem } from '@bookmatch/common/measure/unit-system';
import { refuseDefaultSchedule } from '@bookmatch/common/shops/default-schedule';
import { updateShopSchema, type Shop } from '@bookmatch/common/shops/shops-contract';
import { addressForm } from '../../customers/customers-public';
import { stageForm, stagesOf, type StageForm } from '../billing-schedule-fields/billing-schedule-form';

/** The fields a person types, named as the contract names them, so that the server's sentences find their field. */
export function shopSettingsForm(builder: NonNullableFormBuilder) {
  return builder.group({
    name: '',
    phone: '',
    email: '',
    address: addressForm(builder),
    timeZone: '',
    unitSystem: builder.control<UnitSystem>('inch'),
    taxRule: builder.control<ShopTaxRule>('on-price'),
    defaultTaxRate: '0',
    estimateTerms: '',
    estimateValidDays: builder.control<number | null>(null),
    invoiceDueDays: builder.control<number | null>(null),
    defaultBillingSchedule: builder.array<StageForm>([]),
  });
}
export type ShopSettingsForm = ReturnType<typeof shopSettingsForm>;

export function fillShopSettings(
  form: ShopSettingsForm,
  builder: NonNullableFormBuilder,
  { defaultBillingSchedule, ...shop }: Shop,
): void {
  form.patchValue(shop);
  const stages = form.controls.defaultBillingSchedule;
  stages.clear();
  for (const stage of defaultBillingSchedule) stages.push(stageForm(builder, stage));
}

/** What the contract checks. An empty number is no number, which it refuses in its own words. */
function shopSettingsOf(form: ShopSettingsForm) {
  return { ...form.getRawValue(), defaultBillingSchedule: stagesOf(form.controls.defaultBillingSchedule) };
}

/** For telling which fields somebody else changed. */
export const SHOP_FIELD_LABELS = {
  name: 'name',
  phone: 'phone',
  email: 'e-mail',
  address: 'address',
  timeZone: 'time zone',
  unitSystem: 'units',
  taxRule: 'tax rule',
  defaultTaxRate: 'tax rate',
  estimateTerms: 'terms',
  estimateValidDays: 'days an estimate holds',
  invoiceDueDays: 'days to pay',
  defaultBillingSchedule: 'billing schedule',
} as const;

/** The contract as this form meets it: a stage's share is three fields here and one there. */
export function shopSettingsSchema(form: ShopSettingsForm) {
  const stages = form.controls.defaultBillingSchedule;
  const fieldOf = (path: readonly PropertyKey[]): readonly PropertyKey[] => {
    const [list, index, part] = path;
    if (list !== 'defaultBillingSchedule' || part !== 'share') return path;
    const kind = stages.at(Number(index)).controls.shareKind.value;
    return [list, index ?? 0, kind === 'amount' ? 'amountCents' : 'percent'];
  };
  return {
    safeParse() {
      const result = updateShopSchema.safeParse(shopSettingsOf(form));
      const refusal = result.success ? refuseDefaultSchedule(stagesOf(stages)) : null;
      if (result.success && !refusal) return result;
      const issues = result.success
        ? [{ path: ['defaultBillingSchedule'], message: refusal?.detail ?? '' }]
        : result.error.issues.map(({ path, message }) => ({ path: fieldOf(path), message }));
      return { success: false as const, error: { issues } };
    },
  };
}
