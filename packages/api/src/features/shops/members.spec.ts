import type { Client } from '../../../test/harness/client.js';
import { ClockSteps } from '../../../test/harness/clock-steps.js';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

type Listed = { id: string; version: number; role: string; laborCostCentsPerHour?: number | null };

describe('members', () => {
  let api: TestApi;
  let shop: TestShop;
  beforeAll(async () => {
    api = await TestApi.open();
  });
  afterAll(() => api.close());
  beforeEach(async () => {
    shop = await api.signUp();
  });

  const list = async (client: Client = shop.owner) =>
    ((await client.get('/members')).body as { rows: Listed[] }).rows;
  const find = async (memberId: string) => {
    const found = (await list()).find(({ id }) => id === memberId);
    if (!found) throw new Error('This member is not listed.');
    return found;
  };

  it('are listed to those who may, with what an hour costs only to those who see money', async () => {
    const { memberId } = await shop.join('crew');
    const set = await shop.owner.patch(
      `/members/${memberId}/labor-cost`,
      { laborCostCentsPerHour: 4_250 },
      1,
    );
    expect(set.body).toMatchObject({ version: 2, laborCostCentsPerHour: 4_250 });
    expect(await find(memberId)).toMatchObject({ role: 'crew', laborCostCentsPerHour: 4_250 });
    const { client: bookkeeper } = await shop.join('bookkeeper');
    expect((await list(bookkeeper)).map((row) => 'laborCostCentsPerHour' in row)).not.toContain(false);
    const { client: leadHand } = await shop.join('lead-hand');
    const seen = await list(leadHand);
    expect(seen.length).toBeGreaterThan(2);
    expect(seen.map((row) => 'laborCostCentsPerHour' in row)).not.toContain(true);
    const { client: crew } = await shop.join('crew');
    expect((await crew.get('/members')).status).toBe(403);
  });

  it('are changed by an owner alone', async () => {
    const { memberId } = await shop.join('crew');
    for (const role of ['bookkeeper', 'lead-hand', 'crew'] as const) {
      const { client } = await shop.join(role);
      const answers = [
        await client.patch(`/members/${memberId}/role`, { role: 'owner' }, 1),
        await client.patch(`/members/${memberId}/labor-cost`, { laborCostCentsPerHour: 1 }, 1),
        await client.delete(`/members/${memberId}`, 1),
      ];
      expect(answers.map(({ status }) => status)).toEqual([403, 403, 403]);
    }
    expect(await find(memberId)).toMatchObject({ role: 'crew', version: 1 });
  });

  it('have their next request judged by their new role', async () => {
    const { client, memberId } = await shop.join('crew');
    expect((await client.get('/customers')).status).toBe(403);
    await shop.owner.patch(`/members/${memberId}/role`, { role: 'bookkeeper' }, 1);
    expect((await client.get('/customers')).status).toBe(200);
    await shop.owner.patch(`/members/${memberId}/role`, { role: 'crew' }, 2);
    expect((await client.get('/customers')).status).toBe(403);
  });

  it('are out from their next request on once removed, and stay in their other shop', async () => {
    const { client, memberId, email } = await shop.join('lead-hand');
    expect((await client.get('/customers')).status).toBe(200);
    expect((await shop.owner.delete(`/members/${memberId}`, 1)).status).toBe(204);
    expect((await client.get('/customers')).status).toBe(404);
    expect((await client.get('/api/account/session')).body).toMatchObject({ memberships: [] });
    expect((await list()).map(({ id }) => id)).not.toContain(memberId);
    expect((await shop.owner.delete(`/members/${memberId}`, 2)).status).toBe(404);
    expect((await shop.owner.patch(`/members/${memberId}/role`, { role: 'owner' }, 2)).status).toBe(404);
    await api.signIn(email);
  });

  it('are clocked out in the minute they are removed, and their time stays', async () => {
    const steps = await ClockSteps.of(shop);
    const { client, memberId } = await shop.join('crew');
    const jobId = await steps.job({ 'Face frames': 600 }, { openToCrew: true });
    const { entry } = await steps.clockIn(client, steps.punch(jobId, api.clock.read().toISOString()));
    api.clock.forward({ minutes: 95 });
    await shop.owner.delete(`/members/${memberId}`, 1);
    const rows: { minutes: number; voided_at: Date | null }[] = await api.platform.dataSource.query(
      'select minutes, voided_at from time_entry where id = ?',
      [entry.id],
    );
    expect(rows).toEqual([{ minutes: 95, voided_at: null }]);
  });

  it('leave an entry that was forgotten for days no longer than one may last', async () => {
    const steps = await ClockSteps.of(shop);
    const { client, memberId } = await shop.join('crew');
    await steps.clockIn(client, steps.punch(null, api.clock.read().toISOString()));
    api.clock.forward({ days: 3 });
    await shop.owner.delete(`/members/${memberId}`, 1);
    const rows: { minutes: number }[] = await api.platform.dataSource.query(
      'select minutes from time_entry where member_id = ?',
      [memberId],
    );
    expect(rows).toEqual([{ minutes: 16 * 60 }]);
  });

  it('of two changes of one version keep the first', async () => {
    const { memberId } = await shop.join('crew');
    const answers = await Promise.all(
      [3_000, 3_500].map((laborCostCentsPerHour) =>
        shop.owner.patch(`/members/${memberId}/labor-cost`, { laborCostCentsPerHour }, 1),
      ),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 412]);
  });

  it('keep an owner: the last one can neither leave nor take another role', async () => {
    const [owner] = await list();
    const answers = [
      await shop.owner.delete(`/members/${owner?.id ?? ''}`, 1),
      await shop.owner.patch(`/members/${owner?.id ?? ''}/role`, { role: 'crew' }, 1),
    ];
    expect(answers.map(({ status }) => status)).toEqual([409, 409]);
    expect((await shop.owner.get('/members')).status).toBe(200);
  });

  it('keep an owner also when two remove each other at the same time', async () => {
    for (let round = 0; round < 5; round += 1) {
      const other = await shop.join('owner');
      const owners = (await list()).filter(({ role }) => role === 'owner');
      const mine = owners.find(({ id }) => id !== other.memberId);
      if (owners.length !== 2 || !mine) throw new Error('There should be two owners.');
      const answers = await Promise.all([
        shop.owner.delete(`/members/${other.memberId}`, 1),
        other.client.patch(`/members/${mine.id}/role`, { role: 'crew' }, mine.version),
      ]);
      const left: { total: string }[] = await api.platform.dataSource.query(
        "select count(*) as total from member where shop_id = ? and role = 'owner' and removed_at is null",
        [shop.id],
      );
      expect([round, Number(left[0]?.total)]).toEqual([round, 1]);
      expect(answers.filter(({ status }) => status < 300)).toHaveLength(1);
      if (answers[1]?.status === 200) break;
    }
  });

  it('keep an owner when one of two steps down in two tabs and the other leaves', async () => {
    const other = await shop.join('owner');
    const answers = await Promise.all([
      other.client.patch(`/members/${other.memberId}/role`, { role: 'crew' }, 1),
      other.client.delete(`/members/${other.memberId}`, 1),
      ...(await list())
        .filter(({ id }) => id !== other.memberId)
        .map(({ id, version }) => shop.owner.delete(`/members/${id}`, version)),
    ]);
    expect(answers.filter(({ status }) => status < 300)).toHaveLength(1);
  });

  it('take no field that is not theirs to set', async () => {
    const { memberId } = await shop.join('crew');
    const more = { role: 'crew', shopId: shop.id, personId: memberId, version: 9 };
    expect((await shop.owner.patch(`/members/${memberId}/role`, more, 1)).status).toBe(422);
    expect((await shop.owner.patch(`/members/${memberId}/role`, { role: 'admin' }, 1)).status).toBe(422);
    const costly = { laborCostCentsPerHour: 100_001 };
    expect((await shop.owner.patch(`/members/${memberId}/labor-cost`, costly, 1)).status).toBe(422);
    expect(await find(memberId)).toMatchObject({ role: 'crew', version: 1 });
  });

  it('of another shop do not exist here', async () => {
    const { memberId } = await shop.join('crew');
    const stranger = await api.signUp();
    const answers = [
      await stranger.owner.patch(`/members/${memberId}/role`, { role: 'owner' }, 1),
      await stranger.owner.patch(`/members/${memberId}/labor-cost`, { laborCostCentsPerHour: 1 }, 1),
      await stranger.owner.delete(`/members/${memberId}`, 1),
    ];
    expect(answers.map(({ status }) => status)).toEqual([404, 404, 404]);
  });
});
