import { TestBed } from '@angular/core/testing';
import { provideIcons } from '../../testing/icons';
import { SearchField } from './search-field';

async function open() {
  TestBed.configureTestingModule({ providers: [provideIcons()] });
  const fixture = TestBed.createComponent(SearchField);
  fixture.componentRef.setInput('label', 'Search customers');
  fixture.componentRef.setInput('value', 'wren');
  await fixture.whenStable();
  const searched: string[] = [];
  fixture.componentInstance.searched.subscribe((text) => searched.push(text));
  const input = (fixture.nativeElement as HTMLElement).querySelector('input')!;
  const type = (text: string) => {
    input.value = text;
    input.dispatchEvent(new Event('input'));
  };
  return { input, type, searched, fixture };
}

describe('SearchField', () => {
  const pause = (ms: number) => new Promise((resolve) => setTimeout(resolve, ms));

  it('tells the last of what was typed, once, after a pause', async () => {
    const { type, searched } = await open();
    type('q');
    type('qu');
    expect(searched).toEqual([]);
    await pause(350);
    expect(searched).toEqual(['qu']);
  });

  it('tells at once on Enter, and not again after the pause', async () => {
    const { type, input, searched } = await open();
    type('quarry');
    input.dispatchEvent(new KeyboardEvent('keydown', { key: 'Enter' }));
    await pause(350);
    expect(searched).toEqual(['quarry']);
  });

  it('says nothing on Enter when nothing changed', async () => {
    const { input, searched } = await open();
    input.dispatchEvent(new KeyboardEvent('keydown', { key: 'Enter' }));
    expect(searched).toEqual([]);
  });

  it('forgets what was typed when the screen goes', async () => {
    const { type, searched, fixture } = await open();
    type('q');
    fixture.destroy();
    await pause(350);
    expect(searched).toEqual([]);
  });
});
