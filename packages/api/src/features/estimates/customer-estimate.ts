import type { CustomerEstimate } from '@bookmatch/common/customer-page/customer-page-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { conflict, notFound } from '../../platform/http/problem-error.js';
import { todayOf } from '../shops/shops-public.js';
import { EstimateAcceptance } from './estimate-acceptance.entity.js';
import { estimatePdf } from './estimate-pdf.js';
import { questionsOf } from './estimate-questions.js';
import { EstimateRevision } from './estimate-revision.entity.js';
import { shownOf } from './estimate-standing.js';
import { Estimate } from './estimate.entity.js';

/** The estimate as its customer gets it: the frozen document and what was said about it, nothing from inside the shop. */
export async function customerEstimate(scope: ShopScope, estimateId: string): Promise<CustomerEstimate> {
  const revision = await shownRevision(scope, estimateId);
  const { document, documentHash } = revision;
  if (!document || documentHash === null) throw new TypeError('What was sent has a document and its hash.');
  const acceptance = await scope.rows(EstimateAcceptance).findOneBy({ estimateId });
  return {
    status: statusOf(revision, await todayOf(scope)),
    document,
    documentHash,
    questions: await questionsOf(scope, estimateId),
    acceptance: acceptance && {
      name: acceptance.name,
      acceptedAt: acceptance.createdAt.toISOString(),
      documentHash: acceptance.documentHash,
    },
  };
}

export async function shownEstimatePdf(scope: ShopScope, estimateId: string) {
  return estimatePdf(scope, (await shownRevision(scope, estimateId)).id);
}

/** The customer a link to this estimate is for. @throws conflict while nothing was sent */
export async function customerOfEstimate(scope: ShopScope, estimateId: string): Promise<string> {
  const estimate = await scope.rows(Estimate).get(estimateId);
  if (!(await findShown(scope, estimateId)))
    throw conflict('Send the estimate first: a draft cannot be read by its customer.');
  return estimate.customerId;
}

async function shownRevision(scope: ShopScope, estimateId: string): Promise<EstimateRevision> {
  const shown = await findShown(scope, estimateId);
  if (!shown) throw notFound('This estimate');
  return shown;
}

async function findShown(scope: ShopScope, estimateId: string): Promise<EstimateRevision | undefined> {
  return shownOf(await scope.rows(EstimateRevision).findBy({ estimateId }, 'number'));
}

function statusOf({ status, validUntil }: EstimateRevision, today: string): CustomerEstimate['status'] {
  if (status === 'draft') throw new TypeError('A draft is not shown to its customer.');
  if (status !== 'sent') return status;
  return validUntil < today ? 'expired' : 'open';
}
