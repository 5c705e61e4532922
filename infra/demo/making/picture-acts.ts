import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import type { Person } from '../cast/people.js';
import type { Generator } from '../chance/generator.js';
import type { Milestones } from '../crew/job-progress.js';
import { benchScene } from '../pictures/bench-scene.js';
import { elevation } from '../pictures/elevation.js';
import type { Project } from '../plan/project.js';
import type { Desk } from './desk.js';
import { reading } from './opening.js';
import type { Telling } from './telling.js';

/** The drawing that was approved, and a photo from the bench. */
export function addPictures(
  { desk, trail, list, cast }: Telling,
  { key }: Project,
  { approvedOn, buildingOn }: Milestones,
  random: Generator,
): void {
  const upload = (name: string, picture: () => Promise<Buffer>) => (at: Date) =>
    keepFile(desk, { by: cast.leadHand, at, jobId: trail.id(key), name, bytes: picture });
  list.addAlone(
    approvedOn,
    13,
    upload('Elevation A.png', () => asPng(elevation(random.stream('elevation')))),
  );
  const photoOn = buildingOn === null ? null : buildingOn + 1;
  list.addAlone(
    photoOn,
    16,
    upload('Boxes on the bench.jpg', () => asJpeg(benchScene(random.stream('bench')))),
  );
}

const asPng = (svg: string): Promise<Buffer> => sharp(Buffer.from(svg)).png({ palette: true }).toBuffer();
const asJpeg = (svg: string): Promise<Buffer> => sharp(Buffer.from(svg)).jpeg({ quality: 82 }).toBuffer();

type NewFile = { by: Person; at: Date; jobId: string; name: string; bytes: () => Promise<Buffer> };

/** Hands a file in as an upload does: by a path, which is taken away. */
async function keepFile(desk: Desk, { by, at, jobId, name, bytes }: NewFile): Promise<void> {
  const folder = await mkdtemp(join(tmpdir(), 'demo-'));
  const content = await bytes();
  const file = { path: join(folder, 'upload'), name, bytes: content.length };
  const { work } = desk.platform;
  try {
    await writeFile(file.path, content);
    await reading(desk, by, at, (scope) =>
      desk.services.jobFiles.upload({ scope, work, stamp: desk.stampOf(by, at), jobId, file }),
    );
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}
