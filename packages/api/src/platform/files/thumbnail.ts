import sharp from 'sharp';
import { ProblemError } from '../http/problem-error.js';

/** The longest edge of a thumbnail, in pixels: a tile on a screen of twice the density. */
const EDGE_PX = 640;
/** No camera in a pocket makes more; a picture that unpacks to more is meant to fill the memory. */
const MOST_PIXELS = 80_000_000;
const MOST_SECONDS = 20;
const MOST_AT_ONCE = 2;

// One picture is worked on by one thread, and none is kept: memory stays flat whoever uploads how much.
sharp.concurrency(1);
sharp.cache(false);

/**
 * A small WebP of a picture, turned the way the camera was held. It carries none of the picture's metadata, so neither
 * the place nor the device.
 *
 * @throws invalid-input for what cannot be read as a picture, or is too large to be looked at
 */
export async function makeThumbnail(path: string): Promise<Buffer> {
  return oneOfFew(async () => {
    try {
      return await sharp(path, { limitInputPixels: MOST_PIXELS, failOn: 'error', sequentialRead: true })
        .timeout({ seconds: MOST_SECONDS })
        .autoOrient()
        .resize({ width: EDGE_PX, height: EDGE_PX, fit: 'inside', withoutEnlargement: true })
        .webp({ quality: 74 })
        .toBuffer();
    } catch (error) {
      throw unreadable(error);
    }
  });
}

function unreadable(error: unknown): ProblemError {
  const tooLarge = error instanceof Error && /pixel limit/.test(error.message);
  const message = tooLarge
    ? 'This picture has too many pixels. Make it smaller and send it again.'
    : 'This picture cannot be read. It may be damaged.';
  return new ProblemError('invalid-input', message, { fields: [{ path: 'file', message }] });
}

let working = 0;
const waiting: (() => void)[] = [];

async function oneOfFew<Result>(work: () => Promise<Result>): Promise<Result> {
  if (working >= MOST_AT_ONCE) await new Promise<void>((resolve) => waiting.push(resolve));
  working += 1;
  try {
    return await work();
  } finally {
    working -= 1;
    waiting.shift()?.();
  }
}
