import { JOB_PHOTO_TYPES, type JobFile, type JobFileType } from '@bookmatch/common/jobs/job-files-contract';

/** For a file chooser; what a file really is, the server tells by its content. */
export const ACCEPTED_FILES = '.jpg,.jpeg,.png,.webp,.heic,.pdf,.txt,.csv,.dxf';

const KIND_NAMES: Record<JobFileType, string> = {
  'image/jpeg': 'Photo',
  'image/png': 'Picture',
  'image/webp': 'Picture',
  'image/heic': 'HEIC photo',
  'application/pdf': 'PDF',
  'text/plain': 'Text',
  'text/csv': 'CSV',
  'image/vnd.dxf': 'DXF drawing',
};
export const fileKindName = ({ mediaType }: JobFile): string => KIND_NAMES[mediaType];

/** Whether a browser can show it. */
export const isPhoto = ({ mediaType }: JobFile): boolean => JOB_PHOTO_TYPES.includes(mediaType);

/** `840 kB`, `2.4 MB`: decimal units, as the systems people use show them. */
export function fileSize(bytes: number): string {
  if (bytes < 1_000) return `${bytes} B`;
  if (bytes < 999_500) return `${Math.round(bytes / 1_000)} kB`;
  return `${(bytes / 1_000_000).toFixed(1)} MB`;
}
