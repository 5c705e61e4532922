import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { ChangeDetectionStrategy, Component, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatError, MatFormField, MatHint } from '@angular/material/form-field';
import { MatFormFieldHarness } from '@angular/material/form-field/testing';
import { MatInput } from '@angular/material/input';
import { MatInputHarness } from '@angular/material/input/testing';
import { ErrorOf } from '../form-errors/error-of';
import { SHOP_UNITS } from '../formats/shop-settings';
import { LengthInput } from './length-input';

@Component({
  selector: 'bm-length-test',
  imports: [ErrorOf, LengthInput, MatError, MatFormField, MatHint, MatInput, ReactiveFormsModule],
  template: `
    <mat-form-field>
      <input matInput bmLengthInput #width="bmLengthInput" [formControl]="widthMm" />
      <mat-hint>{{ width.echo() }}</mat-hint>
      <mat-error [bmErrorOf]="widthMm" />
    </mat-form-field>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Host {
  readonly widthMm = new FormControl<string | null>('600.075');
}

async function open(units: 'inch' | 'metric') {
  TestBed.configureTestingModule({ providers: [{ provide: SHOP_UNITS, useValue: signal(units) }] });
  const fixture = TestBed.createComponent(Host);
  const loader = TestbedHarnessEnvironment.loader(fixture);
  return {
    widthMm: fixture.componentInstance.widthMm,
    input: await loader.getHarness(MatInputHarness),
    field: await loader.getHarness(MatFormFieldHarness),
  };
}

describe('LengthInput', () => {
  it('writes stored millimeters in the unit of the shop', async () => {
    const { input } = await open('inch');
    expect(await input.getValue()).toBe('23 5/8"');
  });

  it('takes what a maker types, echoes it, and writes it out when left', async () => {
    const { input, widthMm, field } = await open('inch');
    await input.setValue("1' 11 5/8");
    expect(widthMm.value).toBe('600.075');
    expect(await field.getTextHints()).toEqual(['23 5/8"']);
    await input.blur();
    expect(await input.getValue()).toBe('23 5/8"');
  });

  it('keeps what no mark of the rule shows exactly, and says about', async () => {
    const { input, widthMm, field } = await open('inch');
    await input.setValue('600 mm');
    expect(widthMm.value).toBe('600');
    expect((await field.getTextHints())[0]).toMatch(/^about 23 /);
    await input.blur();
    expect(await input.getValue()).toBe('600 mm');
  });

  it('reads a bare number in the unit of the shop', async () => {
    const { input, widthMm } = await open('metric');
    await input.setValue('600');
    expect(widthMm.value).toBe('600');
    await input.blur();
    expect(await input.getValue()).toBe('600 mm');
  });

  it('keeps what cannot be read, and says so', async () => {
    const { input, widthMm, field } = await open('inch');
    await input.setValue('wide');
    await input.blur();
    expect(widthMm.valid).toBe(false);
    expect(await input.getValue()).toBe('wide');
    expect(await field.getTextErrors()).toEqual(['Give a length, such as 23 5/8 or 600 mm.']);
  });

  it('gives null for an empty field', async () => {
    const { input, widthMm } = await open('inch');
    await input.setValue('');
    expect(widthMm.value).toBeNull();
    expect(widthMm.valid).toBe(true);
  });
});
