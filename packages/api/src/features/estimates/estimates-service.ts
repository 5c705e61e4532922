import type {
  CreateEstimate,
  DeclineEstimate,
  DuplicateEstimate,
  Estimate as EstimateView,
  UpdateEstimate,
} from '@bookmatch/common/estimates/estimates-contract';
import type {
  Revision as RevisionView,
  RevisionContent,
  SaveRevision,
} from '@bookmatch/common/estimates/revision-contract';
import {
  refuseDecline,
  refuseNewRevision,
  refuseSaveRevision,
} from '@bookmatch/common/estimates/revision-stages';
import type { ShopScope } from '../../platform/database/scope.js';
import { conflict, notFound, refuse } from '../../platform/http/problem-error.js';
import { Customer, Site } from '../customers/customers-public.js';
import { beginEstimating } from '../leads/leads-public.js';
import { shopOf, takeNumber, todayOf } from '../shops/shops-public.js';
import { copiedContent } from './copied-content.js';
import type { EstimateHooks } from './estimate-hooks.js';
import { EstimateRevision } from './estimate-revision.entity.js';
import { currentOf, revisionsOf, updateStanding } from './estimate-standing.js';
import { viewEstimate, viewRevision } from './estimate-view.js';
import { Estimate } from './estimate.entity.js';
import { firstContent, taxFor, validFrom } from './first-content.js';
import { loadContent } from './revision-content.js';
import { revisionColumns, saveContent, saveRows } from './revision-saving.js';

type Head = { title: string; customerId: string; siteId: string | null; leadId: string | null };

/** Estimates and their revisions, as the shop writes them. */
export class EstimatesService {
  constructor(private readonly hooks: Pick<EstimateHooks, 'jobOf'>) {}

  get(scope: ShopScope, id: string): Promise<EstimateView> {
    return viewEstimate(scope, id, this.hooks);
  }

  async getRevision(scope: ShopScope, key: RevisionKey): Promise<RevisionView> {
    return this.view(scope, await revisionAt(scope, key));
  }

  async create(scope: ShopScope, input: CreateEstimate): Promise<EstimateView> {
    const customer = await customerWithSite(scope, input);
    if (input.leadId !== null) await beginEstimating(scope, input.leadId, input.customerId);
    const content = firstContent(await shopOf(scope), customer, () => scope.newId(), scope.now);
    return this.get(scope, await insertEstimate(scope, input, content));
  }

  async update(scope: ShopScope, id: string, input: UpdateEstimate, version: number): Promise<EstimateView> {
    const estimate = await scope.rows(Estimate).getForUpdate(id);
    if (estimate.status === 'accepted')
      throw conflict('This estimate was accepted. What changes now is agreed on the job.');
    const { title = estimate.title, siteId = estimate.siteId } = input;
    await customerWithSite(scope, { customerId: estimate.customerId, siteId });
    await scope.rows(Estimate).update(estimate, { title, siteId }, version);
    return this.get(scope, id);
  }

  /** Puts a whole draft in the place of what was there. */
  async saveRevision(
    scope: ShopScope,
    key: RevisionKey,
    content: SaveRevision,
    version: number,
  ): Promise<RevisionView> {
    await scope.rows(Estimate).getForUpdate(key.id);
    const revision = await revisionAt(scope, key, true);
    refuse(refuseSaveRevision(revision.status));
    return this.view(scope, await saveContent(scope, revision, content, version));
  }

  /** A copy of the current revision as a new draft, valid for the shop's usual days from today. */
  async createRevision(scope: ShopScope, id: string, version: number): Promise<EstimateView> {
    const estimate = await this.lock(scope, id, version);
    const revisions = await revisionsOf(scope, id);
    refuse(refuseNewRevision(revisions));
    const shop = await shopOf(scope);
    const content = copiedContent(await loadContent(scope, currentOf(revisions)), () => scope.newId());
    const fresh = { ...content, validUntil: validFrom(shop, scope.now) };
    await insertRevision(scope, id, currentOf(revisions).number + 1, fresh);
    await updateStanding(scope, estimate, shop.timeZone);
    return this.get(scope, id);
  }

  /** A new estimate with the current revision's content. Another customer is taxed as is due for them. */
  async duplicate(scope: ShopScope, id: string, input: DuplicateEstimate): Promise<EstimateView> {
    const original = await scope.rows(Estimate).get(id);
    const head = headOfCopy(original, input);
    const customer = await customerWithSite(scope, head);
    const shop = await shopOf(scope);
    const current = currentOf(await revisionsOf(scope, id));
    const content = copiedContent(await loadContent(scope, current), () => scope.newId());
    const tax = head.customerId === original.customerId ? {} : taxFor(shop, customer);
    const fresh = { ...content, ...tax, validUntil: validFrom(shop, scope.now) };
    return this.get(scope, await insertEstimate(scope, head, fresh));
  }

  /** The shop records that the customer said no. */
  async decline(
    scope: ShopScope,
    id: string,
    input: DeclineEstimate,
    version: number,
  ): Promise<EstimateView> {
    const estimate = await this.lock(scope, id, version);
    const revisions = await revisionsOf(scope, id);
    const revision = revisions.find(({ status }) => status === 'sent') ?? currentOf(revisions);
    refuse(refuseDecline(revision));
    await scope.rows(EstimateRevision).update(revision, { status: 'declined', declineReason: input.reason });
    await updateStanding(scope, estimate, (await shopOf(scope)).timeZone);
    return this.get(scope, id);
  }

  /** Everything that changes an estimate stands in line here. */
  private async lock(scope: ShopScope, id: string, version: number): Promise<Estimate> {
    const estimates = scope.rows(Estimate);
    return estimates.update(await estimates.getForUpdate(id), {}, version);
  }

  private async view(scope: ShopScope, revision: EstimateRevision): Promise<RevisionView> {
    const today = await todayOf(scope);
    return viewRevision(revision, await loadContent(scope, revision), today);
  }
}
export type RevisionKey = { id: string; revisionId: string };

/** A revision of this estimate, not just of this shop. */
async function revisionAt(
  scope: ShopScope,
  { id, revisionId }: RevisionKey,
  lock = false,
): Promise<EstimateRevision> {
  const revision = await scope.rows(EstimateRevision).findOneBy({ id: revisionId, estimateId: id }, lock);
  if (!revision) throw notFound('This revision');
  return revision;
}

async function customerWithSite(
  scope: ShopScope,
  { customerId, siteId }: { customerId: string; siteId: string | null },
): Promise<Customer> {
  const customer = await scope.rows(Customer).get(customerId);
  if (siteId !== null && !(await scope.rows(Site).findOneBy({ id: siteId, customerId })))
    throw notFound('This site');
  return customer;
}

async function insertEstimate(scope: ShopScope, head: Head, content: RevisionContent): Promise<string> {
  const { title, customerId, siteId, leadId } = head;
  const estimate = await scope.rows(Estimate).insert({
    id: scope.newId(),
    number: await takeNumber(scope, 'estimate'),
    title,
    customerId,
    siteId,
    leadId,
    status: 'draft',
    openUntil: null,
    currentRevisionNumber: 1,
  });
  await insertRevision(scope, estimate.id, 1, content);
  return estimate.id;
}

async function insertRevision(
  scope: ShopScope,
  estimateId: string,
  number: number,
  content: RevisionContent,
): Promise<void> {
  const revision = await scope.rows(EstimateRevision).insert({
    ...revisionColumns(content),
    id: scope.newId(),
    estimateId,
    number,
    status: 'draft',
    savedAt: scope.now,
    sentAt: null,
    document: null,
    documentHash: null,
    declineReason: '',
  });
  await saveRows(scope, revision.id, content);
}

function headOfCopy(original: Estimate, input: DuplicateEstimate): Head {
  const { customerId = original.customerId } = input;
  const siteOfOriginal = customerId === original.customerId ? original.siteId : null;
  return {
    title: input.title ?? `Copy of ${original.title}`.slice(0, 120),
    customerId,
    siteId: input.siteId === undefined ? siteOfOriginal : input.siteId,
    leadId: null,
  };
}
