import {
  assignJobSchema,
  createJobSchema,
  jobExportQuerySchema,
  jobListQuerySchema,
  jobPageSchema,
  jobSchema,
  moveJobSchema,
  updateJobSchema,
} from '@bookmatch/common/jobs/jobs-contract';
import { shopRoute, type Route } from '../../platform/http/route.js';
import type { ClockedTime } from './clocked-time.js';
import { exportJobs } from './job-export.js';
import { listJobs } from './job-lists.js';
import type { JobsService } from './jobs-service.js';

export function jobsRoutes(service: JobsService, time: ClockedTime): Route[] {
  return [
    shopRoute({
      method: 'get',
      path: '/jobs',
      summary: 'List the jobs one may see',
      allow: ['read', 'Job'],
      query: jobListQuerySchema,
      answer: jobPageSchema,
      handle: ({ scope, query }) => listJobs(scope, query, time),
    }),
    shopRoute({
      method: 'get',
      path: '/jobs/export',
      summary: 'The list of jobs as CSV',
      allow: ['read', 'Job'],
      query: jobExportQuerySchema,
      handle: async ({ scope, query }) => exportJobs(scope, query, time),
    }),
    shopRoute({
      method: 'post',
      path: '/jobs',
      summary: 'Take on a job without an estimate',
      allow: ['create', 'Job'],
      body: createJobSchema,
      answer: jobSchema,
      status: 201,
      handle: ({ scope, body }) => service.create(scope, body),
    }),
    shopRoute({
      method: 'get',
      path: '/jobs/:id',
      summary: 'Read a job, planned and built',
      allow: ['read', 'Job'],
      answer: jobSchema,
      handle: ({ scope, params }) => service.get(scope, params.id),
    }),
    shopRoute({
      method: 'patch',
      path: '/jobs/:id',
      summary: "Change a job's own fields",
      allow: ['update', 'Job'],
      versioned: true,
      body: updateJobSchema,
      answer: jobSchema,
      handle: ({ scope, params, body, version }) => service.update(scope, params.id, body, version),
    }),
    shopRoute({
      method: 'post',
      path: '/jobs/:id/move',
      summary: 'Take a job to another stage',
      allow: ['update', 'Job'],
      versioned: true,
      body: moveJobSchema,
      answer: jobSchema,
      handle: ({ scope, params, body, version }) => service.move(scope, params.id, body, version),
    }),
    shopRoute({
      method: 'post',
      path: '/jobs/:id/assign',
      summary: 'Say who works on a job',
      allow: ['update', 'Job'],
      versioned: true,
      body: assignJobSchema,
      answer: jobSchema,
      handle: ({ scope, params, body, version }) => service.assign(scope, params.id, body, version),
    }),
  ];
}
