import { createReadStream } from 'node:fs';
import { copyFile, mkdir, rename, rm, unlink, writeFile } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import type { Readable } from 'node:stream';

/** Where files lie. Keys are made by us from ids, never from what a person typed. */
export interface FileStore {
  keepFile(key: string, fromPath: string): Promise<void>;
  keepBytes(key: string, bytes: Buffer): Promise<void>;
  read(key: string): Readable;
  remove(key: string): Promise<void>;
}

const KEY = /^[0-9a-f-]{36}\/[0-9a-z-]{1,80}$/;

/** Files on this machine's disk, one folder a shop. A file appears under its key only when it is whole. */
export class DiskFileStore implements FileStore {
  constructor(private readonly root: string) {}

  async keepFile(key: string, fromPath: string): Promise<void> {
    await this.place(key, (path) => copyFile(fromPath, path));
    await rm(fromPath, { force: true });
  }

  async keepBytes(key: string, bytes: Buffer): Promise<void> {
    await this.place(key, (path) => writeFile(path, bytes));
  }

  read(key: string): Readable {
    return createReadStream(this.pathOf(key));
  }

  async remove(key: string): Promise<void> {
    await unlink(this.pathOf(key)).catch((error: NodeJS.ErrnoException) => {
      if (error.code !== 'ENOENT') throw error;
    });
  }

  private async place(key: string, write: (path: string) => Promise<void>): Promise<void> {
    const path = this.pathOf(key);
    await mkdir(dirname(path), { recursive: true });
    await write(`${path}.part`);
    await rename(`${path}.part`, path);
  }

  private pathOf(key: string): string {
    if (!KEY.test(key)) throw new TypeError('A file key is a shop id and a name of ours.');
    return join(this.root, key);
  }
}
