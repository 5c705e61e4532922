import { ChangeDetectionStrategy, Component, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { FormControl, FormGroup, ReactiveFormsModule } from '@angular/forms';
import { createCustomerSchema } from '@bookmatch/common/customers/customers-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import { provideIcons } from '../../testing/icons';
import { changedFields } from './changed-fields';
import { checkForm } from './check-form';
import { messageOf, placeFieldProblems } from './field-problems';
import { FormErrors } from './form-errors';

function buildForm() {
  return new FormGroup({
    name: new FormControl('Wren', { nonNullable: true }),
    address: new FormGroup({ city: new FormControl('', { nonNullable: true }) }),
  });
}

@Component({
  selector: 'bm-form-errors-test',
  imports: [FormErrors, ReactiveFormsModule],
  template: `
    <form [formGroup]="form">
      <bm-form-errors [form]="form" [problem]="problem()" />
      <input id="name" formControlName="name" />
    </form>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Host {
  readonly form = buildForm();
  readonly problem = signal<Problem | null>(null);
}

describe('placeFieldProblems', () => {
  it('puts each sentence at its field by path and gives back those without a field', () => {
    const form = buildForm();
    const homeless = placeFieldProblems(form, [
      { path: 'address.city', message: 'Which city?' },
      { path: 'lines.0', message: 'No such field here.' },
    ]);
    expect(messageOf(form.controls.address.controls.city)).toBe('Which city?');
    expect(homeless).toEqual([{ path: 'lines.0', message: 'No such field here.' }]);
  });

  it('takes the sentence away when its field is edited', () => {
    const form = buildForm();
    placeFieldProblems(form, [{ path: 'name', message: 'Taken.' }]);
    expect(form.valid).toBe(false);
    form.controls.name.setValue('Wrenna');
    expect(messageOf(form.controls.name)).toBe('');
    expect(form.valid).toBe(true);
  });
});

describe('checkForm', () => {
  const customer = (name: string) =>
    new FormGroup({
      kind: new FormControl('homeowner', { nonNullable: true }),
      name: new FormControl(name, { nonNullable: true }),
    });

  it('gives what is to be sent when the contract agrees', () => {
    expect(checkForm(customer(' Wren '), createCustomerSchema)?.name).toBe('Wren');
  });

  it('gives null and places the sentences of the contract when it does not', () => {
    const form = customer('');
    expect(checkForm(form, createCustomerSchema)).toBeNull();
    expect(messageOf(form.controls.name)).toBe('The name cannot be empty.');
  });

  it('agrees at the second try once the field is corrected', () => {
    const form = customer('');
    checkForm(form, createCustomerSchema);
    form.controls.name.setValue('Wren');
    expect(checkForm(form, createCustomerSchema)?.name).toBe('Wren');
  });
});

describe('checkForm after a refusal', () => {
  it('judges every field afresh, since another one may have mended it', () => {
    const form = new FormGroup({
      kind: new FormControl('homeowner', { nonNullable: true }),
      name: new FormControl('Wren', { nonNullable: true }),
      billingAddress: new FormGroup({ city: new FormControl('Stowe', { nonNullable: true }) }),
    });
    placeFieldProblems(form, [{ path: 'billingAddress.city', message: 'No such city.' }]);
    expect(checkForm(form, createCustomerSchema)?.name).toBe('Wren');
    expect(form.valid).toBe(true);
  });
});

describe('FormErrors', () => {
  it('reads the refusal out, marks the field and puts the focus there', async () => {
    TestBed.configureTestingModule({ providers: [provideIcons()] });
    const fixture = TestBed.createComponent(Host);
    const element = fixture.nativeElement as HTMLElement;
    document.body.append(element);
    const fields = [{ path: 'name', message: 'Taken.' }];
    const problem = {
      type: '',
      title: '',
      status: 422,
      code: 'invalid-input',
      detail: 'Correct this.',
      fields,
    };
    fixture.componentInstance.problem.set(problem);
    await fixture.whenStable();
    expect(element.querySelector('[role=alert]')?.textContent).toContain('Correct this.');
    expect(messageOf(fixture.componentInstance.form.controls.name)).toBe('Taken.');
    expect(document.activeElement?.id).toBe('name');
  });
});

describe('changedFields', () => {
  it('names what somebody else changed, nested parts included', () => {
    const before = { name: 'Wren', phone: '1', address: { city: 'Stowe' }, version: 1 };
    const now = { ...before, phone: '2', address: { city: 'Richmond' }, version: 2 };
    expect(changedFields(before, now, { name: 'name', phone: 'phone', address: 'address' })).toEqual([
      'phone',
      'address',
    ]);
  });
});
