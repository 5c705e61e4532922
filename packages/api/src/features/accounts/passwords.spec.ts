import type { Client } from '../../../test/harness/client.js';
import { letterTo, tokenIn } from '../../../test/harness/letters.js';
import { PASSWORD, TestApi, type TestShop } from '../../../test/harness/test-api.js';

const NEXT = 'quartersawn white oak';

describe('passwords', () => {
  let api: TestApi;
  let shop: TestShop;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp();
  });
  afterAll(() => api.close());

  const somebody = () => shop.join('crew');
  const asks = (email: string) => api.browser().post('/account/request-password-reset', { email });
  const resetToken = async (email: string) => tokenIn(await letterTo(api, email, 'Choose a new password'));
  const reset = (token: string, password = NEXT) =>
    api.browser().post('/account/reset-password', { token, password });
  const isIn = async (client: Client) => (await client.get('/api/account/session')).status === 200;
  const signsIn = async (email: string, password: string) =>
    (await api.browser().post('/account/sign-in', { email, password })).status;

  describe('a forgotten one', () => {
    it('is replaced through the letter, which ends every session', async () => {
      const { client, email } = await somebody();
      const elsewhere = await api.signIn(email);
      await asks(email.toUpperCase());
      expect((await reset(await resetToken(email))).status).toBe(204);
      expect([await isIn(client), await isIn(elsewhere)]).toEqual([false, false]);
      expect([await signsIn(email, PASSWORD), await signsIn(email, NEXT)]).toEqual([401, 200]);
      expect(await letterTo(api, email, 'Your password was changed')).toBeDefined();
    });

    it('has a link that works once, also when used twice at the same time', async () => {
      const { email } = await somebody();
      await asks(email);
      const token = await resetToken(email);
      const answers = await Promise.all([1, 2, 3, 4].map((n) => reset(token, `${NEXT} ${n}`)));
      expect(answers.map(({ status }) => status).sort()).toEqual([204, 410, 410, 410]);
      expect((await reset(token)).status).toBe(410);
    });

    it('has a link that works for an hour at most', async () => {
      const { email } = await somebody();
      await asks(email);
      const token = await resetToken(email);
      api.clock.forward({ minutes: 61 });
      expect((await reset(token)).status).toBe(410);
      expect(await signsIn(email, PASSWORD)).toBe(200);
    });

    it('makes every other link of the person worthless', async () => {
      const { email } = await somebody();
      await asks(email);
      const first = await resetToken(email);
      await asks(email);
      expect((await reset(await resetToken(email))).status).toBe(204);
      expect((await reset(first)).status).toBe(410);
    });

    it('answers known and unknown addresses alike, after the same work', async () => {
      const { email } = await somebody();
      const written = async () => {
        const [row]: Record<string, number>[] = await api.platform.dataSource.query(
          `select (select count(*) from outbox_message) + 0 as messages, (select count(*) from person_token) + 0 as tokens,
                  (select count(*) from audit_entry) + 0 as changes`,
        );
        return Object.values(row ?? {}).map(Number);
      };
      const workFor = async (address: string) => {
        const before = await written();
        const { status, text } = await asks(address);
        const after = await written();
        return { status, text, rows: after.map((count, index) => count - (before[index] ?? 0)) };
      };
      const known = await workFor(email);
      expect(known).toEqual({ status: 202, text: '', rows: [1, 0, 0] });
      expect(await workFor('stranger@nowhere.test')).toEqual(known);
      expect(await letterTo(api, email, 'Choose a new password')).toBeDefined();
      expect(await api.lettersTo('stranger@nowhere.test')).toEqual([]);
    });

    it('links to the configured origin, whatever host the request named', async () => {
      const { email } = await somebody();
      await api
        .browser()
        .post('/account/request-password-reset', { email }, { headers: { 'X-Forwarded-Host': 'evil.test' } });
      const letter = await letterTo(api, email, 'Choose a new password');
      expect(letter?.text).toContain(`${api.platform.config.origin}/reset-password?token=`);
      expect(letter?.text).not.toContain('evil.test');
    });

    it('is stored hashed, link and password both', async () => {
      const { email } = await somebody();
      await asks(email);
      const token = await resetToken(email);
      const tokens: { hash: string }[] = await api.platform.dataSource.query(
        'select token_hash as hash from person_token',
      );
      expect(tokens.some(({ hash }) => hash.includes(token))).toBe(false);
      const people: { hash: string }[] = await api.platform.dataSource.query(
        'select password_hash as hash from person where email = ?',
        [email],
      );
      expect(people[0]?.hash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    });
  });

  describe('changing the own', () => {
    const change = (client: Client, currentPassword: string, newPassword = NEXT) =>
      client.post('/api/account/change-password', { currentPassword, newPassword });

    it('stays signed in here under a new session id, and signs out everywhere else', async () => {
      const { client, email } = await somebody();
      const elsewhere = await api.signIn(email);
      const planted = client.below('/api').copy();
      expect((await change(client, PASSWORD)).status).toBe(204);
      expect([await isIn(client), await isIn(elsewhere), await isIn(planted)]).toEqual([true, false, false]);
      expect([await signsIn(email, PASSWORD), await signsIn(email, NEXT)]).toEqual([401, 200]);
    });

    it('needs the current one, and a new one that is long enough', async () => {
      const { client, email } = await somebody();
      const wrong = await change(client, 'not the current one');
      expect(wrong.status).toBe(422);
      expect(wrong.body).toMatchObject({ fields: [{ path: 'currentPassword' }] });
      expect((await change(client, PASSWORD, 'too short')).status).toBe(422);
      expect(await signsIn(email, PASSWORD)).toBe(200);
    });

    it('makes reset links on their way worthless', async () => {
      const { client, email } = await somebody();
      await asks(email);
      const token = await resetToken(email);
      await change(client, PASSWORD);
      expect((await reset(token, 'planted password')).status).toBe(410);
    });

    it('is done once when two ask at the same time with the same old password', async () => {
      const { client, email } = await somebody();
      const other = await api.signIn(email);
      const answers = await Promise.all([
        change(client, PASSWORD, 'first new password'),
        change(other, PASSWORD, 'second new password'),
      ]);
      expect(answers.filter(({ status }) => status === 204)).toHaveLength(1);
    });
  });
});
