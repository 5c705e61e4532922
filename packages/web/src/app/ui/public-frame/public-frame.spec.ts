import { TestBed } from '@angular/core/testing';
import { Title } from '@angular/platform-browser';
import { PublicFrame } from './public-frame';

describe('PublicFrame', () => {
  it("carries the shop's name and not ours, in the page and in the title", async () => {
    const fixture = TestBed.createComponent(PublicFrame);
    fixture.componentRef.setInput('shopName', 'Northgrain Cabinets');
    fixture.componentRef.setInput('about', 'Estimate 318');
    fixture.componentRef.setInput('contact', ['(802) 555-0100']);
    await fixture.whenStable();
    const text = (fixture.nativeElement as HTMLElement).textContent ?? '';
    expect(text).toContain('Northgrain Cabinets');
    expect(text).toContain('(802) 555-0100');
    expect(text).not.toContain('Bookmatch');
    expect(TestBed.inject(Title).getTitle()).toBe('Estimate 318 · Northgrain Cabinets');
  });
});
