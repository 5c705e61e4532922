import { TestBed } from '@angular/core/testing';
import { MatDialogRef } from '@angular/material/dialog';
import { Router } from '@angular/router';
import { openShopScreen } from '../../testing/shop-screen';
import { QuickFind } from './quick-find';

const found = [
  {
    kind: 'customer',
    id: '01940000-0000-7000-8000-000000000001',
    title: 'Quarry Road house',
    line: 'Stowe',
    number: null,
  },
  {
    kind: 'job',
    id: '01940000-0000-7000-8000-000000000002',
    title: 'Mudroom lockers',
    line: 'Building',
    number: 1042,
  },
];

async function open() {
  const dialog = { close: jest.fn() };
  const ref = { provide: MatDialogRef, useValue: dialog };
  const routes = [{ path: 'find', component: QuickFind }];
  const screen = await openShopScreen(routes, '/find', undefined, [ref]);
  const input = screen.element.querySelector('input')!;
  const settle = async () => {
    await new Promise((resolve) => setTimeout(resolve, 250));
    screen.fixture.detectChanges();
  };
  const type = async (text: string) => {
    input.value = text;
    input.dispatchEvent(new Event('input'));
    await settle();
  };
  const press = async (key: string) => {
    input.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true }));
    await screen.fixture.whenStable();
  };
  /** The pause in typing may take longer than its time on a busy machine. */
  const asked = async () => {
    for (let tries = 0; tries < 100; tries += 1) {
      const requests = screen.http.match((request) => request.url === screen.shop('/find'));
      expect(requests.length).toBeLessThan(2);
      if (requests[0]) return requests[0];
      await settle();
    }
    throw new Error('Nothing was asked.');
  };
  const answer = async (rows: object[]) => {
    (await asked()).flush({ rows });
    await screen.fixture.whenStable();
  };
  const chosen = () => screen.element.querySelector('[aria-selected=true] .title')?.textContent;
  return { ...screen, dialog, input, type, press, answer, chosen };
}

describe('QuickFind', () => {
  it('asks after a pause in typing, once, and shows what was found', async () => {
    const { type, answer, element, input } = await open();
    input.value = 'q';
    input.dispatchEvent(new Event('input'));
    await type('quarry');
    await answer(found);
    expect(element.querySelectorAll('[role=option]')).toHaveLength(2);
    expect(element.textContent).toContain('Job 1042');
  });

  it('moves the choice by arrow keys, stays at the ends, and opens it by Enter', async () => {
    const { type, answer, press, chosen, dialog } = await open();
    const go = jest.spyOn(TestBed.inject(Router), 'navigateByUrl').mockResolvedValue(true);
    await type('quarry');
    await answer(found);
    await press('ArrowUp');
    expect(chosen()).toBe('Quarry Road house');
    await press('ArrowDown');
    await press('ArrowDown');
    expect(chosen()).toBe('Mudroom lockers');
    await press('Enter');
    expect(dialog.close).toHaveBeenCalled();
    expect(go).toHaveBeenCalledWith(`/jobs/${found[1]?.id}`);
  });

  it('opens nothing that was found for an earlier text', async () => {
    const { type, answer, press, input, dialog } = await open();
    await type('quarry');
    await answer(found);
    input.value = 'mudroom';
    input.dispatchEvent(new Event('input'));
    await press('Enter');
    expect(dialog.close).not.toHaveBeenCalled();
  });

  it('says what can be typed, and offers another try when finding fails', async () => {
    const { type, element, http, shop, fixture } = await open();
    expect(element.querySelector('[role=status]')?.textContent).toContain('Type a name');
    await type('quarry');
    const asked = () => http.expectOne((request) => request.url === shop('/find'));
    asked().flush('', { status: 500, statusText: '' });
    await fixture.whenStable();
    expect(element.textContent).toContain('Finding does not work right now.');
    element.querySelector<HTMLButtonElement>('[role=status] button')?.click();
    fixture.detectChanges();
    asked().flush({ rows: found });
    await fixture.whenStable();
    expect(element.querySelectorAll('[role=option]')).toHaveLength(2);
  });

  it('says when there is nothing, and asks nothing for an empty field', async () => {
    const { type, answer, element, http, shop } = await open();
    await type('zzz');
    await answer([]);
    expect(element.querySelector('[role=status]')?.textContent).toContain('Nothing found.');
    await type('   ');
    http.expectNone((request) => request.url === shop('/find'));
  });
});
