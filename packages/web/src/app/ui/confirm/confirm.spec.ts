import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { MATERIAL_ANIMATIONS } from '@angular/material/core';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatDialogHarness } from '@angular/material/dialog/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { Confirm } from './confirm';
import type { ConfirmAnswer, ConfirmQuestion } from './confirm-question';

@Component({ selector: 'bm-confirm-test', template: '', changeDetection: ChangeDetectionStrategy.OnPush })
class Host {
  readonly confirm = inject(Confirm);
}

const question: ConfirmQuestion = { title: 'Archive Wren?', text: 'It leaves the lists.', action: 'Archive' };

async function ask(asked: ConfirmQuestion) {
  TestBed.configureTestingModule({
    providers: [{ provide: MATERIAL_ANIMATIONS, useValue: { animationsDisabled: true } }],
  });
  const fixture = TestBed.createComponent(Host);
  const loader = TestbedHarnessEnvironment.documentRootLoader(fixture);
  const answers: (ConfirmAnswer | undefined)[] = [];
  fixture.componentInstance.confirm.ask(asked).subscribe((answer) => answers.push(answer));
  const dialog = await loader.getHarness(MatDialogHarness);
  const press = async (text: string) => (await dialog.getHarness(MatButtonHarness.with({ text }))).click();
  return { answers, dialog, press, loader };
}

describe('Confirm', () => {
  it('asks in its own words and answers yes', async () => {
    const { answers, dialog, press } = await ask(question);
    expect(await dialog.getTitleText()).toBe('Archive Wren?');
    await press('Archive');
    expect(answers).toEqual([{ reason: '' }]);
  });

  it('answers undefined for no, and for Esc', async () => {
    const first = await ask(question);
    await first.press('Cancel');
    expect(first.answers).toEqual([undefined]);
    TestBed.resetTestingModule();
    const second = await ask(question);
    await second.dialog.close();
    expect(second.answers).toEqual([undefined]);
  });

  it('does not go on without a reason that is required', async () => {
    const { answers, dialog, press } = await ask({ ...question, reason: { label: 'Why', required: true } });
    await press('Archive');
    expect(answers).toEqual([]);
    await (await dialog.getHarness(MatInputHarness)).setValue('  Moved away ');
    await press('Archive');
    expect(answers).toEqual([{ reason: 'Moved away' }]);
  });
});
