import { FormBuilder } from '@angular/forms';
import { createJobSchema } from '@bookmatch/common/jobs/jobs-contract';
import { isHours, jobBody, jobFormGroup } from './job-form-group';

describe('the form of a new job', () => {
  const operationId = '0190a1b2-0000-7000-8000-000000000001';
  const customerId = '0190a1b2-0000-7000-8000-000000000002';

  it('sends planned hours as minutes and leaves out what was left empty', () => {
    const form = jobFormGroup(new FormBuilder().nonNullable);
    form.patchValue({ title: 'Window seat', customerId, contractNetCents: 120_000 });
    form.controls.hours.addControl(operationId, new FormBuilder().nonNullable.control('7.5'));
    form.controls.hours.addControl(customerId, new FormBuilder().nonNullable.control(''));
    form.controls.costs.patchValue({ material: 30_000 });
    const body = createJobSchema.parse(jobBody(form.getRawValue()));
    expect(body).toMatchObject({
      title: 'Window seat',
      contractNetCents: 120_000,
      contractTaxCents: 0,
      operations: [{ operationId, plannedMinutes: 450 }],
      plannedCosts: [{ category: 'material', plannedCents: 30_000 }],
    });
  });

  it.each(['', ' 12 ', '7.25', '0'])('takes %j as hours', (text) => expect(isHours(text)).toBe(true));
  it.each(['seven', '-1', '1e3', '7.255', '10001'])('refuses %j as hours', (text) => {
    expect(isHours(text)).toBe(false);
  });
});
