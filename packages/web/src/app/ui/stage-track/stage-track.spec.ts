import { TestBed } from '@angular/core/testing';
import { provideIcons } from '../../testing/icons';
import { StageTrack } from './stage-track';

async function open(reachable: string[] = []) {
  TestBed.configureTestingModule({ providers: [provideIcons()] });
  const fixture = TestBed.createComponent(StageTrack);
  fixture.componentRef.setInput('stages', [
    { key: 'measured', name: 'Measured' },
    { key: 'building', name: 'Building' },
    { key: 'closed', name: 'Closed' },
  ]);
  fixture.componentRef.setInput('current', 'building');
  fixture.componentRef.setInput('reachable', reachable);
  await fixture.whenStable();
  return { fixture, element: fixture.nativeElement as HTMLElement };
}

describe('StageTrack', () => {
  it('tells what is done, where it stands and what is ahead', async () => {
    const { element } = await open();
    const steps = [...element.querySelectorAll('li')];
    expect(steps.map((step) => step.className)).toEqual(['done', 'current', 'ahead']);
    expect(steps.map((step) => step.getAttribute('aria-current'))).toEqual([null, 'step', null]);
  });

  it('lets only reachable stages be picked', async () => {
    const { element, fixture } = await open(['closed']);
    const picked: string[] = [];
    fixture.componentInstance.picked.subscribe((key) => picked.push(key));
    const buttons = [...element.querySelectorAll('button')];
    expect(buttons.map((button) => button.textContent?.trim())).toEqual(['Closed']);
    buttons[0]?.click();
    expect(picked).toEqual(['closed']);
  });
});
