import { isDeepStrictEqual } from 'node:util';

const MOST_ROUNDS = 5;

/**
 * Makes what is stored what is so at the provider. Events arrive late, twice and out of order, so they only say that
 * something changed: the facts are read afresh. Two who do this at once may store in the wrong order; each reads once more
 * after storing, so that whoever stores last has seen the last word.
 *
 * @param read the facts that matter, as plain data
 */
export async function bringIn<Facts>(
  read: () => Promise<Facts>,
  store: (facts: Facts) => Promise<void>,
): Promise<void> {
  let facts = await read();
  for (let round = 1; round <= MOST_ROUNDS; round += 1) {
    await store(facts);
    const now = await read();
    if (isDeepStrictEqual(now, facts)) return;
    facts = now;
  }
  throw new Error('What the provider says keeps changing.');
}
