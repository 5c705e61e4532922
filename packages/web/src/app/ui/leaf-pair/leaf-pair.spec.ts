import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { moneyText } from '../formats/money-text';
import { LeafPair } from './leaf-pair';
import { LeafPairHarness } from './leaf-pair.harness';
import type { LeafRow } from './leaf-row';

const ROWS: LeafRow[] = [
  { key: 'sheet', name: 'Sheet goods', planned: 218_000, built: 206_100 },
  { key: 'solid', name: 'Solid stock', planned: 64_000, built: 74_800 },
  { key: 'install', name: 'Install', planned: 133_000, built: 0, note: 'not started' },
];

async function open() {
  const fixture = TestBed.createComponent(LeafPair);
  fixture.componentRef.setInput('label', 'Cost by kind');
  fixture.componentRef.setInput('rows', ROWS);
  fixture.componentRef.setInput('format', (cents: number) => moneyText(cents, 'USD', 'whole'));
  const pair = await TestbedHarnessEnvironment.harnessForFixture(fixture, LeafPairHarness);
  return { fixture, pair, element: fixture.nativeElement as HTMLElement };
}

describe('LeafPair', () => {
  it('reads as a table of planned, built and their difference, with the total', async () => {
    const { pair } = await open();
    expect(await pair.lines()).toEqual([
      ['Sheet goods', '$2,180', '$2,061', '\u2212$119'],
      ['Solid stock', '$640', '$748', '+$108'],
      ['Install', '$1,330', '$0', 'not started'],
      ['Total', '$4,150', '$2,809', '\u2212$1,341'],
    ]);
  });

  it('names the table and its rows for a screen reader', async () => {
    const { element, fixture } = await open();
    await fixture.whenStable();
    expect(element.querySelector('caption')?.textContent?.trim()).toBe('Cost by kind');
    expect(element.querySelectorAll('th[scope=row]')).toHaveLength(4);
  });

  it('marks over and under, and neither for what has not begun or when more is good', async () => {
    const { element, fixture } = await open();
    await fixture.whenStable();
    const tones = () =>
      [...element.querySelectorAll('tbody .difference')].map((cell) => cell.classList.item(1));
    expect(tones()).toEqual(['under', 'over', 'even']);
    fixture.componentRef.setInput('moreIsGood', true);
    await fixture.whenStable();
    expect(tones()).toEqual(['even', 'even', 'even']);
  });

  it('opens the working of a built figure', async () => {
    const { fixture, pair } = await open();
    fixture.componentRef.setInput('opens', true);
    const opened: LeafRow[] = [];
    fixture.componentInstance.opened.subscribe((row) => opened.push(row));
    await pair.openWorking(1);
    expect(opened.map(({ key }) => key)).toEqual(['solid']);
  });
});
