import type { FormArray, FormControl, FormGroup, NonNullableFormBuilder } from '@angular/forms';
import type {
  BillingDue,
  BillingShare,
  BillingStagePlan,
} from '@bookmatch/common/estimates/billing-schedule-contract';

export type ShareKind = 'percent' | 'amount' | 'remainder';
export type StageForm = FormGroup<{
  name: FormControl<string>;
  shareKind: FormControl<ShareKind>;
  percent: FormControl<string>;
  amountCents: FormControl<number | null>;
  deposit: FormControl<boolean>;
  due: FormControl<BillingDue>;
}>;
export type ScheduleForm = FormArray<StageForm>;

/** A stage as a row of fields; the fields of the kinds not chosen keep what was typed in them. */
export function stageForm(builder: NonNullableFormBuilder, stage?: BillingStagePlan): StageForm {
  const share = stage?.share ?? { percent: '' };
  return builder.group({
    name: stage?.name ?? '',
    shareKind: builder.control<ShareKind>(kindOf(share)),
    percent: 'percent' in share ? share.percent : '',
    amountCents: builder.control<number | null>('amountCents' in share ? share.amountCents : null),
    deposit: stage?.deposit ?? false,
    due: builder.control<BillingDue>(stage?.due ?? 'by-hand'),
  });
}

function kindOf(share: BillingShare): ShareKind {
  if ('percent' in share) return 'percent';
  return 'amountCents' in share ? 'amount' : 'remainder';
}

/** What the contract takes; an amount not given yet is nothing, which the contract refuses in its own words. */
export function stagesOf(form: ScheduleForm): BillingStagePlan[] {
  return form.getRawValue().map(({ name, shareKind, percent, amountCents, deposit, due }) => {
    const shares: Record<ShareKind, BillingShare> = {
      percent: { percent: percent.trim().replace(/\s*%$/, '') },
      amount: { amountCents: amountCents ?? 0 },
      remainder: { remainder: true },
    };
    return { name, share: shares[shareKind], deposit, due };
  });
}
