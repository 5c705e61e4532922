import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatFormFieldHarness } from '@angular/material/form-field/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { MatSelectHarness } from '@angular/material/select/testing';
import { Router } from '@angular/router';
import { buildLead } from '@bookmatch/common/testing/build-lead';
import { nextId } from '@bookmatch/common/testing/ids';
import { openShopScreen } from '../../testing/shop-screen';
import leadsRoutes from '../leads.routes';

const routes = [{ path: 'leads', children: leadsRoutes }];

async function open(url: string) {
  const screen = await openShopScreen(routes, url);
  const loader = TestbedHarnessEnvironment.documentRootLoader(screen.fixture);
  const field = (name: string) =>
    loader.getHarness(MatInputHarness.with({ selector: `[formControlName=${name}]` }));
  const type = async (name: string, text: string) => (await field(name)).setValue(text);
  const errorsOf = async (floatingLabelText: string) =>
    (await loader.getHarness(MatFormFieldHarness.with({ floatingLabelText }))).getTextErrors();
  const press = async (text: string) => (await loader.getHarness(MatButtonHarness.with({ text }))).click();
  return { ...screen, loader, field, type, errorsOf, press };
}

describe('LeadForm', () => {
  it('asks for what the server would, at its field', async () => {
    const { press, errorsOf, http, shop } = await open('/leads/new');
    await press('Save lead');
    expect(await errorsOf('Title')).toEqual(['The title cannot be empty.']);
    expect(await errorsOf('Where it came from')).toEqual(['Choose where the lead came from.']);
    http.expectNone(shop('/leads'));
  });

  it('takes in a lead and opens it', async () => {
    const { press, type, loader, http, shop, fixture } = await open('/leads/new');
    await type('title', 'Mudroom lockers');
    await type('contactName', 'Wren Halloway');
    await type('expectedCents', '14,000');
    await type('nextStepOn', '2027-01-14');
    await (await loader.getHarness(MatSelectHarness)).clickOptions({ text: 'Referral' });
    await press('Save lead');
    const request = http.expectOne(shop('/leads'));
    expect(request.request.body).toMatchObject({
      title: 'Mudroom lockers',
      source: 'referral',
      expectedCents: 1_400_000,
      nextStepOn: '2027-01-14',
      customerId: null,
    });
    const lead = buildLead();
    request.flush(lead);
    await fixture.whenStable();
    expect(TestBed.inject(Router).url).toBe(`/leads/${lead.id}`);
  });

  it('starts with who the customer is, when it is for one the shop knows', async () => {
    const customerId = nextId();
    const { http, shop, field, element, fixture } = await open(`/leads/new?customerId=${customerId}`);
    http.expectOne(shop(`/customers/${customerId}`)).flush({
      id: customerId,
      version: 1,
      kind: 'homeowner',
      name: 'Ines Calder',
      company: '',
      email: 'ines@example.test',
      phone: '555 0100',
      billingAddress: { street: '', street2: '', city: '', region: '', postalCode: '' },
      taxExempt: false,
      exemptionCertificate: '',
      notes: '',
      archivedAt: null,
      createdAt: '2026-04-01T12:00:00.000Z',
      sites: [],
    });
    await fixture.whenStable();
    expect(await (await field('contactName')).getValue()).toBe('Ines Calder');
    expect(element.textContent).toContain('For Ines Calder');
  });

  it('keeps what was typed in a conflict, tells what changed, and saves over it knowingly', async () => {
    const lead = buildLead();
    const path = `/leads/${lead.id}`;
    const { http, shop, press, type, field, element, fixture } = await open(`${path}/edit`);
    http.expectOne(shop(path)).flush(lead);
    http.expectOne(shop(`${path}/notes`)).flush({ rows: [] });
    await fixture.whenStable();
    await type('phone', '555 0199');
    await press('Save lead');
    const stale = {
      type: '',
      title: '',
      status: 412,
      code: 'stale-version',
      detail: 'Somebody changed this.',
    };
    http.expectOne({ url: shop(path), method: 'PATCH' }).flush(stale, { status: 412, statusText: '' });
    http.expectOne({ url: shop(path), method: 'GET' }).flush({ ...lead, version: 2, company: 'Wren LLC' });
    await fixture.whenStable();
    expect(element.textContent).toContain('changed this meanwhile: company.');
    expect(await (await field('phone')).getValue()).toBe('555 0199');
    await press('Save lead');
    const { request } = http.expectOne({ url: shop(path), method: 'PATCH' });
    expect(request.headers.get('If-Match')).toBe('"2"');
  });
});
