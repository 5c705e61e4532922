import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatError, MatFormField } from '@angular/material/form-field';
import { MatFormFieldHarness } from '@angular/material/form-field/testing';
import { MatInput } from '@angular/material/input';
import { MatInputHarness } from '@angular/material/input/testing';
import { ErrorOf } from '../form-errors/error-of';
import { PercentInput } from './percent-input';

@Component({
  selector: 'bm-percent-test',
  imports: [ErrorOf, MatError, MatFormField, MatInput, PercentInput, ReactiveFormsModule],
  template: `
    <mat-form-field>
      <input matInput bmPercentInput [formControl]="rate" />
      <mat-error [bmErrorOf]="rate" />
    </mat-form-field>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Host {
  readonly rate = new FormControl('0.0825');
}

async function open() {
  const fixture = TestBed.createComponent(Host);
  const loader = TestbedHarnessEnvironment.loader(fixture);
  return {
    rate: fixture.componentInstance.rate,
    input: await loader.getHarness(MatInputHarness),
    field: await loader.getHarness(MatFormFieldHarness),
  };
}

describe('PercentInput', () => {
  it('writes a rate as a percent', async () => {
    expect(await (await open()).input.getValue()).toBe('8.25');
  });

  it('keeps the exact rate of what is typed, with or without the sign', async () => {
    const { input, rate } = await open();
    await input.setValue('7.1 %');
    await input.blur();
    expect(rate.value).toBe('0.071');
    expect(await input.getValue()).toBe('7.1');
  });

  it('keeps what cannot be read, and says so', async () => {
    const { input, rate, field } = await open();
    await input.setValue('eight');
    await input.blur();
    expect(rate.valid).toBe(false);
    expect(await input.getValue()).toBe('eight');
    expect(await field.getTextErrors()).toEqual(['Give a percent, such as 8.25.']);
  });
});
