import { acceptedText } from '@bookmatch/common/estimates/accepted-document';
import type { AcceptEstimate, CustomerDecline } from '@bookmatch/common/customer-page/customer-page-contract';
import { refuseAccept, refuseDecline } from '@bookmatch/common/estimates/revision-stages';
import { formatMoney } from '@bookmatch/common/money/format';
import type { ShopScope } from '../../platform/database/scope.js';
import { conflict, notFound, refuse } from '../../platform/http/problem-error.js';
import { sendMail } from '../../platform/mail/mail.js';
import { shopOf, todayAt, type Shop } from '../shops/shops-public.js';
import { acceptedEstimate } from './accepted-content.js';
import { customerAddress } from './customer-address.js';
import { EstimateAcceptance } from './estimate-acceptance.entity.js';
import type { EstimateHooks } from './estimate-hooks.js';
import { acceptedNews, declinedNews, thanksLetter } from './estimate-letters.js';
import { EstimateRevision } from './estimate-revision.entity.js';
import { revisionsOf, updateStanding } from './estimate-standing.js';
import { Estimate } from './estimate.entity.js';
import { lettersToShop } from './letters-to-shop.js';

/** Where an answer came from. */
export type Origin = { estimateId: string; linkId: string; address: string; userAgent: string };

/** The customer's answer: yes, once and for all, or no. */
export class EstimateAnswers {
  constructor(
    private readonly origin: string,
    private readonly hooks: Pick<EstimateHooks, 'onAccepted'>,
  ) {}

  /**
   * Accepts a sent revision, with all it takes to prove it, and lets the slices above make the job of it in the same
   * transaction. The same yes said twice is one acceptance.
   *
   * @throws conflict when the revision was superseded, answered or has expired, or is not the document that was read
   */
  async accept(scope: ShopScope, from: Origin, input: AcceptEstimate): Promise<EstimateAcceptance> {
    const estimate = await scope.rows(Estimate).getForUpdate(from.estimateId);
    const earlier = await scope.rows(EstimateAcceptance).findOneBy({ estimateId: estimate.id });
    if (earlier) return sameYes(earlier, input);
    const shop = await shopOf(scope);
    const revision = await this.revision(scope, estimate, input.revisionId);
    const sameDocument = revision.documentHash === input.documentHash;
    refuse(refuseAccept(revision, todayAt(shop, scope.now), sameDocument));
    const acceptance = await this.store(scope, from, revision, input.name);
    await scope.rows(EstimateRevision).update(revision, { status: 'accepted' });
    const accepted = await updateStanding(scope, estimate, shop.timeZone);
    await this.hooks.onAccepted(scope, await acceptedEstimate(scope, accepted, revision, acceptance));
    await this.tell(scope, shop, accepted, revision, acceptance);
    return acceptance;
  }

  /** The customer says no. Said twice, it is still one no. */
  async decline(scope: ShopScope, from: Origin, { revisionId, reason }: CustomerDecline): Promise<void> {
    const estimate = await scope.rows(Estimate).getForUpdate(from.estimateId);
    const revision = await this.revision(scope, estimate, revisionId);
    if (revision.status === 'declined') return;
    refuse(refuseDecline(revision));
    await scope.rows(EstimateRevision).update(revision, { status: 'declined', declineReason: reason });
    await updateStanding(scope, estimate, (await shopOf(scope)).timeZone);
    await lettersToShop(scope, this.origin, estimate, declinedNews(reason));
  }

  /** A draft is none of the customer's business: to them it does not exist. */
  private async revision(scope: ShopScope, estimate: Estimate, id: string): Promise<EstimateRevision> {
    const revision = (await revisionsOf(scope, estimate.id)).find((row) => row.id === id);
    if (!revision || revision.status === 'draft') throw notFound('This estimate');
    return revision;
  }

  private store(
    scope: ShopScope,
    { estimateId, linkId, address, userAgent }: Origin,
    revision: EstimateRevision,
    name: string,
  ): Promise<EstimateAcceptance> {
    const { id: revisionId, document, documentHash } = revision;
    if (!document || documentHash === null) throw new TypeError('What was sent has a document and its hash.');
    return scope.rows(EstimateAcceptance).insert({
      id: scope.newId(),
      estimateId,
      revisionId,
      linkId,
      name,
      address,
      userAgent,
      document: acceptedText(document),
      documentHash,
    });
  }

  private async tell(
    scope: ShopScope,
    shop: Shop,
    estimate: Estimate,
    revision: EstimateRevision,
    { name }: EstimateAcceptance,
  ): Promise<void> {
    const price = formatMoney(revision.totalCents, shop.currency);
    await lettersToShop(scope, this.origin, estimate, acceptedNews(name, price));
    const to = await customerAddress(scope, estimate);
    if (to !== null) await sendMail(scope, { to, ...thanksLetter(shop, estimate, revision, name) });
  }
}

function sameYes(earlier: EstimateAcceptance, input: AcceptEstimate): EstimateAcceptance {
  const same =
    earlier.revisionId === input.revisionId &&
    earlier.documentHash === input.documentHash &&
    earlier.name === input.name;
  if (!same) throw conflict('This estimate was accepted already.');
  return earlier;
}
