import { bringIn } from './bring-in.js';

/** A provider whose word changes at the given reading, and a store that may be slow. */
const scene = (words: string[]) => {
  const stored: string[] = [];
  let reading = 0;
  const read = () => Promise.resolve({ word: words[Math.min(reading++, words.length - 1)] ?? '' });
  const store = ({ word }: { word: string }) => {
    stored.push(word);
    return Promise.resolve();
  };
  return { read, store, stored };
};

describe('bringing in what is so at the provider', () => {
  it('stores it once when nothing changes meanwhile', async () => {
    const { read, store, stored } = scene(['open', 'open']);
    await bringIn(read, store);
    expect(stored).toEqual(['open']);
  });

  it('stores the last word when it changed while the first was being stored', async () => {
    const { read, store, stored } = scene(['open', 'closed', 'closed']);
    await bringIn(read, store);
    expect(stored.at(-1)).toBe('closed');
  });

  it('ends with the last word when two do it at once and the older one stores last', async () => {
    let so = 'old';
    let kept = '';
    const releases: (() => void)[] = [];
    const read = () => Promise.resolve({ word: so });
    const slow = bringIn(read, async ({ word }) => {
      if (word === 'old') await new Promise<void>((resolve) => releases.push(resolve));
      kept = word;
    });
    await new Promise((resolve) => setImmediate(resolve));
    so = 'new';
    await bringIn(read, ({ word }) => {
      kept = word;
      return Promise.resolve();
    });
    releases.forEach((release) => release());
    await slow;
    expect(kept).toBe('new');
  });

  it('gives up rather than run for ever', async () => {
    let count = 0;
    const read = () => Promise.resolve({ count: (count += 1) });
    await expect(bringIn(read, () => Promise.resolve())).rejects.toThrow('keeps changing');
  });
});
