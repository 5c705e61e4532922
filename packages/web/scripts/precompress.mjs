// Writes a brotli twin beside every text file of the build: smaller than compressing on the fly, and free at run time.
import { readdir, readFile, writeFile } from 'node:fs/promises';
import { extname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { promisify } from 'node:util';
import { brotliCompress, constants } from 'node:zlib';

const COMPRESSED_KINDS = new Set(['.js', '.css', '.html', '.svg', '.json', '.webmanifest']);
const compress = promisify(brotliCompress);
const folder = process.argv[2] ?? fileURLToPath(new URL('../dist/web', import.meta.url));

const entries = await readdir(folder, { recursive: true, withFileTypes: true });
const files = entries
  .filter((entry) => entry.isFile() && COMPRESSED_KINDS.has(extname(entry.name)))
  .map((entry) => join(entry.parentPath ?? entry.path, entry.name));

await Promise.all(files.map(writeTwin));
console.log(`${files.length} files precompressed`);

async function writeTwin(file) {
  const text = await readFile(file);
  const params = {
    [constants.BROTLI_PARAM_QUALITY]: constants.BROTLI_MAX_QUALITY,
    [constants.BROTLI_PARAM_SIZE_HINT]: text.length,
  };
  await writeFile(`${file}.br`, await compress(text, { params }));
}
