import { TestBed } from '@angular/core/testing';
import { ChoiceField } from './choice-field';

describe('ChoiceField', () => {
  it('shows the choice of the address and tells another one', async () => {
    const fixture = TestBed.createComponent(ChoiceField);
    fixture.componentRef.setInput('label', 'Kind');
    fixture.componentRef.setInput('choices', [
      { value: '', name: 'Every kind' },
      { value: 'designer', name: 'Designer' },
    ]);
    fixture.componentRef.setInput('value', 'designer');
    await fixture.whenStable();
    const chosen: string[] = [];
    fixture.componentInstance.chosen.subscribe((value) => chosen.push(value));
    const select = (fixture.nativeElement as HTMLElement).querySelector('select')!;
    expect(select.value).toBe('designer');
    expect(select.getAttribute('aria-label')).toBe('Kind');
    select.value = '';
    select.dispatchEvent(new Event('change'));
    expect(chosen).toEqual(['']);
  });
});
