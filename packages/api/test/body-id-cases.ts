import { randomUUID } from 'node:crypto';
import type { Client } from './harness/client.js';

/** One row of each kind in a shop, made as its owner would. */
export type ShopRows = {
  customer: string;
  site: string;
  lead: string;
  estimate: string;
  revision: string;
  operation: string;
  job: string;
  member: string;
  entry: string;
  invoice: string;
};
type Method = 'post' | 'put' | 'patch';
type Json = Record<string, unknown>;
/** A request whose body is right but for ids that may be another shop's. */
export type BodyIdCase = {
  path: string;
  fields: readonly string[];
  body(own: ShopRows, other: ShopRows, field: string): Json;
};

const pick = (own: ShopRows, other: ShopRows, field: string, name: string, kind: keyof ShopRows) =>
  field === name ? other[kind] : own[kind];

const line = (operationId: string | null) => ({
  id: randomUUID(),
  kind: 'labor',
  description: 'Assemble',
  quantity: '1',
  unit: 'hour',
  unitCostCents: 4_000,
  unitPriceCents: 9_000,
  operationId,
  plannedMinutesPerUnit: '60',
  taxable: true,
});
const revision = (operationId: string | null): Json => ({
  validUntil: '2026-07-01',
  taxRule: 'on-price',
  taxRate: '0.05',
  intro: '',
  terms: '',
  exclusions: '',
  discountCents: 0,
  rooms: [{ id: randomUUID(), name: 'Kitchen', lines: [line(operationId)] }],
  billingSchedule: [
    { id: randomUUID(), name: 'All', share: { remainder: true }, deposit: false, due: 'by-hand' },
  ],
});
const lead: Json = { title: 'Lockers', contactName: 'Tobias Wren', source: 'referral' };
const stretch: Json = {
  kind: 'work',
  startedAt: '2026-05-29T14:00:00.000Z',
  endedAt: '2026-05-29T15:00:00.000Z',
  note: '',
  reason: 'Forgotten',
};

/**
 * Every route whose body holds ids of rows, with the fields that do. Ids that the client makes itself (rooms, lines,
 * stages, time entries) are not among them.
 */
export const BODY_ID_CASES: Readonly<Record<string, BodyIdCase>> = {
  'post /leads': {
    path: '/leads',
    fields: ['customerId'],
    body: (own, other, field) => ({ ...lead, customerId: pick(own, other, field, 'customerId', 'customer') }),
  },
  'patch /leads/:id': {
    path: '/leads/{lead}',
    fields: ['customerId'],
    body: (own, other, field) => ({ customerId: pick(own, other, field, 'customerId', 'customer') }),
  },
  'post /leads/:id/convert': {
    path: '/leads/{lead}/convert',
    fields: ['customerId'],
    body: (own, other, field) => ({ customerId: pick(own, other, field, 'customerId', 'customer') }),
  },
  'post /leads/:id/estimates': {
    path: '/leads/{lead}/estimates',
    fields: ['siteId'],
    body: (own, other, field) => ({ title: 'Lockers', siteId: pick(own, other, field, 'siteId', 'site') }),
  },
  'post /estimates': {
    path: '/estimates',
    fields: ['customerId', 'siteId', 'leadId'],
    body: (own, other, field) => ({
      title: 'Kitchen',
      customerId: pick(own, other, field, 'customerId', 'customer'),
      siteId: pick(own, other, field, 'siteId', 'site'),
      leadId: pick(own, other, field, 'leadId', 'lead'),
    }),
  },
  'patch /estimates/:id': {
    path: '/estimates/{estimate}',
    fields: ['siteId'],
    body: (own, other, field) => ({ siteId: pick(own, other, field, 'siteId', 'site') }),
  },
  'post /estimates/:id/duplicate': {
    path: '/estimates/{estimate}/duplicate',
    fields: ['customerId', 'siteId'],
    body: (own, other, field) => ({
      customerId: pick(own, other, field, 'customerId', 'customer'),
      siteId: pick(own, other, field, 'siteId', 'site'),
    }),
  },
  'put /estimates/:id/revisions/:revisionId': {
    path: '/estimates/{estimate}/revisions/{revision}',
    fields: ['rooms.lines.operationId'],
    body: (own, other, field) => revision(pick(own, other, field, 'rooms.lines.operationId', 'operation')),
  },
  'post /operations/reorder': {
    path: '/operations/reorder',
    fields: ['operationIds'],
    body: (own, other, field) => ({ operationIds: [pick(own, other, field, 'operationIds', 'operation')] }),
  },
  'post /jobs': {
    path: '/jobs',
    fields: ['customerId', 'siteId', 'operations.operationId'],
    body: (own, other, field) => ({
      title: 'Shelves',
      customerId: pick(own, other, field, 'customerId', 'customer'),
      siteId: pick(own, other, field, 'siteId', 'site'),
      operations: [
        { operationId: pick(own, other, field, 'operations.operationId', 'operation'), plannedMinutes: 60 },
      ],
    }),
  },
  'post /jobs/:id/assign': {
    path: '/jobs/{job}/assign',
    fields: ['memberIds'],
    body: (own, other, field) => ({ memberIds: [pick(own, other, field, 'memberIds', 'member')] }),
  },
  'post /time/clock-in': {
    path: '/time/clock-in',
    fields: ['jobId', 'operationId'],
    body: (own, other, field) => ({
      entryId: randomUUID(),
      jobId: pick(own, other, field, 'jobId', 'job'),
      operationId: pick(own, other, field, 'operationId', 'operation'),
      kind: 'work',
      at: '2026-06-01T15:00:00.000Z',
      note: '',
      source: 'desk',
    }),
  },
  'post /time/entries': {
    path: '/time/entries',
    fields: ['memberId', 'jobId', 'operationId'],
    body: (own, other, field) => ({
      ...stretch,
      memberId: pick(own, other, field, 'memberId', 'member'),
      jobId: pick(own, other, field, 'jobId', 'job'),
      operationId: pick(own, other, field, 'operationId', 'operation'),
    }),
  },
  'patch /time/entries/:id': {
    path: '/time/entries/{entry}',
    fields: ['jobId', 'operationId'],
    body: (own, other, field) => ({
      reason: 'Wrong job',
      jobId: pick(own, other, field, 'jobId', 'job'),
      operationId: pick(own, other, field, 'operationId', 'operation'),
    }),
  },
  'post /links': {
    path: '/links',
    fields: ['subjectId'],
    body: (own, other, field) => ({
      subject: 'invoice',
      subjectId: pick(own, other, field, 'subjectId', 'invoice'),
    }),
  },
  'post /invoices': {
    path: '/invoices',
    fields: ['customerId', 'jobId', 'billingStageId'],
    body: (own, other, field) =>
      field === 'billingStageId'
        ? { from: 'stage', jobId: own.job, billingStageId: other.invoice }
        : {
            from: 'lines',
            customerId: pick(own, other, field, 'customerId', 'customer'),
            jobId: pick(own, other, field, 'jobId', 'job'),
            lines: [
              {
                id: randomUUID(),
                description: 'Repair',
                quantity: '1',
                unitPriceCents: 5_000,
                taxable: true,
              },
            ],
            taxRate: '0',
            memo: '',
          },
  },
};

/** Makes one row of each kind. */
export async function makeRows(owner: Client, member: string): Promise<ShopRows> {
  const made = async (path: string, body: Json) => {
    const answer = await owner.post(path, body);
    if (answer.status >= 300) throw new Error(`${path}: ${answer.text}`);
    return answer.body as { id: string; version: number } & Json;
  };
  const customer = await made('/customers', { kind: 'homeowner', name: 'Ines Calder' });
  const site = await made(`/customers/${customer.id}/sites`, { name: 'Home' });
  const leadRow = await made('/leads', { ...lead, customerId: customer.id });
  const estimate = await made('/estimates', { title: 'Kitchen', customerId: customer.id, siteId: site.id });
  const current = (await owner.get(`/estimates/${estimate.id}`)).body as { currentRevision: { id: string } };
  const operations = (await owner.get('/operations')).body as { rows: { id: string; onJob: boolean }[] };
  const operation = operations.rows.find(({ onJob }) => onJob)?.id ?? '';
  const job = await made('/jobs', { title: 'Shelves', customerId: customer.id, siteId: site.id });
  const entry = await made('/time/entries', {
    ...stretch,
    startedAt: '2026-05-28T14:00:00.000Z',
    endedAt: '2026-05-28T15:00:00.000Z',
    jobId: job.id,
    operationId: operation,
  });
  const invoice = await made('/invoices', {
    from: 'lines',
    customerId: customer.id,
    lines: [{ id: randomUUID(), description: 'Repair', quantity: '1', unitPriceCents: 5_000, taxable: true }],
    taxRate: '0',
    memo: '',
  });
  return {
    customer: customer.id,
    site: site.id,
    lead: leadRow.id,
    estimate: estimate.id,
    revision: current.currentRevision.id,
    operation,
    job: job.id,
    member,
    entry: entry.id,
    invoice: invoice.id,
  };
}

export function readCase(name: string, one: BodyIdCase, own: ShopRows): { method: Method; path: string } {
  const method = name.slice(0, name.indexOf(' ')) as Method;
  return { method, path: one.path.replace(/\{(\w+)\}/g, (_, kind: keyof ShopRows) => own[kind]) };
}
