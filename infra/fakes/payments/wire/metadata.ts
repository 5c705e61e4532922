import type Stripe from 'stripe';
import { invalid } from './error.js';
import type { Spec } from './spec.js';

const MOST_KEYS = 50;
const MOST_KEY_CHARACTERS = 40;
const MOST_VALUE_CHARACTERS = 500;

/** Free pairs of text within the provider's published bounds; an empty value means "take this key away". */
export function metadata(): Spec<Stripe.Metadata> {
  return {
    read(node, path) {
      if (typeof node === 'string') throw invalid('Invalid object', path);
      if (node.size > MOST_KEYS) throw invalid(`Metadata can have up to ${MOST_KEYS} keys`, path);
      return Object.fromEntries([...node.entries()].map(([key, value]) => [key, pair(key, value, path)]));
    },
  };
}

function pair(key: string, value: unknown, path: string): string {
  const name = `${path}[${key}]`;
  if (typeof value !== 'string') throw invalid('Metadata values must be text', name);
  if (key.length > MOST_KEY_CHARACTERS) throw invalid('Metadata key too long', name);
  if (value.length > MOST_VALUE_CHARACTERS) throw invalid('Metadata value too long', name);
  return value;
}

/** Adds, changes and takes away keys. */
export function mergeMetadata(held: Stripe.Metadata, given: Stripe.Metadata | undefined): Stripe.Metadata {
  const merged = Object.entries({ ...held, ...given }).filter(([, value]) => value !== '');
  return Object.fromEntries(merged);
}
