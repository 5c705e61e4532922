import type { RowDataPacket } from 'mysql2';
import { compose } from '@bookmatch/api/compose';
import { FIRST_SHOP_MEMBERS, OWNER, SECOND_OWNER } from './cast/people.js';
import { FIRST_SHOP } from './cast/shops.js';
import { checkShop, refuseFaults } from './check/check-shop.js';
import { makeDemo } from './make-demo.js';
import { Desk } from './making/desk.js';
import { openShop, takeIn } from './making/opening.js';
import { openDemoGround, type DemoGround } from './testing/demo-ground.js';

const NOW = new Date('2026-06-17T19:20:00Z');
/** The whole year is made once for all of these. */
const MAKING_MS = 300_000;

describe('the demo shops', () => {
  let ground: DemoGround;
  let summary: string | null;

  beforeAll(async () => {
    ground = await openDemoGround();
    const { services } = compose(ground.platform);
    // A run that was killed when the first shop had begun.
    const begun = await openShop({ platform: ground.platform, services }, OWNER, FIRST_SHOP, NOW);
    await takeIn(begun, OWNER, FIRST_SHOP_MEMBERS[0]!, NOW);
    summary = await makeDemo(ground.platform, NOW);
  }, MAKING_MS);
  afterAll(() => ground.close());

  async function select<Row extends object>(sql: string, values: unknown[] = []): Promise<Row[]> {
    const [rows] = await ground.root.query<(Row & RowDataPacket)[]>(
      sql.replaceAll('{db}', ground.databaseName),
      values,
    );
    return rows;
  }
  const counts = async (sql: string): Promise<Record<string, number>> =>
    Object.fromEntries(
      (await select<{ name: string; total: number }>(sql)).map(({ name, total }) => [name, Number(total)]),
    );
  const ofFirst = `shop_id = (select id from {db}.shop where slug = 'quillback-cabinet-works')`;
  const total = async (table: string, where = '1 = 1') =>
    (await counts(`select 'all' name, count(*) total from {db}.${table} where ${ofFirst} and ${where}`))[
      'all'
    ];

  it('say what there is', () => {
    expect(summary).toContain('Quillback Cabinet Works has 5 members');
    expect(summary).toContain('Oxbow & Teal Joinery has 3 members');
  });

  it('are as large as a year of a small shop', async () => {
    expect(await total('lead')).toBeGreaterThanOrEqual(60);
    expect(await total('job')).toBeGreaterThanOrEqual(35);
    expect(await total('time_entry')).toBeGreaterThanOrEqual(3300);
    expect(await total('invoice')).toBeGreaterThanOrEqual(110);
  });

  it('have a lead, a job and an estimate in every state', async () => {
    const stages = (table: string, column: string) =>
      counts(`select ${column} name, count(*) total from {db}.${table} where ${ofFirst} group by ${column}`);
    expect(Object.keys(await stages('lead', 'stage')).sort()).toEqual(
      ['contacted', 'estimating', 'lost', 'new', 'site-visit', 'won'].sort(),
    );
    expect(Object.keys(await stages('job', 'stage'))).toHaveLength(8);
    expect(Object.keys(await stages('estimate', 'status')).sort()).toEqual(
      ['accepted', 'declined', 'draft', 'sent'].sort(),
    );
    expect(await total('estimate', `status = 'sent' and open_until < '2026-06-17'`)).toBeGreaterThan(0);
    expect(await total('estimate_question', 'answer is null')).toBeGreaterThan(0);
  });

  it('have an invoice in every state and every way to pay', async () => {
    expect(await total('invoice', `status = 'draft'`)).toBeGreaterThan(0);
    expect(await total('invoice', `status = 'credited'`)).toBeGreaterThan(0);
    expect(await total('invoice', `status = 'issued' and due_on < '2026-06-17'`)).toBeGreaterThan(2);
    expect(
      await total('invoice', `status = 'issued' and due_on >= '2026-06-17' and paid_cents = 0`),
    ).toBeGreaterThan(0);
    expect(
      await total('invoice', `status = 'issued' and due_on >= '2026-06-17' and paid_cents > 0`),
    ).toBeGreaterThan(0);
    for (const method of ['check', 'cash', 'transfer', 'card'])
      expect(await total('payment', `method = '${method}'`)).toBeGreaterThan(0);
  });

  it('have one person clocked in, and time put right with a reason', async () => {
    expect(await total('time_entry', 'ended_at is null and voided_at is null')).toBe(1);
    expect(await total('time_correction', `reason <> ''`)).toBeGreaterThan(5);
  });

  it('leave no letter to be sent', async () => {
    const [row] = await select<{ waiting: number; kept: number }>(
      `select sum(finished_at is null) waiting, sum(last_error = 'not sent: demo') kept from {db}.outbox_message where kind = 'mail'`,
    );
    expect(Number(row?.waiting)).toBe(0);
    expect(Number(row?.kept)).toBeGreaterThan(100);
  });

  it('share the bookkeeper and nothing else', async () => {
    const names = await select<{ name: string }>(
      `select person.name from {db}.member join {db}.person on person.id = member.person_id
        join {db}.shop on shop.id = member.shop_id where shop.name not like 'Unfinished%'
        group by person.id having count(distinct member.shop_id) > 1`,
    );
    expect(names).toEqual([{ name: 'Ottilie Brandvold' }]);
  });

  it('stand beside what a killed run left, which is out of their way', async () => {
    const shops = await select<{ name: string }>('select name from {db}.shop order by name');
    expect(shops.map(({ name }) => name)).toEqual([
      'Oxbow & Teal Joinery',
      'Quillback Cabinet Works',
      'Unfinished: Quillback Cabinet Works',
    ]);
  });

  it('are not made again', async () => {
    expect(await makeDemo(ground.platform, new Date('2026-06-18T15:00:00Z'))).toBeNull();
    expect(await select('select id from {db}.shop')).toHaveLength(3);
  });

  it('fail their own check once a cent is missing, once hours overlap, and once a job is not its parts', async () => {
    const desk = await deskOf('quillback-cabinet-works', OWNER.email);
    refuseFaults(await checkShop(desk, OWNER, NOW));
    await select(
      `update {db}.ledger_line set amount_cents = amount_cents + 1 where ${ofFirst} order by id limit 1`,
    );
    await select(
      `update {db}.time_entry set ended_at = date_add(ended_at, interval 3 hour)
        where ${ofFirst} and kind = 'meal-break' and voided_at is null order by id limit 1`,
    );
    await select(
      `update {db}.job set planned_minutes = planned_minutes + 1 where ${ofFirst} order by id limit 1`,
    );
    const faulty = (await checkShop(desk, OWNER, NOW)).filter(({ faults }) => faults.length > 0);
    const names = faulty.map(({ name }) => name);
    expect(names).toContain('every entry balances by itself');
    expect(names).toContain('nobody worked twice at the same time');
    expect(names).toContain('every job is what it was agreed to be');
    expect(() => refuseFaults(faulty)).toThrow('does not add up');
  }, 60_000);

  it('add up in the second shop too', async () => {
    refuseFaults(await checkShop(await deskOf('oxbow-teal-joinery', SECOND_OWNER.email), SECOND_OWNER, NOW));
  });

  async function deskOf(slug: string, email: string): Promise<Desk> {
    const [row] = await select<{ shopId: string; zone: string; memberId: string; personId: string }>(
      `select shop.id shopId, shop.time_zone zone, member.id memberId, person.id personId from {db}.shop
        join {db}.member on member.shop_id = shop.id join {db}.person on person.id = member.person_id
        where shop.slug = ? and person.email = ?`,
      [slug, email],
    );
    if (!row) throw new RangeError(`${email} is not in ${slug}.`);
    const desk = new Desk(ground.platform, compose(ground.platform).services, row.shopId, row.zone);
    desk.seat({ name: '', email }, { personId: row.personId, memberId: row.memberId, role: 'owner' });
    return desk;
  }
});
