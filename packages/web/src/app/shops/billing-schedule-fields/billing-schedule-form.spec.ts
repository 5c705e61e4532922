import { NonNullableFormBuilder } from '@angular/forms';
import { TestBed } from '@angular/core/testing';
import type { BillingStagePlan } from '@bookmatch/common/estimates/billing-schedule-contract';
import { stageForm, stagesOf } from './billing-schedule-form';

const stages: BillingStagePlan[] = [
  { name: 'Deposit', share: { percent: '40' }, deposit: true, due: 'on-acceptance' },
  { name: 'Counters', share: { amountCents: 120_000 }, deposit: false, due: 'by-hand' },
  { name: 'Installed', share: { remainder: true }, deposit: false, due: 'by-hand' },
];

describe('the form of a billing schedule', () => {
  const build = () => {
    const builder = TestBed.inject(NonNullableFormBuilder);
    return builder.array(stages.map((stage) => stageForm(builder, stage)));
  };

  it('gives back what it was filled with', () => {
    expect(stagesOf(build())).toEqual(stages);
  });

  it('gives the share of the kind that is chosen, without the sign', () => {
    const form = build();
    form.at(2).patchValue({ shareKind: 'percent', percent: ' 25 % ' });
    form.at(0).patchValue({ shareKind: 'amount' });
    expect(stagesOf(form).map(({ share }) => share)).toEqual([
      { amountCents: 0 },
      { amountCents: 120_000 },
      { percent: '25' },
    ]);
  });
});
