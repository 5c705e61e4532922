import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatError, MatFormField } from '@angular/material/form-field';
import { MatFormFieldHarness } from '@angular/material/form-field/testing';
import { MatInput } from '@angular/material/input';
import { MatInputHarness } from '@angular/material/input/testing';
import { ErrorOf } from '../form-errors/error-of';
import { MoneyInput } from './money-input';

@Component({
  selector: 'bm-money-test',
  imports: [ErrorOf, MatError, MatFormField, MatInput, MoneyInput, ReactiveFormsModule],
  template: `
    <mat-form-field>
      <input matInput bmMoneyInput [formControl]="price" />
      <mat-error [bmErrorOf]="price" />
    </mat-form-field>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Host {
  readonly price = new FormControl<number | null>(125_000);
}

async function open() {
  const fixture = TestBed.createComponent(Host);
  const loader = TestbedHarnessEnvironment.loader(fixture);
  return {
    price: fixture.componentInstance.price,
    input: await loader.getHarness(MatInputHarness),
    field: await loader.getHarness(MatFormFieldHarness),
  };
}

describe('MoneyInput', () => {
  it('writes cents as an amount', async () => {
    const { input } = await open();
    expect(await input.getValue()).toBe('1,250.00');
  });

  it('gives cents while typing and tidies the text when left', async () => {
    const { input, price } = await open();
    await input.setValue('2300.5');
    expect(price.value).toBe(230_050);
    await input.blur();
    expect(await input.getValue()).toBe('2,300.50');
  });

  it('gives null for an empty field', async () => {
    const { input, price } = await open();
    await input.setValue('');
    expect(price.value).toBeNull();
    expect(price.valid).toBe(true);
  });

  it('keeps what cannot be read, and says so', async () => {
    const { input, price, field } = await open();
    await input.setValue('twelve');
    await input.blur();
    expect(price.valid).toBe(false);
    expect(await input.getValue()).toBe('twelve');
    expect(await field.getTextErrors()).toEqual(['Give an amount, such as 1,250 or 1250.00.']);
  });

  it('is well again once it can be read', async () => {
    const { input, price } = await open();
    await input.setValue('twelve');
    await input.setValue('12');
    expect(price.valid).toBe(true);
    expect(price.value).toBe(1200);
  });
});
