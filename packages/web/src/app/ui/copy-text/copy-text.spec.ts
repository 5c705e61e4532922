import { Clipboard } from '@angular/cdk/clipboard';
import { TestBed } from '@angular/core/testing';
import { Notices } from '../../platform/page/notices';
import { provideIcons } from '../../testing/icons';
import { CopyText } from './copy-text';

async function press(copied: boolean) {
  const copy = jest.fn(() => copied);
  const say = jest.fn();
  TestBed.configureTestingModule({
    providers: [
      provideIcons(),
      { provide: Clipboard, useValue: { copy } },
      { provide: Notices, useValue: { say } },
    ],
  });
  const fixture = TestBed.createComponent(CopyText);
  fixture.componentRef.setInput('text', 'https://shop.example.test/c/secret');
  fixture.componentRef.setInput('what', 'the link');
  await fixture.whenStable();
  const button = (fixture.nativeElement as HTMLElement).querySelector('button');
  button?.click();
  return { copy, say, name: button?.getAttribute('aria-label') };
}

describe('CopyText', () => {
  it('copies and says so', async () => {
    const { copy, say, name } = await press(true);
    expect(name).toBe('Copy the link');
    expect(copy).toHaveBeenCalledWith('https://shop.example.test/c/secret');
    expect(say).toHaveBeenCalledWith('Copied.');
  });

  it('says when the browser refuses', async () => {
    expect((await press(false)).say).toHaveBeenCalledWith('This browser does not allow copying.');
  });
});
