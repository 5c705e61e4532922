import * as z from 'zod';
import type { Route } from '../src/platform/http/route.js';
import { BODY_ID_CASES, makeRows, readCase, type ShopRows } from './body-id-cases.js';
import { TestApi, type TestShop } from './harness/test-api.js';

/** Ids that the client makes itself, so that they point at nothing. */
const MADE_BY_THE_CLIENT = new Set([
  'rooms.id',
  'rooms.lines.id',
  'billingSchedule.id',
  'lines.id',
  'entryId',
]);

type Schema = { format?: string; properties?: Record<string, Schema>; items?: Schema } & Partial<
  Record<'anyOf' | 'oneOf' | 'allOf', Schema[]>
>;

/** The paths of all fields of a body that take an id. */
function idFields(schema: Schema, path: readonly string[] = []): string[] {
  const own = schema.format === 'uuid' ? [path.join('.')] : [];
  const inner = Object.entries(schema.properties ?? {}).flatMap(([key, value]) =>
    idFields(value, [...path, key]),
  );
  const items = schema.items ? idFields(schema.items, path) : [];
  const choices = [...(schema.anyOf ?? []), ...(schema.oneOf ?? []), ...(schema.allOf ?? [])];
  return [...own, ...inner, ...items, ...choices.flatMap((choice) => idFields(choice, path))];
}

function foreignFields(route: Route): string[] {
  if (!route.body) return [];
  const fields = idFields(z.toJSONSchema(route.body, { io: 'input', unrepresentable: 'any' }) as Schema);
  return [...new Set(fields)].filter((field) => !MADE_BY_THE_CLIENT.has(field)).toSorted();
}

describe("ids of another shop's rows in a body", () => {
  let api: TestApi;
  let shop: TestShop;
  let own: ShopRows;
  let other: ShopRows;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp();
    own = await makeRows(shop.owner, (await shop.join('crew')).memberId);
    const neighbor = await api.signUp();
    other = await makeRows(neighbor.owner, (await neighbor.join('crew')).memberId);
  });
  afterAll(() => api.close());

  it('are tried in every field that takes an id', () => {
    const expected: Record<string, string[]> = {};
    for (const route of api.product.routes.filter(({ kind }) => kind === 'shop')) {
      const fields = foreignFields(route);
      if (fields.length > 0) expected[`${route.method} ${route.path}`] = fields;
    }
    const tried = Object.entries(BODY_ID_CASES).map(
      ([name, { fields }]) => [name, [...fields].toSorted()] as const,
    );
    expect(Object.fromEntries(tried)).toEqual(expected);
  });

  it.each(Object.entries(BODY_ID_CASES))(
    'are refused by %s like ids that do not exist',
    async (name, one) => {
      const { method, path } = readCase(name, one, own);
      for (const field of one.fields) {
        const before = await rowCount(api);
        const send = (rows: ShopRows, key: string) =>
          shop.owner.send(method, path, one.body(own, rows, field), {
            key: `${key}-${field}`.padEnd(12, '-'),
            version: 1,
          });
        const foreign = await send(other, `foreign-${name.replace(/\W/g, '-')}`.slice(0, 40));
        const missing = await send(nowhere(other), `missing-${name.replace(/\W/g, '-')}`.slice(0, 40));
        expect([name, field, foreign.status, foreign.text.replace(/"reference":"[^"]+"/, '')]).toEqual([
          name,
          field,
          missing.status,
          missing.text.replace(/"reference":"[^"]+"/, ''),
        ]);
        expect([404, 409, 422]).toContain(foreign.status);
        expect(await rowCount(api)).toEqual(before);
      }
    },
  );
});

/** The same kinds of rows with ids that no shop has. */
function nowhere(rows: ShopRows): ShopRows {
  const ids = Object.entries(rows).map(([kind, id]) => [kind, id.replace(/^.{8}/, '00000000')]);
  return Object.fromEntries(ids) as ShopRows;
}

/** How much has ever been written: every change leaves a row in the trail. */
async function rowCount(api: TestApi): Promise<number> {
  const [row] = await api.platform.dataSource.query<{ total: number }[]>(
    'select count(*) total from audit_entry',
  );
  return Number(row?.total);
}
