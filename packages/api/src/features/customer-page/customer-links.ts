import type { Action, Subject } from '@bookmatch/common/access/ability';
import type {
  CreatedLink,
  CreateLink,
  Link,
  LinkQuery,
  LinkSubject,
} from '@bookmatch/common/customer-page/links-contract';
import type { Rows } from '@bookmatch/common/wire/list';
import type { GlobalScope, ShopScope } from '../../platform/database/scope.js';
import { notAllowed, notFound, ProblemError } from '../../platform/http/problem-error.js';
import type { ResolvedLink } from '../../platform/http/route.js';
import { CustomerLink } from './customer-link.entity.js';
import { LinkSigner } from './link-signer.js';

/** What a link is about, and whose it is. */
export type LinkTarget = { subject: LinkSubject; subjectId: string; customerId: string };
/** Finds the customer of what may be shown behind a link. @throws conflict when it may not be shown yet */
export type CustomerOf = (scope: ShopScope, subjectId: string) => Promise<string>;

const DAY_MS = 86_400_000;
/** An estimate's link outlives the estimate, so that who comes late reads that it has expired. */
const LINK_DAYS = 180;
const SEEN_EVERY_MS = 3_600_000;
const SUBJECTS = { estimate: 'Estimate', invoice: 'Invoice' } as const satisfies Record<LinkSubject, Subject>;

/** Customers' links: made for a letter or by hand, found again by their token, revoked. */
export class CustomerLinks {
  private readonly signer: LinkSigner;

  constructor(
    private readonly config: { origin: string; secret: string },
    private readonly customerOf: Record<LinkSubject, CustomerOf>,
  ) {
    this.signer = new LinkSigner(config.secret);
  }

  /** Makes a link for a letter that is on its way, and answers its address. */
  async addressFor(scope: ShopScope, target: LinkTarget): Promise<string> {
    return this.urlOf(await this.insert(scope, target));
  }

  /** The address of a link that there is. */
  addressOf(linkId: string): string {
    return this.urlOf({ id: linkId });
  }

  /** Makes a link by hand and shows its address, this once. */
  async create(scope: ShopScope, { subject, subjectId }: CreateLink): Promise<CreatedLink> {
    refuseUnlessMay(scope, 'send', subject);
    const customerId = await this.customerOf[subject](scope, subjectId);
    const link = await this.insert(scope, { subject, subjectId, customerId });
    return { ...viewLink(link), url: this.urlOf(link) };
  }

  /** The newest first. */
  async list(scope: ShopScope, { subject, subjectId }: LinkQuery): Promise<Rows<Link>> {
    refuseUnlessMay(scope, 'read', subject);
    const where = subject === 'estimate' ? { estimateId: subjectId } : { invoiceId: subjectId };
    const links = await scope.rows(CustomerLink).findBy(where, 'createdAt');
    return { rows: links.toReversed().map(viewLink) };
  }

  /** The link stops working at once. */
  async revoke(scope: ShopScope, id: string): Promise<Link> {
    const links = scope.rows(CustomerLink);
    const link = await links.getForUpdate(id);
    refuseUnlessMay(scope, 'send', subjectOf(link).subject);
    return viewLink(link.revokedAt ? link : await links.update(link, { revokedAt: scope.now }));
  }

  /**
   * What a token opens.
   * @throws not-found for a token that is not ours, link-expired for one that was
   */
  async resolve(scope: GlobalScope, token: string): Promise<ResolvedLink> {
    const id = this.signer.idIn(token);
    const [link] = id === null ? [] : await scope.acrossShops(CustomerLink, { id });
    if (!link) throw notFound('This link');
    if (link.revokedAt || link.expiresAt <= scope.now)
      throw new ProblemError('link-expired', 'This link no longer works. Ask the shop for a new one.');
    await this.noteSeen(scope.forShop(link.shopId), link);
    return { id: link.id, shopId: link.shopId, customerId: link.customerId, ...subjectOf(link) };
  }

  /** Kept to the hour: the shop wants to know that it was read, not each click. */
  private async noteSeen(scope: ShopScope, link: CustomerLink): Promise<void> {
    const seen = link.lastSeenAt?.getTime() ?? 0;
    if (scope.now.getTime() - seen >= SEEN_EVERY_MS)
      await scope.rows(CustomerLink).update(link, { lastSeenAt: scope.now });
  }

  private insert(scope: ShopScope, { subject, subjectId, customerId }: LinkTarget): Promise<CustomerLink> {
    return scope.rows(CustomerLink).insert({
      id: scope.newId(),
      customerId,
      estimateId: subject === 'estimate' ? subjectId : null,
      invoiceId: subject === 'invoice' ? subjectId : null,
      expiresAt: new Date(scope.now.getTime() + LINK_DAYS * DAY_MS),
      revokedAt: null,
      lastSeenAt: null,
    });
  }

  private urlOf({ id }: { id: string }): string {
    return `${this.config.origin}/c/${this.signer.tokenOf(id)}`;
  }
}

/** Estimates and invoices have links alike, but not the same people may give them out. */
function refuseUnlessMay(scope: ShopScope, action: Action, subject: LinkSubject): void {
  if (!scope.can(action, SUBJECTS[subject])) throw notAllowed();
}

function subjectOf({ estimateId, invoiceId }: CustomerLink): { subject: LinkSubject; subjectId: string } {
  if (estimateId !== null) return { subject: 'estimate', subjectId: estimateId };
  if (invoiceId !== null) return { subject: 'invoice', subjectId: invoiceId };
  throw new TypeError('A link is about an estimate or an invoice.');
}

function viewLink(link: CustomerLink): Link {
  return {
    id: link.id,
    ...subjectOf(link),
    createdAt: link.createdAt.toISOString(),
    expiresAt: link.expiresAt.toISOString(),
    revokedAt: link.revokedAt?.toISOString() ?? null,
    lastSeenAt: link.lastSeenAt?.toISOString() ?? null,
  };
}
