import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { fileKind } from './file-kind.js';

describe('what a file is', () => {
  let folder: string;
  beforeAll(async () => {
    folder = await mkdtemp(join(tmpdir(), 'bookmatch-kind-'));
  });
  afterAll(() => rm(folder, { recursive: true, force: true }));

  const kindOf = async (content: Buffer | string, name = 'file') => {
    const path = join(folder, 'content');
    await writeFile(path, content);
    return fileKind(path, name);
  };
  const picture = (format: 'jpeg' | 'png' | 'webp') =>
    sharp({ create: { width: 8, height: 8, channels: 3, background: 'tan' } })
      .toFormat(format)
      .toBuffer();

  it('is told by its first bytes, whatever it is called', async () => {
    expect(await kindOf(await picture('jpeg'), 'plan.pdf')).toBe('image/jpeg');
    expect(await kindOf(await picture('png'), 'evil.html')).toBe('image/png');
    expect(await kindOf(await picture('webp'))).toBe('image/webp');
    expect(await kindOf('%PDF-1.7\n%âãÏÓ\n', 'photo.jpg')).toBe('application/pdf');
    expect(await kindOf(Buffer.from('0000001c66747970686569630000000068656963', 'hex'))).toBe('image/heic');
  });

  it('is plain text where nothing but text is in it, and CSV by its name', async () => {
    expect(await kindOf('Filler strip left of the range\n', 'notes.txt')).toBe('text/plain');
    expect(await kindOf('part,length\nstile,762\n', 'Cut list.CSV')).toBe('text/csv');
    expect(await kindOf('0\nSECTION\n2\nHEADER\n', 'island.dxf')).toBe('image/vnd.dxf');
    expect(await kindOf('  999\r\nmade by hand\r\n  0\r\nSECTION\r\n', 'island.txt')).toBe('image/vnd.dxf');
  });

  it('is nothing known for markup, programs and rubbish', async () => {
    expect(await kindOf('<svg xmlns="http://www.w3.org/2000/svg"><script/></svg>', 'logo.txt')).toBeNull();
    expect(await kindOf('\uFEFF  <!doctype html><script>1</script>', 'notes.txt')).toBeNull();
    expect(await kindOf('MZ\u0000\u0001', 'notes.txt')).not.toBe('text/plain');
    expect(await kindOf(Buffer.from([1, 2, 3, 4, 0, 5]), 'notes.txt')).toBeNull();
    expect(await kindOf('', 'notes.txt')).toBeNull();
  });

  it('is still text when the first bytes end inside a character', async () => {
    for (const shift of [0, 1, 2, 3])
      expect(await kindOf('x'.repeat(shift) + '木'.repeat(3000), 'notes.txt')).toBe('text/plain');
    expect(await kindOf('x'.repeat(5000), 'notes.txt')).toBe('text/plain');
  });
});
