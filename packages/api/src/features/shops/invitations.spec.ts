import type { Client } from '../../../test/harness/client.js';
import { letterTo, tokenIn } from '../../../test/harness/letters.js';
import { PASSWORD, TestApi, type TestShop } from '../../../test/harness/test-api.js';
import { systemStamp } from '../../platform/database/stamp.js';
import { openConfirmedAccount } from '../accounts/accounts-public.js';

type Listed = { id: string; email: string; invitedBy: string; expiresAt: string };

describe('invitations', () => {
  let api: TestApi;
  let shop: TestShop;
  let count = 0;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp({ shopName: 'Juniper Cabinet Works' });
  });
  afterAll(() => api.close());

  const somewhere = () => `guest${(count += 1)}@mail.test`;
  const invite = (email: string, role = 'crew', by: TestShop = shop) =>
    by.owner.post('/invitations', { email, role });
  const token = async (email: string) => tokenIn(await letterTo(api, email, 'invites you'));
  const open = async (by: TestShop = shop) =>
    ((await by.owner.get('/invitations')).body as { rows: Listed[] }).rows;
  const offer = (secret: string) => api.browser().post('/account/invitation-offer', { token: secret });
  const accept = (secret: string, fields: object = {}, browser: Client = api.browser()) =>
    browser.post('/api/account/accept-invitation', { token: secret, ...fields });
  const newcomer = { name: 'Pell Arkwright', password: PASSWORD };

  it('reach somebody new, who joins with a name and a password and is signed in', async () => {
    const email = somewhere();
    const answer = await invite(email.toUpperCase(), 'lead-hand');
    expect(answer.status).toBe(201);
    expect(answer.body).toMatchObject({
      email,
      role: 'lead-hand',
      invitedBy: expect.stringContaining('Owner') as string,
    });
    const letter = await letterTo(api, email, 'invites you to Juniper Cabinet Works');
    expect(letter?.text).toContain('Lead hand');
    expect((await offer(tokenIn(letter))).body).toMatchObject({
      shopName: 'Juniper Cabinet Works',
      email,
      role: 'lead-hand',
      needsAccount: true,
    });
    const browser = api.browser();
    const accepted = await accept(tokenIn(letter), newcomer, browser);
    expect(accepted.body).toMatchObject({
      person: { email, name: 'Pell Arkwright', emailConfirmed: true },
      memberships: [{ shopId: shop.id, role: 'lead-hand' }],
    });
    expect((await browser.get(`/shops/${shop.id}/members`)).status).toBe(200);
    expect((await open()).map((one) => one.email)).not.toContain(email);
    await api.signIn(email);
  });

  it('ask somebody new for both name and password, and keep the link alive meanwhile', async () => {
    const email = somewhere();
    await invite(email);
    const secret = await token(email);
    const refused = await accept(secret);
    expect(refused.status).toBe(422);
    expect(refused.body).toMatchObject({ fields: [{ path: 'name' }, { path: 'password' }] });
    expect((await accept(secret, newcomer)).status).toBe(200);
  });

  it('are taken by somebody with an account after signing in, who then belongs to two shops', async () => {
    const other = await api.signUp();
    const { email } = await shop.join('bookkeeper');
    expect((await invite(email, 'crew', other)).status).toBe(201);
    const secret = await token(email);
    expect((await offer(secret)).body).toMatchObject({ needsAccount: false });
    const stranger = await accept(secret, newcomer);
    expect([stranger.status, (stranger.body as { code: string }).code]).toEqual([401, 'not-signed-in']);
    const browser = await api.signIn(email);
    const { body } = await accept(secret, {}, browser);
    const roles = (body as { memberships: { shopId: string; role: string }[] }).memberships;
    expect(roles).toHaveLength(2);
    expect(roles.find(({ shopId }) => shopId === other.id)?.role).toBe('crew');
    expect((await browser.get(`/shops/${shop.id}/customers`)).status).toBe(200);
    expect((await browser.get(`/shops/${other.id}/customers`)).status).toBe(403);
  });

  it('are not taken by somebody signed in as somebody else', async () => {
    const email = somewhere();
    await invite(email, 'owner');
    const { client } = await shop.join('crew');
    const answer = await accept(await token(email), newcomer, client);
    expect(answer.status).toBe(409);
    expect((await client.get('/members')).status).toBe(403);
  });

  it('work once, also when clicked twice or by two at once', async () => {
    const email = somewhere();
    await invite(email);
    const secret = await token(email);
    const answers = await Promise.all([1, 2, 3].map(() => accept(secret, newcomer)));
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 410, 410]);
    const browser = await api.signIn(email);
    expect((await accept(secret, {}, browser)).status).toBe(200);
    expect((await accept(secret, newcomer)).status).toBe(410);
  });

  it('end after seven days, and can be sent again with a new link that ends the old one', async () => {
    const email = somewhere();
    const { body } = await invite(email);
    const first = await token(email);
    api.clock.forward({ days: 8 });
    shop = { ...shop, owner: (await api.signIn('owner1@shop.test')).below(`/api/shops/${shop.id}`) };
    expect([(await offer(first)).status, (await accept(first, newcomer)).status]).toEqual([410, 410]);
    expect((await open()).map((one) => one.email)).toContain(email);
    expect((await shop.owner.post(`/invitations/${(body as Listed).id}/resend`)).status).toBe(200);
    const second = await token(email);
    expect((await offer(first)).status).toBe(410);
    expect((await accept(second, newcomer)).status).toBe(200);
  });

  it('are not sent again at once, so that nobody is flooded', async () => {
    const email = somewhere();
    const { body } = await invite(email);
    const again = await shop.owner.post(`/invitations/${(body as Listed).id}/resend`);
    expect(again.status).toBe(429);
    expect(Number(again.headers['retry-after'])).toBeGreaterThan(0);
    expect(await api.lettersTo(email)).toHaveLength(1);
  });

  it('are one an address, also when sent twice at once, and none for a member', async () => {
    const email = somewhere();
    const answers = await Promise.all([1, 2, 3, 4].map(() => invite(email)));
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409, 409]);
    expect(await api.lettersTo(email)).toHaveLength(1);
    const member = await shop.join('crew');
    expect((await invite(member.email, 'owner')).status).toBe(409);
  });

  it('can be withdrawn, which makes the link worthless and the address free again', async () => {
    const email = somewhere();
    const { body } = await invite(email);
    const secret = await token(email);
    expect((await shop.owner.delete(`/invitations/${(body as Listed).id}`)).status).toBe(204);
    expect((await shop.owner.delete(`/invitations/${(body as Listed).id}`)).status).toBe(404);
    expect((await accept(secret, newcomer)).status).toBe(410);
    expect((await invite(email)).status).toBe(201);
  });

  it('bring back somebody who was removed, in the role now offered and as the same member', async () => {
    const { email, memberId } = await shop.join('bookkeeper');
    await shop.owner.delete(`/members/${memberId}`, 1);
    await invite(email, 'crew');
    const browser = await api.signIn(email);
    const { body } = await accept(await token(email), {}, browser);
    expect(body).toMatchObject({ memberships: [{ memberId, role: 'crew' }] });
  });

  it('take an address back from somebody who signed up with it and never proved it', async () => {
    const email = somewhere();
    const form = { shopName: 'Nobody Asked', timeZone: 'America/Chicago', unitSystem: 'inch' };
    const taken = { name: 'Mallory', email, password: 'password of mallory', ...form };
    await api.browser().post('/account/sign-up', taken);
    await api.product.outbox.drain();
    await invite(email);
    const secret = await token(email);
    expect((await offer(secret)).body).toMatchObject({ needsAccount: true });
    expect((await accept(secret, newcomer)).status).toBe(200);
    const old = await api.browser().post('/account/sign-in', { email, password: 'password of mallory' });
    expect(old.status).toBe(401);
  });

  it('replace no password when the address was confirmed between the look at it and its lock', async () => {
    const { email } = await shop.join('crew');
    const { work, clock } = api.platform;
    const opening = work.transaction(systemStamp('late', clock()), (scope) =>
      openConfirmedAccount(scope, { email, name: 'Mallory', passwordHash: 'of mallory' }),
    );
    await expect(opening).rejects.toMatchObject({ code: 'not-signed-in' });
    await api.signIn(email);
  });

  it('are sent by an owner alone, and of another shop do not exist here', async () => {
    const { body } = await invite(somewhere());
    const { id } = body as Listed;
    for (const role of ['bookkeeper', 'lead-hand', 'crew'] as const) {
      const { client } = await shop.join(role);
      const answers = [
        await client.get('/invitations'),
        await client.post('/invitations', { email: somewhere(), role: 'owner' }),
        await client.post(`/invitations/${id}/resend`),
        await client.delete(`/invitations/${id}`),
      ];
      expect(answers.map(({ status }) => status)).toEqual([403, 403, 403, 403]);
    }
    const stranger = await api.signUp();
    expect((await stranger.owner.post(`/invitations/${id}/resend`)).status).toBe(404);
    expect((await stranger.owner.delete(`/invitations/${id}`)).status).toBe(404);
    expect(await open(stranger)).toEqual([]);
  });

  it('show stored markup in the letter as text, and no header can be slipped in', async () => {
    const sly = await api.signUp({ shopName: '<b>Sly</b> & Co' });
    const email = somewhere();
    await invite(email, 'crew', sly);
    const letter = (await api.lettersTo(email)).at(-1);
    expect(letter?.html).toContain('&lt;b&gt;Sly&lt;/b&gt; &amp; Co');
    expect(letter?.html).not.toContain('<b>Sly');
    const split = await invite(`a@b.test\r\nBcc: all@b.test`, 'crew', sly);
    expect(split.status).toBe(422);
  });

  it('know nothing about a link that was never sent', async () => {
    expect((await offer('a'.repeat(43))).status).toBe(410);
    expect((await offer('short')).status).toBe(422);
  });
});
