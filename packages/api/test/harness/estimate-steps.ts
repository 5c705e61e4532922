import { randomUUID } from 'node:crypto';
import type { Estimate } from '@bookmatch/common/estimates/estimates-contract';
import type { RevisionContent } from '@bookmatch/common/estimates/revision-contract';
import type { Client } from './client.js';
import type { TestApi } from './test-api.js';

/** Steps on the way of an estimate, as the owner's browser takes them. */

export async function addCustomer(owner: Client, fields: object = {}): Promise<string> {
  const customer = { kind: 'homeowner', name: 'Ines Calder', email: 'ines@calder.test', ...fields };
  return ((await owner.post('/customers', customer)).body as { id: string }).id;
}

export async function startEstimate(owner: Client, fields: object = {}): Promise<Estimate> {
  const customerId = await addCustomer(owner);
  const answer = await owner.post('/estimates', { title: 'Library wall', customerId, ...fields });
  if (answer.status !== 201) throw new Error(answer.text);
  return answer.body as Estimate;
}

/** Two rooms: 4 bookcases at 1,046.00, a crown of 11.5 ft at 21.60, a bench at 934.00: 5,366.40 before tax. */
export function twoRooms(): RevisionContent['rooms'] {
  return [
    {
      id: randomUUID(),
      name: 'Library, north wall',
      lines: [
        line({ description: 'Open bookcase', quantity: '4', unitPriceCents: 104_600, unitCostCents: 61_000 }),
        line({
          description: 'Crown',
          quantity: '11.5',
          unit: 'ft',
          unitPriceCents: 2_160,
          unitCostCents: 1_100,
        }),
      ],
    },
    {
      id: randomUUID(),
      name: 'Window seat',
      lines: [line({ description: 'Bench, lift lid', unitPriceCents: 93_400, unitCostCents: 55_000 })],
    },
  ];
}

/** Half at once, the rest when somebody bills it. */
export function halfDown(): RevisionContent['billingSchedule'] {
  return [
    {
      ...{ id: randomUUID(), name: 'Deposit', share: { percent: '50' }, deposit: true },
      due: 'on-acceptance',
    },
    {
      ...{ id: randomUUID(), name: 'Installed', share: { remainder: true }, deposit: false },
      due: 'by-hand',
    },
  ];
}

export function line(fields: Partial<RevisionContent['rooms'][0]['lines'][0]> = {}) {
  return {
    id: randomUUID(),
    kind: 'material' as const,
    description: 'A cabinet',
    quantity: '1',
    unit: 'each' as const,
    unitCostCents: 50_000,
    unitPriceCents: 80_000,
    operationId: null,
    plannedMinutesPerUnit: null,
    taxable: true,
    ...fields,
  };
}

/** A draft's content as its answer gave it, to be changed and saved. */
export function contentOf({ currentRevision: revision }: Estimate): RevisionContent {
  const { validUntil, taxRule, taxRate, intro, terms, exclusions, discountCents } = revision;
  return {
    ...{ validUntil, taxRule, taxRate, intro, terms, exclusions, discountCents },
    rooms: revision.rooms.map(({ id, name, lines }) => ({
      id,
      name,
      lines: lines.map(({ amountCents: _amount, costCents: _cost, ...typed }) => typed),
    })),
    billingSchedule: revision.billingSchedule.map(({ id, name, share, deposit, due }) => ({
      ...{ id, name, share, deposit, due },
    })),
  };
}

export async function save(owner: Client, estimate: Estimate, content: object, version?: number) {
  const { id, currentRevision: revision } = estimate;
  return owner.put(`/estimates/${id}/revisions/${revision.id}`, content, version ?? revision.version);
}

export async function read(owner: Client, id: string): Promise<Estimate> {
  return (await owner.get(`/estimates/${id}`)).body as Estimate;
}

/** A priced draft. */
export async function priceEstimate(
  owner: Client,
  fields: object = {},
  content: object = {},
): Promise<Estimate> {
  const estimate = await startEstimate(owner, fields);
  const priced = {
    ...contentOf(estimate),
    rooms: twoRooms(),
    taxRate: '0.055',
    billingSchedule: halfDown(),
    ...content,
  };
  const answer = await save(owner, estimate, priced);
  if (answer.status !== 200) throw new Error(answer.text);
  return read(owner, estimate.id);
}

export function send(owner: Client, estimate: Estimate, to = 'ines@calder.test', message = '') {
  const body = { to, message, revisionVersion: estimate.currentRevision.version };
  return owner.post(`/estimates/${estimate.id}/send`, body, { version: estimate.version });
}

/** The customer's browser at the address that the newest letter brought. */
export async function openLink(api: TestApi, email = 'ines@calder.test'): Promise<Client> {
  const token = await newestToken(api, email);
  return api.browser().below(`/api/links/${token}`);
}

export async function newestToken(api: TestApi, email = 'ines@calder.test'): Promise<string> {
  const letters = await api.lettersTo(email);
  const tokens = letters.flatMap(({ text }) => /\/c\/([\w-]+)/.exec(text ?? '')?.[1] ?? []);
  const token = tokens.at(-1);
  if (!token) throw new Error(`No letter with a link came to ${email}.`);
  return token;
}

/** A sent estimate and its customer's browser. */
export async function sendEstimate(api: TestApi, owner: Client, content: object = {}) {
  const email = `customer-${randomUUID()}@calder.test`;
  const draft = await priceEstimate(owner, {}, content);
  const answer = await send(owner, draft, email);
  if (answer.status !== 200) throw new Error(answer.text);
  return { estimate: answer.body as Estimate, customer: await openLink(api, email), email };
}
