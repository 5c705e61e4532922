/** A card of the test pages. Nobody types a number: the pages offer these by name. */
export interface TestCard {
  name: 'pays' | 'declined' | 'insufficient-funds' | 'fails-later';
  label: string;
  brand: 'visa';
  last4: string;
  expMonth: number;
  expYear: number;
  fingerprint: string;
  /** The provider's decline code for a charge made now, null when it goes through. */
  declinesNow: string | null;
  /** The same for a charge made later without the card holder. */
  declinesLater: string | null;
}

function card(
  name: TestCard['name'],
  last4: string,
  label: string,
  now: string | null,
  later: string | null,
): TestCard {
  const fingerprint = `test${last4}fingerprnt`;
  return {
    name,
    label,
    brand: 'visa',
    last4,
    expMonth: 12,
    expYear: 2040,
    fingerprint,
    declinesNow: now,
    declinesLater: later,
  };
}

export const TEST_CARDS: readonly TestCard[] = [
  card('pays', '4242', 'Test card 4242, goes through', null, null),
  card('declined', '0002', 'Test card 0002, is declined', 'generic_decline', 'generic_decline'),
  card(
    'insufficient-funds',
    '9995',
    'Test card 9995, has no funds',
    'insufficient_funds',
    'insufficient_funds',
  ),
  card(
    'fails-later',
    '0341',
    'Test card 0341, goes through now and is declined at renewal',
    null,
    'generic_decline',
  ),
];

export function cardByName(name: string): TestCard | undefined {
  return TEST_CARDS.find((one) => one.name === name);
}

export function cardByLast4(last4: string | undefined): TestCard | undefined {
  return TEST_CARDS.find((one) => one.last4 === last4);
}

/** What the card holder reads. */
export function declineMessage(declineCode: string): string {
  return declineCode === 'insufficient_funds'
    ? 'Your card has insufficient funds.'
    : 'Your card was declined.';
}
