/** Keys the installed SDK's types have and the example, which is older, does not. `*` stands for any key. */
const NEWER_THAN_EXAMPLE: Record<string, readonly string[]> = {
  account: [
    'business_profile.specified_commercial_transactions_act_url',
    'controller.fees',
    'controller.is_controller',
    'controller.losses',
    'controller.requirement_collection',
    'controller.stripe_dashboard',
  ],
  charge: ['payment_method_details.card.electronic_commerce_indicator'],
  'checkout.session': ['allowed_payment_method_types'],
  event: ['account', 'data.previous_attributes'],
  line_item: ['pricing.price_details'],
  payment_intent: ['allowed_payment_method_types', 'payment_record', 'last_payment_error.*'],
  product: ['tax_details'],
  subscription: ['cancellation_details.feedback_option', 'trial_settings.end_behavior.billing_cycle_anchor'],
  subscription_item: ['current_trial'],
};

/** Keys of the example that the installed SDK's version of the API no longer has. */
const GONE_SINCE_EXAMPLE: Record<string, readonly string[]> = {
  invoice: ['subscription'],
};

/** Keys that are there only when the caller asked to expand them. */
const ON_REQUEST: Record<string, readonly string[]> = {
  'checkout.session': ['line_items'],
};

/** What holds free keys, or objects of any kind. */
const OPEN = /(^|\.)metadata$|^data\.object$|^data\.previous_attributes$/;

type Thing = Record<string, unknown>;

export type Examples = (kind: string) => Thing | undefined;

function isThing(value: unknown): value is Thing {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function listed(table: Record<string, readonly string[]>, kind: string, path: string): boolean {
  const any = path.replace(/[^.]+$/, '*');
  return (table[kind] ?? []).some((one) => one === path || one === any);
}

/**
 * Where an object differs from its kind's published example in keys or JSON types; empty when nowhere. An object
 * within it that has a kind of its own is held against that kind's example. Null goes with every type, since the
 * examples do not tell which of their values may be null; the SDK's types do.
 */
export function differences(actual: Thing, examples: Examples): string[] {
  const kind = String(actual['object']);
  const example = examples(kind);
  if (example === undefined) return [`no example of ${kind}`];
  return compareThings(actual, example, { kind, prefix: '', examples });
}

interface Place {
  kind: string;
  prefix: string;
  examples: Examples;
}

function compareThings(actual: Thing, example: Thing, place: Place): string[] {
  const { kind, prefix } = place;
  const pathOf = (key: string): string => (prefix === '' ? key : `${prefix}.${key}`);
  const known = (key: string): boolean =>
    key in example || listed(NEWER_THAN_EXAMPLE, kind, pathOf(key)) || listed(ON_REQUEST, kind, pathOf(key));
  const extra = Object.keys(actual).filter((key) => !known(key));
  const absent = Object.keys(example).filter(
    (key) => !(key in actual) && !listed(GONE_SINCE_EXAMPLE, kind, pathOf(key)),
  );
  const shared = Object.keys(actual).filter((key) => key in example);
  return [
    ...extra.map((key) => `${kind}: ${pathOf(key)} is not in the example`),
    ...absent.map((key) => `${kind}: ${pathOf(key)} is missing`),
    ...shared.flatMap((key) => compareValues(actual[key], example[key], { ...place, prefix: pathOf(key) })),
  ];
}

function compareValues(actual: unknown, example: unknown, place: Place): string[] {
  if (OPEN.test(place.prefix)) return [];
  if (hasOwnExample(actual, place)) return differences(actual, place.examples);
  if (actual === null || example === null) return [];
  if (Array.isArray(actual) && Array.isArray(example)) return compareLists(actual, example, place);
  if (isThing(actual) && isThing(example)) return compareThings(actual, example, place);
  const types = [typeOf(actual), typeOf(example)];
  return types[0] === types[1]
    ? []
    : [`${place.kind}: ${place.prefix} is ${types[0]}, in the example ${types[1]}`];
}

function hasOwnExample(actual: unknown, place: Place): actual is Thing {
  return (
    isThing(actual) && typeof actual['object'] === 'string' && place.examples(actual['object']) !== undefined
  );
}

function compareLists(actual: unknown[], example: unknown[], place: Place): string[] {
  const [first] = example;
  return actual.flatMap((item) => {
    if (hasOwnExample(item, place)) return differences(item, place.examples);
    return first === undefined ? [] : compareValues(item, first, place);
  });
}

function typeOf(value: unknown): string {
  return Array.isArray(value) ? 'array' : typeof value;
}
