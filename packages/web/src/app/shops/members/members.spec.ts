import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatDialogHarness } from '@angular/material/dialog/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { MatMenuHarness } from '@angular/material/menu/testing';
import { MatRadioButtonHarness } from '@angular/material/radio/testing';
import type { Membership } from '@bookmatch/common/accounts/accounts-contract';
import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import shopsRoutes from '../shops.routes';
import { buildInvitation, buildMember } from '../testing/build-shop';

const routes = [{ path: 'settings', children: shopsRoutes }];
const hand = buildMember({
  id: '0190a1b2-0000-7000-8000-000000000902',
  version: 4,
  name: 'Pell Arkwright',
  role: 'crew',
  joinedAt: '2026-02-01T15:00:00.000Z',
  laborCostCentsPerHour: 4_250,
});

async function open(membership: Partial<Membership> = {}) {
  const screen = await openShopScreen(routes, '/settings/members', buildMembership(membership));
  const { http, shop, fixture } = screen;
  http.expectOne(shop('/members')).flush({ rows: [buildMember(), hand] });
  for (const request of http.match(shop('/invitations'))) request.flush({ rows: [buildInvitation()] });
  await fixture.whenStable();
  const loader = TestbedHarnessEnvironment.documentRootLoader(fixture);
  const press = async (text: string) => (await loader.getHarness(MatButtonHarness.with({ text }))).click();
  const menu = async (nth: number, item: RegExp) => {
    const found = (await loader.getAllHarnesses(MatMenuHarness))[nth];
    await found?.open();
    await found?.clickItem({ text: item });
  };
  const dialogs = () => loader.getAllHarnesses(MatDialogHarness);
  return { ...screen, loader, press, menu, dialogs };
}

describe('Members', () => {
  it('lists who belongs to the shop and who is invited', async () => {
    const { element } = await open();
    expect(element.textContent).toContain('Ada Fenwick');
    expect(element.textContent).toContain('$42.50');
    expect(element.textContent).toContain('newhand@example.test');
  });

  it('invites with a role that says what it sees', async () => {
    const { press, loader, http, shop, dialogs, element, fixture } = await open();
    await press('Invite somebody');
    await press('Send the invitation');
    expect(await (await dialogs())[0]?.getText()).toContain('not an e-mail address');
    await (await loader.getHarness(MatInputHarness)).setValue('Lead@Example.test');
    await (await loader.getHarness(MatRadioButtonHarness.with({ label: /Lead hand.*no prices/ }))).check();
    await press('Send the invitation');
    const request = http.expectOne(shop('/invitations'));
    expect(request.request.body).toEqual({ email: 'lead@example.test', role: 'lead-hand' });
    request.flush(
      buildInvitation({ id: '0190a1b2-0000-7000-8000-000000000702', email: 'lead@example.test' }),
    );
    await fixture.whenStable();
    expect(await dialogs()).toHaveLength(0);
    expect(element.textContent).toContain('lead@example.test');
  });

  it('keeps the dialog and what was typed when the server refuses', async () => {
    const { press, loader, http, shop, dialogs } = await open();
    await press('Invite somebody');
    await (await loader.getHarness(MatInputHarness)).setValue('ada@example.test');
    await press('Send the invitation');
    const refusal = { type: '', title: '', status: 409, code: 'conflict', detail: 'A member already.' };
    http.expectOne(shop('/invitations')).flush(refusal, { status: 409, statusText: '' });
    expect(await (await dialogs())[0]?.getText()).toContain('A member already.');
    expect(await (await loader.getHarness(MatInputHarness)).getValue()).toBe('ada@example.test');
  });

  it('changes a role with the version that was read', async () => {
    const { menu, loader, press, http, shop, element, fixture } = await open();
    await menu(1, /Change role/);
    await (await loader.getHarness(MatRadioButtonHarness.with({ label: /^Bookkeeper/ }))).check();
    await press('Change the role');
    const request = http.expectOne(shop(`/members/${hand.id}/role`));
    expect(request.request.headers.get('If-Match')).toBe('"4"');
    expect(request.request.body).toEqual({ role: 'bookkeeper' });
    request.flush({ ...hand, role: 'bookkeeper', version: 5 });
    await fixture.whenStable();
    expect(element.textContent).toContain('Bookkeeper');
  });

  it('sets what an hour costs, and unsets it', async () => {
    const { menu, loader, press, http, shop } = await open();
    await menu(1, /Cost of an hour/);
    await (await loader.getHarness(MatInputHarness)).setValue('');
    await press('Save');
    expect(http.expectOne(shop(`/members/${hand.id}/labor-cost`)).request.body).toEqual({
      laborCostCentsPerHour: null,
    });
  });

  it('removes after asking, and shows why not', async () => {
    const { menu, press, http, shop, element, fixture } = await open();
    await menu(1, /Remove/);
    await press('Remove');
    const request = http.expectOne(shop(`/members/${hand.id}`));
    expect(request.request.method).toBe('DELETE');
    request.flush(null, { status: 204, statusText: '' });
    await fixture.whenStable();
    expect(element.textContent).not.toContain('Pell Arkwright');
    await menu(0, /Leave the shop/);
    await press('Leave');
    const refusal = { type: '', title: '', status: 409, code: 'conflict', detail: 'A shop needs an owner.' };
    http.expectOne(shop(`/members/${buildMember().id}`)).flush(refusal, { status: 409, statusText: '' });
    await fixture.whenStable();
    expect(document.body.textContent).toContain('A shop needs an owner.');
  });

  it('sends an invitation again, and withdraws one', async () => {
    const { menu, press, http, shop, element, fixture } = await open();
    const { id } = buildInvitation();
    await menu(2, /Send again/);
    http.expectOne(shop(`/invitations/${id}/resend`)).flush(buildInvitation());
    await menu(2, /Withdraw/);
    await press('Withdraw');
    http.expectOne(shop(`/invitations/${id}`)).flush(null, { status: 204, statusText: '' });
    await fixture.whenStable();
    expect(element.textContent).not.toContain('newhand@example.test');
  });

  it('lets the bookkeeper read, and change nobody', async () => {
    const { element, loader } = await open({ role: 'bookkeeper' });
    expect(element.textContent).toContain('$42.50');
    expect(element.textContent).not.toContain('newhand@example.test');
    expect(await loader.getAllHarnesses(MatMenuHarness)).toHaveLength(0);
  });

  it('leaves an owner of a lapsed shop one thing to do: to remove somebody', async () => {
    const subscription = { access: 'read-only', banner: 'read-only', daysLeft: null } as const;
    const { loader } = await open({ subscription });
    const [menu] = await loader.getAllHarnesses(MatMenuHarness);
    await menu?.open();
    const items = (await menu?.getItems()) ?? [];
    expect(await Promise.all(items.map((item) => item.getText()))).toEqual(['Leave the shop']);
    expect(await loader.getAllHarnesses(MatButtonHarness.with({ text: /Invite/ }))).toHaveLength(0);
  });
});
