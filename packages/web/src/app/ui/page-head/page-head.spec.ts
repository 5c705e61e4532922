import { ChangeDetectionStrategy, Component } from '@angular/core';
import { Title } from '@angular/platform-browser';
import { TestBed } from '@angular/core/testing';
import { openShopScreen } from '../../testing/shop-screen';
import { PageHead } from './page-head';

@Component({
  selector: 'bm-head-test',
  imports: [PageHead],
  template: `
    <bm-page-head number="Jobs" backTo="/jobs" name="Mudroom lockers">
      <span bmFacts>Quarry Road house</span>
      <button type="button">Bill</button>
    </bm-page-head>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Host {}

describe('PageHead', () => {
  it('has the one heading, the facts, the actions and the way back', async () => {
    const { element } = await openShopScreen([{ path: 'jobs/7', component: Host }], '/jobs/7');
    expect([...element.querySelectorAll('h1')].map(({ textContent }) => textContent)).toEqual([
      'Mudroom lockers',
    ]);
    expect(element.querySelector('.facts')?.textContent).toBe('Quarry Road house');
    expect(element.querySelector('.actions')?.textContent).toContain('Bill');
    expect(element.querySelector('a')?.getAttribute('href')).toBe('/jobs');
  });

  it('names the window after the thing and its shop', async () => {
    const { fixture } = await openShopScreen([{ path: 'jobs/7', component: Host }], '/jobs/7');
    await fixture.whenStable();
    expect(TestBed.inject(Title).getTitle()).toBe('Mudroom lockers · Northgrain Cabinets');
  });
});
