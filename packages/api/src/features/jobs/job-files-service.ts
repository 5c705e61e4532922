import {
  JOB_FILE_TYPES,
  JOB_PHOTO_TYPES,
  type JobFileType,
  type JobFile as JobFileView,
  type UploadedJobFile,
} from '@bookmatch/common/jobs/job-files-contract';
import { isDuplicateKey } from '../../platform/database/retry.js';
import type { ShopScope } from '../../platform/database/scope.js';
import { systemStamp, type Stamp } from '../../platform/database/stamp.js';
import type { UnitOfWork } from '../../platform/database/unit-of-work.js';
import { fileKind } from '../../platform/files/file-kind.js';
import type { FileStore } from '../../platform/files/file-store.js';
import { sha256OfFile } from '../../platform/files/file-hash.js';
import { makeThumbnail } from '../../platform/files/thumbnail.js';
import { notFound, ProblemError } from '../../platform/http/problem-error.js';
import type { Download, UploadedFile } from '../../platform/http/route.js';
import { enqueue } from '../../platform/outbox/outbox.js';
import { rm } from 'node:fs/promises';
import { memberNames } from '../shops/shops-public.js';
import { readJob } from './job-access.js';
import { JobFile } from './job-file.entity.js';

/** The outbox message that has a file's bytes removed unless a row still points at them. */
export const JOB_FILE_SWEEP = 'job-file-sweep';
type Sweep = { fileId: string };
const SWEEP_AFTER_MS = 3_600_000;

export type Upload = { scope: ShopScope; work: UnitOfWork; stamp: Stamp; jobId: string; file: UploadedFile };

/** Files and photos of jobs: rows in the database, bytes in the file store. */
export class JobFilesService {
  constructor(private readonly files: FileStore) {}

  /** Newest first. */
  async list(scope: ShopScope, jobId: string): Promise<JobFileView[]> {
    await readJob(scope, jobId);
    const rows = await scope.rows(JobFile).findBy({ jobId }, 'createdAt');
    const names = await memberNames(scope);
    return rows.map((row) => view(row, names)).toReversed();
  }

  /**
   * Keeps an upload. The bytes are placed before the row is written, and a sweep is asked for before that: whatever
   * fails in between, no row is without bytes for long and no bytes without a row.
   */
  async upload({ file, ...upload }: Upload): Promise<UploadedJobFile> {
    try {
      return await this.keep({ file, ...upload });
    } finally {
      await rm(file.path, { force: true });
    }
  }

  private async keep({ scope, work, stamp, jobId, file }: Upload): Promise<UploadedJobFile> {
    await readJob(scope, jobId);
    const mediaType = await acceptedType(file);
    const sha256 = await sha256OfFile(file.path);
    const earlier = await this.sameContent(scope, jobId, sha256);
    if (earlier) return earlier;
    const thumbnail = JOB_PHOTO_TYPES.includes(mediaType) ? await makeThumbnail(file.path) : null;
    const id = scope.newId();
    const inShop = <Result>(act: (inside: ShopScope) => Promise<Result>) =>
      work.transaction(stamp, (inside) => act(inside.forShop(scope.shopId, scope.ability)));

    await inShop((inside) =>
      enqueue(inside, JOB_FILE_SWEEP, { fileId: id }, after(stamp.now, SWEEP_AFTER_MS)),
    );
    await this.files.keepFile(keyOf(scope.shopId, id), file.path);
    if (thumbnail) await this.files.keepBytes(thumbnailKeyOf(scope.shopId, id), thumbnail);
    try {
      const values = { id, jobId, mediaType, sha256, name: plainName(file.name), bytes: file.bytes };
      const row = await inShop((inside) =>
        inside
          .rows(JobFile)
          .insert({ ...values, hasThumbnail: thumbnail !== null, memberId: scope.memberId }),
      );
      return { ...view(row, await memberNames(scope)), alreadyHere: false };
    } catch (error) {
      // Anything but a refused row may have been committed without our hearing of it: the sweep looks, and decides.
      if (!isDuplicateKey(error)) throw error;
      await this.removeBytes(scope.shopId, id);
      const other = await this.sameContent(scope, jobId, sha256);
      if (!other) throw error;
      return other;
    }
  }

  private async sameContent(
    scope: ShopScope,
    jobId: string,
    sha256: string,
  ): Promise<UploadedJobFile | null> {
    const row = await scope.rows(JobFile).findOneBy({ jobId, sha256 });
    return row && { ...view(row, await memberNames(scope)), alreadyHere: true };
  }

  /** Photos may be shown in the page; everything else is handed out to keep. */
  async content(scope: ShopScope, jobId: string, fileId: string): Promise<Download> {
    const { id, name, mediaType } = await this.row(scope, jobId, fileId);
    const inline = JOB_PHOTO_TYPES.includes(mediaType);
    const body = this.files.read(keyOf(scope.shopId, id));
    return { download: { name, type: mediaType, inline, body } };
  }

  async thumbnail(scope: ShopScope, jobId: string, fileId: string): Promise<Download> {
    const { id, hasThumbnail } = await this.row(scope, jobId, fileId);
    if (!hasThumbnail) throw notFound('A small picture of this file');
    const body = this.files.read(thumbnailKeyOf(scope.shopId, id));
    return { download: { name: 'thumbnail.webp', type: 'image/webp', inline: true, body } };
  }

  /** Removes the row now and the bytes once that is committed. */
  async delete(scope: ShopScope, jobId: string, fileId: string): Promise<void> {
    const row = await this.row(scope, jobId, fileId);
    await scope.rows(JobFile).delete(row);
    await enqueue(scope, JOB_FILE_SWEEP, { fileId });
  }

  /** Carries out a sweep: the bytes go when no row points at them. */
  async sweep(work: UnitOfWork, now: Date, { fileId }: Sweep, message: SweepMessage): Promise<void> {
    const { shopId } = message;
    if (shopId === null) throw new TypeError('A sweep belongs to a shop.');
    const row = await work.read(systemStamp(message.id, now), (scope) =>
      scope.forShop(shopId).rows(JobFile).find(fileId),
    );
    if (!row) await this.removeBytes(shopId, fileId);
  }

  private async row(scope: ShopScope, jobId: string, fileId: string): Promise<JobFile> {
    await readJob(scope, jobId);
    const row = await scope.rows(JobFile).findOneBy({ id: fileId, jobId });
    if (!row) throw notFound('This file');
    return row;
  }

  private async removeBytes(shopId: string, fileId: string): Promise<void> {
    await this.files.remove(keyOf(shopId, fileId));
    await this.files.remove(thumbnailKeyOf(shopId, fileId));
  }
}
type SweepMessage = { id: string; shopId: string | null };

async function acceptedType(file: UploadedFile): Promise<JobFileType> {
  const kind = await fileKind(file.path, file.name);
  const accepted = JOB_FILE_TYPES.find((type) => type === kind);
  if (accepted) return accepted;
  throw new ProblemError(
    'unsupported-type',
    'Jobs keep photos (JPEG, PNG, WebP, HEIC), PDF, plain text, CSV and DXF. This file is none of them.',
  );
}

/** The name as text to show: without folders, and without characters that are not seen or turn the text around. */
function plainName(name: string): string {
  const base = name.split(/[\\/]/).at(-1) ?? '';
  const seen = [...base.replace(/[\p{Cc}\p{Cf}\p{Cs}]/gu, '').trim()].slice(0, 200).join('');
  return seen === '' ? 'file' : seen;
}

const keyOf = (shopId: string, fileId: string) => `${shopId}/${fileId}`;
const thumbnailKeyOf = (shopId: string, fileId: string) => `${shopId}/${fileId}-small`;
const after = (now: Date, ms: number) => new Date(now.getTime() + ms);

function view(row: JobFile, names: Map<string, string>): JobFileView {
  const { id, name, mediaType, bytes, sha256, hasThumbnail, memberId, createdAt } = row;
  return {
    ...{ id, name, mediaType, bytes, sha256, hasThumbnail },
    uploadedBy: names.get(memberId) ?? '',
    createdAt: createdAt.toISOString(),
  };
}
