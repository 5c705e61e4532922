import type { Estimate as EstimateView, SendEstimate } from '@bookmatch/common/estimates/estimates-contract';
import { sendRefusals } from '@bookmatch/common/estimates/send-refusals';
import type { ShopScope } from '../../platform/database/scope.js';
import { conflict } from '../../platform/http/problem-error.js';
import { sendMail } from '../../platform/mail/mail.js';
import { shopOf, todayAt, type Shop } from '../shops/shops-public.js';
import { documentOf, hashOf } from './estimate-document.js';
import type { EstimateHooks } from './estimate-hooks.js';
import { estimateLetter } from './estimate-letters.js';
import { EstimateRevision } from './estimate-revision.entity.js';
import { EstimateSend } from './estimate-send.entity.js';
import { currentOf, revisionsOf, updateStanding } from './estimate-standing.js';
import { viewEstimate } from './estimate-view.js';
import { Estimate } from './estimate.entity.js';
import { loadContent } from './revision-content.js';

/** Sends estimates to customers, by letter with a link and the PDF. */
export class EstimateSending {
  constructor(private readonly hooks: Pick<EstimateHooks, 'linkTo' | 'jobOf'>) {}

  /**
   * Sends the current revision. A draft is frozen by it and takes the place of the one that was sent before; one that
   * was sent already is sent again.
   */
  async send(scope: ShopScope, id: string, input: SendEstimate, version: number): Promise<EstimateView> {
    const estimates = scope.rows(Estimate);
    const estimate = await estimates.update(await estimates.getForUpdate(id), {}, version);
    const shop = await shopOf(scope);
    const revisions = await revisionsOf(scope, id);
    const current = await scope
      .rows(EstimateRevision)
      .update(currentOf(revisions), {}, input.revisionVersion);
    const sent =
      current.status === 'draft'
        ? await this.freeze(scope, shop, estimate, revisions)
        : sendable(current, todayAt(shop, scope.now));
    await updateStanding(scope, estimate, shop.timeZone);
    await this.mail(scope, shop, estimate, sent, input);
    return viewEstimate(scope, id, this.hooks);
  }

  /** From here on the draft never changes. */
  private async freeze(
    scope: ShopScope,
    shop: Shop,
    estimate: Estimate,
    revisions: readonly EstimateRevision[],
  ): Promise<EstimateRevision> {
    const rows = scope.rows(EstimateRevision);
    const draft = currentOf(revisions);
    const refusals = sendRefusals(await loadContent(scope, draft), todayAt(shop, scope.now));
    if (refusals.length > 0) throw conflict(refusals.join(' '));
    for (const earlier of revisions.filter(({ status }) => status === 'sent'))
      await rows.update(earlier, { status: 'superseded' });
    const document = await documentOf(scope, estimate, draft);
    return rows.update(draft, {
      status: 'sent',
      sentAt: scope.now,
      document,
      documentHash: hashOf(document),
    });
  }

  private async mail(
    scope: ShopScope,
    shop: Shop,
    estimate: Estimate,
    revision: EstimateRevision,
    { to, message }: SendEstimate,
  ): Promise<void> {
    await scope
      .rows(EstimateSend)
      .insert({ id: scope.newId(), estimateId: estimate.id, revisionId: revision.id, to, message });
    const url = await this.hooks.linkTo(scope, estimate);
    await sendMail(scope, { to, ...estimateLetter(shop, estimate, revision, { message, url }) });
  }
}

function sendable(revision: EstimateRevision, today: string): EstimateRevision {
  if (revision.status === 'sent' && revision.validUntil >= today) return revision;
  if (revision.status === 'sent')
    throw conflict('This estimate has expired. Make a new revision with a new date, and send that.');
  throw conflict(`This revision was ${revision.status}, so it is not sent again.`);
}
