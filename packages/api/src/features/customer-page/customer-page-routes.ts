import {
  acceptEstimateSchema,
  customerDeclineSchema,
  customerEstimateSchema,
  customerPageSchema,
} from '@bookmatch/common/customer-page/customer-page-contract';
import { askQuestionSchema, questionSchema } from '@bookmatch/common/customer-page/questions-contract';
import { linkRoute, type LinkRequest, type Route } from '../../platform/http/route.js';
import {
  customerEstimate,
  shownEstimatePdf,
  type EstimateAnswers,
  type EstimateQuestions,
} from '../estimates/estimates-public.js';
import { readCustomerPage, type PageReaders } from './customer-page.js';

export type CustomerPageServices = {
  readers: PageReaders;
  answers: EstimateAnswers;
  questions: EstimateQuestions;
};

export function customerPageRoutes({ readers, answers, questions }: CustomerPageServices): Route[] {
  return [
    linkRoute({
      method: 'get',
      path: '',
      summary: 'What stands behind a customer’s link',
      allow: 'any-link',
      answer: customerPageSchema,
      handle: ({ scope, link }) => readCustomerPage(scope, link, readers),
    }),
    linkRoute({
      method: 'get',
      path: '/estimate.pdf',
      summary: 'The estimate as a PDF',
      allow: 'estimate-link',
      handle: async ({ scope, link }) => ({ download: await shownEstimatePdf(scope, link.subjectId) }),
    }),
    linkRoute({
      method: 'post',
      path: '/questions',
      summary: 'Ask about the estimate',
      allow: 'estimate-link',
      body: askQuestionSchema,
      answer: questionSchema,
      status: 201,
      handle: ({ scope, link, body }) =>
        questions.ask(scope, { estimateId: link.subjectId, linkId: link.id, ...body }),
    }),
    linkRoute({
      method: 'post',
      path: '/accept',
      summary: 'Accept the estimate',
      allow: 'estimate-link',
      body: acceptEstimateSchema,
      answer: customerEstimateSchema,
      handle: async ({ body, ...request }) => {
        await answers.accept(request.scope, whence(request), body);
        return customerEstimate(request.scope, request.link.subjectId);
      },
    }),
    linkRoute({
      method: 'post',
      path: '/decline',
      summary: 'Decline the estimate',
      allow: 'estimate-link',
      body: customerDeclineSchema,
      answer: customerEstimateSchema,
      handle: async ({ body, ...request }) => {
        await answers.decline(request.scope, whence(request), body);
        return customerEstimate(request.scope, request.link.subjectId);
      },
    }),
  ];
}

function whence({
  link,
  address,
  userAgent,
}: Pick<LinkRequest<'', undefined, undefined>, 'link' | 'address' | 'userAgent'>) {
  return { estimateId: link.subjectId, linkId: link.id, address, userAgent };
}
