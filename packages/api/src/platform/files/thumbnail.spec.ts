import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { writeFile } from 'node:fs/promises';
import sharp from 'sharp';
import { makeThumbnail } from './thumbnail.js';

describe('a thumbnail', () => {
  let folder: string;
  beforeAll(async () => {
    folder = await mkdtemp(join(tmpdir(), 'bookmatch-small-'));
  });
  afterAll(() => rm(folder, { recursive: true, force: true }));

  const photo = (width: number, height: number) =>
    sharp({ create: { width, height, channels: 3, background: 'peru' } });

  it('stands as the camera was held, and tells neither place nor device', async () => {
    const path = join(folder, 'turned.jpg');
    await photo(1200, 900)
      .withExif({ IFD0: { Make: 'Pinhole', Orientation: '6' }, IFD3: { GPSLatitudeRef: 'N' } })
      .withMetadata({ orientation: 6 })
      .jpeg()
      .toFile(path);
    expect((await sharp(path).metadata()).exif).toBeDefined();

    const small = await sharp(await makeThumbnail(path)).metadata();
    expect(small).toMatchObject({ format: 'webp', width: 480, height: 640 });
    expect(small.exif).toBeUndefined();
    expect(small.orientation).toBeUndefined();
  });

  it('is never larger than the picture', async () => {
    const path = join(folder, 'little.png');
    await photo(40, 30).png().toFile(path);
    expect(await sharp(await makeThumbnail(path)).metadata()).toMatchObject({ width: 40, height: 30 });
  });

  it('is refused of a picture that unpacks to too much, before it is unpacked', async () => {
    const path = join(folder, 'bomb.png');
    await photo(12_000, 9_000).png({ compressionLevel: 9 }).toFile(path);
    await expect(makeThumbnail(path)).rejects.toMatchObject({
      code: 'invalid-input',
      detail: expect.stringContaining('too many pixels'),
    });
  });

  it('is refused of a damaged picture', async () => {
    const path = join(folder, 'cut.jpg');
    const whole = await photo(800, 600).jpeg().toBuffer();
    await writeFile(path, whole.subarray(0, whole.length / 2));
    await expect(makeThumbnail(path)).rejects.toMatchObject({ code: 'invalid-input' });
  });

  it('is made for a few pictures at a time, and for all of them', async () => {
    const path = join(folder, 'many.jpg');
    await photo(900, 600).jpeg().toFile(path);
    const made = await Promise.all(Array.from({ length: 9 }, () => makeThumbnail(path)));
    expect(made).toHaveLength(9);
  });
});
