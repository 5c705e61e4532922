import { jobFilesSchema, uploadedJobFileSchema } from '@bookmatch/common/jobs/job-files-contract';
import { shopRoute, type Route } from '../../platform/http/route.js';
import type { JobFilesService } from './job-files-service.js';

export function jobFilesRoutes(service: JobFilesService): Route[] {
  return [
    shopRoute({
      method: 'get',
      path: '/jobs/:jobId/files',
      summary: 'Files and photos of a job, newest first',
      allow: ['read', 'JobFile'],
      answer: jobFilesSchema,
      handle: async ({ scope, params }) => ({ rows: await service.list(scope, params.jobId) }),
    }),
    shopRoute({
      method: 'post',
      path: '/jobs/:jobId/files',
      summary: 'Add a file or photo',
      allow: ['create', 'JobFile'],
      upload: 'file',
      // The same content sent again is the same file of the job.
      repeat: 'natural',
      transaction: 'own',
      answer: uploadedJobFileSchema,
      status: 201,
      handle: ({ scope, work, stamp, params, file }) =>
        service.upload({ scope, work, stamp, jobId: params.jobId, file: file! }),
    }),
    shopRoute({
      method: 'get',
      path: '/jobs/:jobId/files/:fileId/content',
      summary: "A file's content",
      allow: ['read', 'JobFile'],
      handle: ({ scope, params }) => service.content(scope, params.jobId, params.fileId),
    }),
    shopRoute({
      method: 'get',
      path: '/jobs/:jobId/files/:fileId/thumbnail',
      summary: 'A small picture of a photo',
      allow: ['read', 'JobFile'],
      handle: ({ scope, params }) => service.thumbnail(scope, params.jobId, params.fileId),
    }),
    shopRoute({
      method: 'delete',
      path: '/jobs/:jobId/files/:fileId',
      summary: 'Remove a file',
      allow: ['delete', 'JobFile'],
      status: 204,
      handle: ({ scope, params }) => service.delete(scope, params.jobId, params.fileId),
    }),
  ];
}
