import { billScheduleSoFar } from '@bookmatch/common/estimates/billing-schedule';
import { estimateTotals, priceRooms } from '@bookmatch/common/estimates/estimate-totals';
import type { Acceptance, Estimate as EstimateView } from '@bookmatch/common/estimates/estimates-contract';
import type {
  Revision,
  RevisionContent,
  RevisionSummary,
} from '@bookmatch/common/estimates/revision-contract';
import { estimateStatus } from '@bookmatch/common/estimates/revision-stages';
import { sendRefusals } from '@bookmatch/common/estimates/send-refusals';
import type { ShopScope } from '../../platform/database/scope.js';
import { Customer, Site } from '../customers/customers-public.js';
import { Lead } from '../leads/leads-public.js';
import { EstimateAcceptance } from './estimate-acceptance.entity.js';
import type { EstimateHooks } from './estimate-hooks.js';
import { questionsOf } from './estimate-questions.js';
import { EstimateRevision } from './estimate-revision.entity.js';
import { EstimateSend } from './estimate-send.entity.js';
import { currentOf } from './estimate-standing.js';
import { Estimate } from './estimate.entity.js';
import { loadContent } from './revision-content.js';
import { todayOf } from '../shops/shops-public.js';

/** The estimate with everything its page shows. */
export async function viewEstimate(
  scope: ShopScope,
  id: string,
  hooks: Pick<EstimateHooks, 'jobOf'>,
): Promise<EstimateView> {
  const estimate = await scope.rows(Estimate).get(id);
  const revisions = await scope.rows(EstimateRevision).findBy({ estimateId: id }, 'number');
  const today = await todayOf(scope);
  const current = currentOf(revisions);
  return {
    id,
    version: estimate.version,
    number: estimate.number,
    title: estimate.title,
    status: estimateStatus(revisions, today),
    ...(await peopleOf(scope, estimate)),
    job: await hooks.jobOf(scope, id),
    currentRevision: viewRevision(current, await loadContent(scope, current), today),
    revisions: revisions.map(viewSummary),
    sends: await sendsOf(scope, id, revisions),
    questions: await questionsOf(scope, id),
    acceptance: await acceptanceOf(scope, id, revisions),
    declineReason: revisions.findLast(({ status }) => status === 'declined')?.declineReason ?? '',
    createdAt: estimate.createdAt.toISOString(),
  };
}

/** @param today the date in the shop's zone */
export function viewRevision(row: EstimateRevision, content: RevisionContent, today: string): Revision {
  const totals = estimateTotals(content);
  return {
    ...content,
    id: row.id,
    version: row.version,
    number: row.number,
    status: row.status,
    rooms: priceRooms(content.rooms),
    billingSchedule: billScheduleSoFar(content.billingSchedule, totals),
    totals,
    sendRefusals: row.status === 'draft' ? sendRefusals(content, today) : [],
    sentAt: row.sentAt?.toISOString() ?? null,
    createdAt: row.createdAt.toISOString(),
  };
}

function viewSummary(row: EstimateRevision): RevisionSummary {
  const { id, number, status, totalCents } = row;
  return {
    id,
    number,
    status,
    totalCents,
    sentAt: row.sentAt?.toISOString() ?? null,
    createdAt: row.createdAt.toISOString(),
  };
}

async function peopleOf(
  scope: ShopScope,
  estimate: Estimate,
): Promise<Pick<EstimateView, 'customer' | 'site' | 'lead'>> {
  const { id, name, email, taxExempt } = await scope.rows(Customer).get(estimate.customerId);
  const site = estimate.siteId === null ? null : await scope.rows(Site).get(estimate.siteId);
  const lead = estimate.leadId === null ? null : await scope.rows(Lead).get(estimate.leadId);
  return {
    customer: { id, name, email, taxExempt },
    site: site && { id: site.id, name: site.name },
    lead: lead && { id: lead.id, title: lead.title },
  };
}

async function sendsOf(scope: ShopScope, estimateId: string, revisions: readonly EstimateRevision[]) {
  const sends = await scope.rows(EstimateSend).findBy({ estimateId }, 'createdAt');
  return sends.map((send) => ({
    id: send.id,
    to: send.to,
    revisionNumber: numberOf(revisions, send.revisionId),
    sentAt: send.createdAt.toISOString(),
  }));
}

async function acceptanceOf(
  scope: ShopScope,
  estimateId: string,
  revisions: readonly EstimateRevision[],
): Promise<Acceptance | null> {
  const row = await scope.rows(EstimateAcceptance).findOneBy({ estimateId });
  if (!row) return null;
  const { revisionId, name, address, documentHash } = row;
  const revisionNumber = numberOf(revisions, revisionId);
  return { revisionId, revisionNumber, name, acceptedAt: row.createdAt.toISOString(), address, documentHash };
}

function numberOf(revisions: readonly EstimateRevision[], revisionId: string): number {
  const revision = revisions.find(({ id }) => id === revisionId);
  if (!revision) throw new TypeError('The row points at a revision of another estimate.');
  return revision.number;
}
