import { randomInt } from 'node:crypto';

const ALPHABET = 'ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789';

/** A fresh id in the provider's manner: a prefix that names the kind, then letters and digits. */
export function newId(prefix: string, length = 24): string {
  let tail = '';
  for (let i = 0; i < length; i += 1) tail += ALPHABET[randomInt(ALPHABET.length)];
  return prefix + tail;
}
