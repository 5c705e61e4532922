import { FormArray, FormControl, FormGroup } from '@angular/forms';
import type { BillingDue, BillingStage } from '@bookmatch/common/estimates/billing-schedule-contract';
import type { CostCategory } from '@bookmatch/common/estimates/cost-categories';
import type {
  EstimateLine,
  EstimateRoom,
  QuantityUnit,
  RevisionContent,
} from '@bookmatch/common/estimates/revision-contract';
import type { TaxRule } from '@bookmatch/common/estimates/tax-rules';

type Controls<Fields> = { [Key in keyof Fields]: FormControl<Fields[Key]> };

/** A line while it is typed: an amount that is empty, or cannot be read, is null. */
export type LineFields = {
  id: string;
  kind: CostCategory;
  description: string;
  quantity: string;
  unit: QuantityUnit;
  unitCostCents: number | null;
  unitPriceCents: number | null;
  operationId: string | null;
  plannedMinutesPerUnit: string | null;
  taxable: boolean;
};
export type ShareKind = 'percent' | 'amount' | 'remainder';
export type ShareFields = { kind: ShareKind; percent: string; amountCents: number | null };

export type LineForm = FormGroup<Controls<LineFields>>;
export type RoomForm = FormGroup<{
  id: FormControl<string>;
  name: FormControl<string>;
  lines: FormArray<LineForm>;
}>;
export type StageForm = FormGroup<{
  id: FormControl<string>;
  name: FormControl<string>;
  share: FormGroup<Controls<ShareFields>>;
  deposit: FormControl<boolean>;
  due: FormControl<BillingDue>;
}>;
export type DraftForm = FormGroup<{
  validUntil: FormControl<string>;
  taxRule: FormControl<TaxRule>;
  taxRate: FormControl<string>;
  intro: FormControl<string>;
  terms: FormControl<string>;
  exclusions: FormControl<string>;
  discountCents: FormControl<number | null>;
  rooms: FormArray<RoomForm>;
  billingSchedule: FormArray<StageForm>;
}>;
export type DraftFields = ReturnType<DraftForm['getRawValue']>;

/** The form of a whole draft, its fields named as the contract names them. */
export function draftForm(content: RevisionContent): DraftForm {
  return new FormGroup({
    validUntil: field(content.validUntil),
    taxRule: field<TaxRule>(content.taxRule),
    taxRate: field(content.taxRate),
    intro: field(content.intro),
    terms: field(content.terms),
    exclusions: field(content.exclusions),
    discountCents: field<number | null>(content.discountCents),
    rooms: new FormArray(content.rooms.map(roomForm)),
    billingSchedule: new FormArray(content.billingSchedule.map(stageForm)),
  });
}

export function roomForm({ id, name, lines }: EstimateRoom): RoomForm {
  return new FormGroup({ id: field(id), name: field(name), lines: new FormArray(lines.map(lineForm)) });
}

export function lineForm(line: EstimateLine | LineFields): LineForm {
  return new FormGroup<Controls<LineFields>>({
    id: field(line.id),
    kind: field<CostCategory>(line.kind),
    description: field(line.description),
    quantity: field(line.quantity),
    unit: field<QuantityUnit>(line.unit),
    unitCostCents: field<number | null>(line.unitCostCents),
    unitPriceCents: field<number | null>(line.unitPriceCents),
    operationId: field<string | null>(line.operationId),
    plannedMinutesPerUnit: field<string | null>(line.plannedMinutesPerUnit),
    taxable: field(line.taxable),
  });
}

export function stageForm({ id, name, share, deposit, due }: BillingStage): StageForm {
  return new FormGroup({
    id: field(id),
    name: field(name),
    share: new FormGroup<Controls<ShareFields>>({
      kind: field<ShareKind>(
        'percent' in share ? 'percent' : 'amountCents' in share ? 'amount' : 'remainder',
      ),
      percent: field('percent' in share ? share.percent : ''),
      amountCents: field<number | null>('amountCents' in share ? share.amountCents : null),
    }),
    deposit: field(deposit),
    due: field<BillingDue>(due),
  });
}

function field<Value>(value: Value): FormControl<Value> {
  return new FormControl(value, { nonNullable: true }) as FormControl<Value>;
}
