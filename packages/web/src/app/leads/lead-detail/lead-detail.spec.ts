import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatDialogHarness } from '@angular/material/dialog/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { MatRadioButtonHarness } from '@angular/material/radio/testing';
import { Router } from '@angular/router';
import type { Lead } from '@bookmatch/common/leads/leads-contract';
import { buildLead } from '@bookmatch/common/testing/build-lead';
import { nextId } from '@bookmatch/common/testing/ids';
import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import leadsRoutes from '../leads.routes';

const routes = [
  { path: 'leads', children: leadsRoutes },
  { path: 'estimates/:id', children: [] },
];

async function open(fields: Partial<Lead> = {}, role: 'owner' | 'bookkeeper' = 'owner') {
  const lead = buildLead(fields);
  const path = `/leads/${lead.id}`;
  const screen = await openShopScreen(routes, path, buildMembership({ role }));
  screen.http.expectOne(screen.shop(path)).flush(lead);
  screen.http.expectOne(screen.shop(`${path}/notes`)).flush({ rows: [] });
  await screen.fixture.whenStable();
  const loader = TestbedHarnessEnvironment.documentRootLoader(screen.fixture);
  const press = async (text: string) => (await loader.getHarness(MatButtonHarness.with({ text }))).click();
  const type = async (selector: string, text: string) =>
    (await loader.getHarness(MatInputHarness.with({ selector }))).setValue(text);
  const actions = () => screen.element.querySelector('bm-page-head .actions')?.textContent ?? '';
  return { ...screen, lead, path, loader, press, type, actions };
}

const customer = { customerId: nextId(), customerName: 'Wren Halloway' };

describe('LeadDetail', () => {
  it('marks a next step that is late', async () => {
    const { element } = await open({ nextStepOn: '2020-01-14' });
    expect(element.querySelector('bm-next-step-panel bm-panel')?.className).toContain('overdue');
    expect(element.querySelector('bm-next-step-panel')?.textContent).toMatch(/days late/);
  });

  it.each([
    ['not a customer yet', {}, 'Make a customer'],
    ['a customer', customer, 'Start an estimate'],
    [
      'with an estimate',
      { ...customer, estimates: [{ id: nextId(), number: 318, title: 'Lockers' }] },
      'Open estimate 318',
    ],
    ['lost', { stage: 'lost', lostReason: 'price' }, 'Reopen'],
  ] as const)('leads on, when it is %s', async (_, fields, expected) => {
    const { actions } = await open(fields as Partial<Lead>);
    expect(actions()).toContain(expected);
  });

  it('notes what was done and plans what comes next, with the version that was read', async () => {
    const { press, type, http, shop, path, lead, element, fixture } = await open();
    await press('Done, what is next');
    await type('[formControlName=nextStep]', 'Measure the mudroom');
    await type('[formControlName=nextStepOn]', '2027-01-20');
    await press('Save');
    const note = http.expectOne({ url: shop(`${path}/notes`), method: 'POST' });
    expect(note.request.body).toEqual({ body: `Done: ${lead.nextStep}` });
    const step = http.expectOne({ url: shop(path), method: 'PATCH' });
    expect(step.request.headers.get('If-Match')).toBe('"1"');
    expect(step.request.body).toEqual({ nextStep: 'Measure the mudroom', nextStepOn: '2027-01-20' });
    step.flush({ ...lead, version: 2, nextStep: 'Measure the mudroom' });
    await fixture.whenStable();
    expect(element.querySelector('bm-next-step-panel form')).toBeNull();
    expect(element.querySelector('bm-next-step-panel .step')?.textContent).toBe('Measure the mudroom');
  });

  it('adds a note to the timeline and empties the field, but keeps it when the server refuses', async () => {
    const { press, type, http, shop, path, element, loader, fixture } = await open();
    await type('textarea', 'Wants white oak');
    await press('Add note');
    const url = { url: shop(`${path}/notes`), method: 'POST' };
    http.expectOne(url).flush('', { status: 500, statusText: '' });
    const field = () => loader.getHarness(MatInputHarness.with({ selector: 'textarea' }));
    expect(await (await field()).getValue()).toBe('Wants white oak');
    await press('Add note');
    const note = {
      id: nextId(),
      body: 'Wants white oak',
      by: 'Ada Fenwick',
      createdAt: '2027-01-11T15:00:00.000Z',
    };
    http.expectOne(url).flush(note);
    await fixture.whenStable();
    expect(await (await field()).getValue()).toBe('');
    expect(element.querySelector('bm-timeline ol')?.textContent).toContain('Wants white oak');
  });

  it('makes a customer of what the lead knows, and the site with it', async () => {
    const { press, loader, http, shop, path, lead, element, fixture } = await open({
      siteAddress: { street: '4 Quarry Road', street2: '', city: 'Stowe', region: 'VT', postalCode: '05672' },
    });
    await press('Make a customer');
    await press('Make the customer');
    const request = http.expectOne(shop(`${path}/convert`));
    expect(request.request.body).toMatchObject({
      customer: { kind: 'homeowner', name: 'Wren Halloway', email: 'wren@example.com' },
      site: { name: '4 Quarry Road', address: { city: 'Stowe' } },
    });
    expect(request.request.body as object).not.toHaveProperty('customerId');
    request.flush({ ...lead, ...customer, version: 2 });
    await fixture.whenStable();
    expect(await loader.getAllHarnesses(MatDialogHarness)).toHaveLength(0);
    expect(element.textContent).toContain('Start an estimate');
  });

  it('does not tie a lead to nobody', async () => {
    const { press, loader, http, shop, path } = await open();
    await press('Make a customer');
    await (await loader.getHarness(MatRadioButtonHarness.with({ label: 'A customer we have' }))).check();
    await press('Tie to the customer');
    http.expectNone(shop(`${path}/convert`));
    expect(await (await loader.getHarness(MatDialogHarness)).getText()).toContain(
      'Choose a customer from the list.',
    );
  });

  it('starts an estimate and goes on to it', async () => {
    const { press, http, shop, path, fixture } = await open(customer);
    await press('Start an estimate');
    await press('Start the estimate');
    const estimateId = nextId();
    const request = http.expectOne(shop(`${path}/estimates`));
    expect(request.request.body).toEqual({ title: 'Mudroom lockers and bench' });
    request.flush({ estimateId });
    await fixture.whenStable();
    expect(TestBed.inject(Router).url).toBe(`/estimates/${estimateId}`);
  });

  it('offers the bookkeeper nothing to change', async () => {
    const { element, actions } = await open({}, 'bookkeeper');
    expect(actions().trim()).toBe('');
    expect(element.querySelectorAll('bm-timeline form, bm-next-step-panel button')).toHaveLength(0);
  });
});
