import { fileSize } from './file-words';

describe('the size of a file', () => {
  it.each([
    [19, '19 B'],
    [840_400, '840 kB'],
    [999_499, '999 kB'],
    [999_500, '1.0 MB'],
    [2_440_000, '2.4 MB'],
  ])('%i bytes are %s', (bytes, text) => expect(fileSize(bytes)).toBe(text));
});
