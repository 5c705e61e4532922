import { randomUUID } from 'node:crypto';
import type { ClockState, Punched } from '@bookmatch/common/time/clock-contract';
import type { TimeEntry } from '@bookmatch/common/time/time-contract';
import type { Response } from 'supertest';
import type { Client } from './client.js';
import type { TestShop } from './test-api.js';

/** What a member does at the clock, and what there is to work on. */
export class ClockSteps {
  private constructor(
    private readonly shop: TestShop,
    private readonly customerId: string,
    private readonly operations: ReadonlyMap<string, string>,
  ) {}

  static async of(shop: TestShop): Promise<ClockSteps> {
    const customer = await shop.owner.post('/customers', { kind: 'homeowner', name: 'Orla Fenwick' });
    const { rows } = (await shop.owner.get('/operations')).body as { rows: { id: string; name: string }[] };
    const operations = new Map(rows.map((row) => [row.name, row.id]));
    return new ClockSteps(shop, (customer.body as { id: string }).id, operations);
  }

  /** The id of one of the operations that every shop starts with. */
  operation(name: string): string {
    const id = this.operations.get(name);
    if (!id) throw new Error(`The shop has no operation ${name}.`);
    return id;
  }

  /** An open job with planned minutes by operation. */
  async job(planned: Record<string, number> = { 'Face frames': 600 }, fields: object = {}): Promise<string> {
    const operations = Object.entries(planned).map(([name, plannedMinutes]) => ({
      operationId: this.operation(name),
      plannedMinutes,
    }));
    const body = { title: 'Mudroom lockers', customerId: this.customerId, operations, ...fields };
    return (expectStatus(await this.shop.owner.post('/jobs', body), 201) as { id: string }).id;
  }

  /** The body of a punch: face frames, unless the fields say otherwise. */
  punch(jobId: string | null, at: string, fields: object = {}) {
    const operationId = this.operation(jobId ? 'Face frames' : 'Shop, not on a job');
    return { entryId: randomUUID(), jobId, operationId, kind: 'work', at, source: 'phone', ...fields };
  }

  mealBreak(at: string, fields: object = {}) {
    return this.punch(null, at, { kind: 'meal-break', operationId: null, ...fields });
  }

  async clockIn(client: Client, punch: object): Promise<Punched> {
    return expectStatus(await client.post('/time/clock-in', punch), 200) as Punched;
  }

  async clockOut(client: Client, entryId: string, at: string): Promise<Punched> {
    return expectStatus(await client.post(`/time/entries/${entryId}/clock-out`, { at }), 200) as Punched;
  }

  /** A closed entry of the member who is signed in. */
  async worked(client: Client, jobId: string | null, from: string, to: string, fields: object = {}) {
    const { entry } = await this.clockIn(client, this.punch(jobId, from, fields));
    return (await this.clockOut(client, entry.id, to)).entry;
  }

  async state(client: Client): Promise<ClockState> {
    return expectStatus(await client.get('/time/clock'), 200) as ClockState;
  }

  async entry(client: Client, id: string): Promise<TimeEntry> {
    return expectStatus(await client.get(`/time/entries/${id}`), 200) as TimeEntry;
  }
}

function expectStatus(answer: Response, status: number): unknown {
  if (answer.status !== status) throw new Error(`${answer.status}: ${answer.text}`);
  return answer.body;
}
