import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The root of this clone, as an absolute path. */
export const rootFolder = dirname(dirname(dirname(fileURLToPath(import.meta.url))));

/** Everything the scripts make for this clone lives here; git ignores it. */
export const stateFolder = join(rootFolder, '.bookmatch');
