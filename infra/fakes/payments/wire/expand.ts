import type { Desk } from '../desk.js';
import { onShelf, type Book } from '../state/book.js';
import { invalid } from './error.js';

const MOST_STEPS = 4;

/** What may be answered whole, by the kind of object it stands in. */
const EXPANDABLE: Record<string, readonly string[]> = {
  balance_transaction: ['source'],
  charge: ['balance_transaction', 'customer', 'payment_intent'],
  'checkout.session': ['customer', 'invoice', 'line_items', 'payment_intent', 'subscription'],
  invoice: ['customer'],
  payment_intent: ['customer', 'latest_charge', 'payment_method'],
  payment_method: ['customer'],
  price: ['product'],
  refund: ['balance_transaction', 'charge', 'payment_intent'],
  subscription: ['customer', 'default_payment_method', 'latest_invoice'],
};

const SHELVES: Record<string, keyof Book> = {
  ch: 'charges',
  cus: 'customers',
  in: 'invoices',
  pi: 'paymentIntents',
  pm: 'paymentMethods',
  prod: 'products',
  re: 'refunds',
  sub: 'subscriptions',
  txn: 'balanceTransactions',
};

type Thing = Record<string, unknown>;

function isThing(value: unknown): value is Thing {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function copyOf(value: unknown): unknown {
  return JSON.parse(JSON.stringify(value)) as unknown;
}

/** A copy of the object with the named ids answered whole. Errors: 400 for a property that cannot be expanded. */
export function expand(desk: Desk, object: object, paths: string[]): object {
  const copy = copyOf(object) as Thing;
  for (const path of paths) {
    const steps = path.split('.');
    if (steps.length > MOST_STEPS) throw invalid(`Expansion too deep: ${path}`, 'expand');
    walk(desk, copy, steps, path);
  }
  return copy;
}

function walk(desk: Desk, thing: Thing, steps: string[], path: string): void {
  const [name, ...rest] = steps;
  if (name === undefined) return;
  if (name === 'data' && thing['object'] === 'list') return walkList(desk, thing, rest, path);
  if (!isExpandable(thing, name)) throw invalid(`This property cannot be expanded (${path}).`, 'expand');
  if (typeof thing[name] === 'string') thing[name] = lookUp(desk, thing[name]);
  if (name === 'line_items') thing[name] = linesOf(desk, thing);
  const inner = thing[name];
  if (isThing(inner)) walk(desk, inner, rest, path);
}

function walkList(desk: Desk, thing: Thing, rest: string[], path: string): void {
  const data = Array.isArray(thing['data']) ? thing['data'] : [];
  for (const item of data.filter(isThing)) walk(desk, item, rest, path);
}

function isExpandable(thing: Thing, name: string): boolean {
  const kind = String(thing['object']);
  return Object.hasOwn(EXPANDABLE, kind) && (EXPANDABLE[kind]?.includes(name) ?? false);
}

/** An id that is on no shelf stays an id. */
function lookUp(desk: Desk, id: string): unknown {
  const shelf = SHELVES[id.split('_')[0] ?? ''];
  const found = shelf === undefined ? undefined : onShelf<unknown>(desk.book[shelf], id);
  return found === undefined ? id : copyOf(found);
}

function linesOf(desk: Desk, session: Thing): unknown {
  const id = String(session['id']);
  const lines = onShelf(desk.book.sessions, id)?.lines ?? [];
  return copyOf({
    object: 'list',
    data: lines,
    has_more: false,
    url: `/v1/checkout/sessions/${id}/line_items`,
  });
}
