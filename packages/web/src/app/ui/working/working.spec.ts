import { TestKey } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { OverlayContainer } from '@angular/cdk/overlay';
import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideIcons } from '../../testing/icons';
import { Working } from './working';
import { WorkingHarness } from './working.harness';

@Component({
  selector: 'bm-working-test',
  imports: [Working],
  template: `<bm-working of="Material" total="$623.00" [lines]="lines">$623.00</bm-working>`,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Host {
  readonly lines = [
    { name: '3/4 birch ply', note: '7 sheets', figure: '$581.00' },
    { name: '1/4 oak ply', figure: '$42.00' },
  ];
}

async function open() {
  TestBed.configureTestingModule({ providers: [provideIcons()] });
  const fixture = TestBed.createComponent(Host);
  document.body.append(fixture.nativeElement as HTMLElement);
  const loader = TestbedHarnessEnvironment.documentRootLoader(fixture);
  return { working: await loader.getHarness(WorkingHarness), overlay: TestBed.inject(OverlayContainer) };
}

describe('Working', () => {
  it('says what its figure opens, and shows nothing before', async () => {
    const { working } = await open();
    expect(await working.figureText()).toBe('$623.00, show the working of Material');
    expect(await working.lines()).toBeNull();
  });

  it('lists what the figure is made of, with its total', async () => {
    const { working } = await open();
    await working.press();
    expect(await working.lines()).toEqual([
      ['3/4 birch ply 7 sheets', '$581.00'],
      ['1/4 oak ply', '$42.00'],
      ['Material', '$623.00'],
    ]);
  });

  it('closes by its button and by Esc', async () => {
    const { working } = await open();
    await working.press();
    await working.close();
    expect(await working.lines()).toBeNull();
    await working.press();
    await working.sendKeys(TestKey.ESCAPE);
    expect(await working.lines()).toBeNull();
  });
});
