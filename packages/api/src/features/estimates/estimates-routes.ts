import { answerQuestionSchema, questionSchema } from '@bookmatch/common/customer-page/questions-contract';
import {
  createEstimateSchema,
  createRevisionSchema,
  declineEstimateSchema,
  duplicateEstimateSchema,
  estimateExportQuerySchema,
  estimateListQuerySchema,
  estimatePageSchema,
  estimateSchema,
  sendEstimateSchema,
  updateEstimateSchema,
} from '@bookmatch/common/estimates/estimates-contract';
import { revisionSchema, saveRevisionSchema } from '@bookmatch/common/estimates/revision-contract';
import { shopRoute, type Route } from '../../platform/http/route.js';
import { exportEstimates } from './estimate-export.js';
import { listEstimates } from './estimate-lists.js';
import { estimatePdf } from './estimate-pdf.js';
import type { EstimateQuestions } from './estimate-questions.js';
import type { EstimateSending } from './estimate-sending.js';
import type { EstimatesService } from './estimates-service.js';

export type EstimateServices = {
  estimates: EstimatesService;
  sending: EstimateSending;
  questions: EstimateQuestions;
};

export function estimatesRoutes({ estimates, sending, questions }: EstimateServices): Route[] {
  return [...estimateRoutes(estimates), ...revisionRoutes(estimates), ...customerRoutes(sending, questions)];
}

function estimateRoutes(estimates: EstimatesService): Route[] {
  return [
    shopRoute({
      method: 'get',
      path: '/estimates',
      summary: 'List estimates',
      allow: ['read', 'Estimate'],
      query: estimateListQuerySchema,
      answer: estimatePageSchema,
      handle: ({ scope, query }) => listEstimates(scope, query),
    }),
    shopRoute({
      method: 'post',
      path: '/estimates',
      summary: 'Start an estimate',
      allow: ['create', 'Estimate'],
      body: createEstimateSchema,
      answer: estimateSchema,
      status: 201,
      handle: ({ scope, body }) => estimates.create(scope, body),
    }),
    shopRoute({
      method: 'get',
      path: '/estimates/export',
      summary: 'Download the list of estimates as CSV',
      allow: ['read', 'Estimate'],
      query: estimateExportQuerySchema,
      handle: async ({ scope, query }) => exportEstimates(scope, query),
    }),
    shopRoute({
      method: 'get',
      path: '/estimates/:id',
      summary: 'Read an estimate with its current revision',
      allow: ['read', 'Estimate'],
      answer: estimateSchema,
      handle: ({ scope, params }) => estimates.get(scope, params.id),
    }),
    shopRoute({
      method: 'patch',
      path: '/estimates/:id',
      summary: 'Change an estimate’s title or site',
      allow: ['update', 'Estimate'],
      versioned: true,
      body: updateEstimateSchema,
      answer: estimateSchema,
      handle: ({ scope, params, body, version }) => estimates.update(scope, params.id, body, version),
    }),
    shopRoute({
      method: 'post',
      path: '/estimates/:id/duplicate',
      summary: 'Start a new estimate with the same content',
      allow: ['create', 'Estimate'],
      body: duplicateEstimateSchema,
      answer: estimateSchema,
      status: 201,
      handle: ({ scope, params, body }) => estimates.duplicate(scope, params.id, body),
    }),
    shopRoute({
      method: 'post',
      path: '/estimates/:id/decline',
      summary: 'Record that the customer said no',
      allow: ['update', 'Estimate'],
      versioned: true,
      body: declineEstimateSchema,
      answer: estimateSchema,
      handle: ({ scope, params, body, version }) => estimates.decline(scope, params.id, body, version),
    }),
  ];
}

function revisionRoutes(estimates: EstimatesService): Route[] {
  return [
    shopRoute({
      method: 'post',
      path: '/estimates/:id/revisions',
      summary: 'Start a new revision from the current one',
      allow: ['update', 'Estimate'],
      versioned: true,
      body: createRevisionSchema,
      answer: estimateSchema,
      status: 201,
      handle: ({ scope, params, version }) => estimates.createRevision(scope, params.id, version),
    }),
    shopRoute({
      method: 'get',
      path: '/estimates/:id/revisions/:revisionId',
      summary: 'Read a revision',
      allow: ['read', 'Estimate'],
      answer: revisionSchema,
      handle: ({ scope, params }) => estimates.getRevision(scope, params),
    }),
    shopRoute({
      method: 'put',
      path: '/estimates/:id/revisions/:revisionId',
      summary: 'Save a draft revision whole',
      allow: ['update', 'Estimate'],
      versioned: true,
      body: saveRevisionSchema,
      answer: revisionSchema,
      handle: ({ scope, params, body, version }) => estimates.saveRevision(scope, params, body, version),
    }),
    shopRoute({
      method: 'get',
      path: '/estimates/:id/revisions/:revisionId/pdf',
      summary: 'A revision as a PDF, as its customer gets it',
      allow: ['read', 'Estimate'],
      handle: async ({ scope, params }) => ({
        download: await estimatePdf(scope, (await estimates.getRevision(scope, params)).id),
      }),
    }),
  ];
}

function customerRoutes(sending: EstimateSending, questions: EstimateQuestions): Route[] {
  return [
    shopRoute({
      method: 'post',
      path: '/estimates/:id/send',
      summary: 'Send the current revision to the customer',
      allow: ['send', 'Estimate'],
      versioned: true,
      body: sendEstimateSchema,
      answer: estimateSchema,
      handle: ({ scope, params, body, version }) => sending.send(scope, params.id, body, version),
    }),
    shopRoute({
      method: 'post',
      path: '/estimates/:id/questions/:questionId/answer',
      summary: 'Answer a customer’s question',
      allow: ['update', 'Estimate'],
      body: answerQuestionSchema,
      answer: questionSchema,
      handle: ({ scope, params, body }) => questions.answer(scope, params, body.body),
    }),
  ];
}
