import {
  createJobCostSchema,
  jobCostSchema,
  jobCostsSchema,
  reverseJobCostSchema,
} from '@bookmatch/common/jobs/job-costs-contract';
import { shopRoute, type Route } from '../../platform/http/route.js';
import type { JobCostsService } from './job-costs-service.js';

export function jobCostsRoutes(service: JobCostsService): Route[] {
  return [
    shopRoute({
      method: 'get',
      path: '/jobs/:jobId/costs',
      summary: 'What was spent on a job, newest first',
      allow: ['read', 'JobCost'],
      answer: jobCostsSchema,
      handle: async ({ scope, params }) => ({ rows: await service.list(scope, params.jobId) }),
    }),
    shopRoute({
      method: 'post',
      path: '/jobs/:jobId/costs',
      summary: 'Enter a cost',
      allow: ['create', 'JobCost'],
      body: createJobCostSchema,
      answer: jobCostSchema,
      status: 201,
      handle: ({ scope, params, body }) => service.add(scope, params.jobId, body),
    }),
    shopRoute({
      method: 'post',
      path: '/jobs/:jobId/costs/:costId/reverse',
      summary: 'Take a wrong cost back',
      allow: ['create', 'JobCost'],
      body: reverseJobCostSchema,
      answer: jobCostSchema,
      status: 201,
      handle: ({ scope, params, body }) => service.reverse(scope, params.jobId, params.costId, body.reason),
    }),
  ];
}
