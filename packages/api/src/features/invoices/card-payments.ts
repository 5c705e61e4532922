import type Stripe from 'stripe';
import type { ShopScope } from '../../platform/database/scope.js';
import { systemStamp, type Stamp } from '../../platform/database/stamp.js';
import type { UnitOfWork } from '../../platform/database/unit-of-work.js';
import { conflict } from '../../platform/http/problem-error.js';
import type { Payments } from '../../platform/payments/payments-client.js';
import type { CardSettlement } from './card-settlement.js';
import { CardCheckout } from './card-checkout.entity.js';
import { askForCheckout, giveUp, noteOpened } from './checkout-asking.js';
import { createSession, wasRefused, type ReturnAddress } from './checkout-session.js';
import type { ClosingCheckout } from './checkout-withdrawal.js';
import { Invoice } from './invoice.entity.js';

type CardParts = { payments: Payments; work: UnitOfWork; clock: () => Date; settlement: CardSettlement };
type InShop = { stamp: Stamp; shopId: string };
export type CardStart = InShop & { invoiceId: string; linkId: string; back: ReturnAddress };

/**
 * Card payments on the provider's own page, in the shop's connected account. The state is written before the provider is
 * called and after, and each checkout's own id is the key of the call, so that a process that dies in between neither
 * loses nor doubles anything: the next try gets the same page.
 */
export class CardPayments {
  constructor(private readonly parts: CardParts) {}

  /** The page to pay the whole balance on: the one that is open already, when there is one. @throws conflict */
  async start(request: CardStart): Promise<{ url: string }> {
    const asked = await this.inShop(request, (scope) => askForCheckout(scope, request));
    if (asked.status === 'asked') return this.open(request, asked);
    const url = await this.urlIfOpen(request, asked);
    if (url) return { url };
    // The older page is closed by now: what it brought is settled, and what is still owed gets a page of its own.
    return this.open(request, await this.inShop(request, (scope) => askForCheckout(scope, request)));
  }

  /** Asks the provider how the invoice's payment pages stand, for a customer who has just come back from one. */
  async check({ stamp, shopId, invoiceId }: InShop & { invoiceId: string }): Promise<void> {
    const unsettled = await this.inShop({ stamp, shopId }, (scope) =>
      scope.rows(CardCheckout).findBy({ invoiceId, status: ['open', 'withdrawn'] }, 'id'),
    );
    for (const { accountId, sessionId } of unsettled)
      if (sessionId)
        await this.parts.settlement.settle({ accountId, sessionId, stamp, happenedAt: stamp.now });
  }

  /** The provider says that a session was paid or has expired. */
  async onSession(event: Stripe.Event): Promise<void> {
    if (!event.account) return;
    const now = this.parts.clock();
    await this.parts.settlement.settle({
      accountId: event.account,
      sessionId: (event.data.object as Stripe.Checkout.Session).id,
      stamp: systemStamp(event.id, now),
      happenedAt: new Date(Math.min(event.created * 1000, now.getTime())),
    });
  }

  /** Closes a page that asks for too much. One that was paid meanwhile is settled instead. */
  async close({ sessionId, accountId }: ClosingCheckout, cause: string): Promise<void> {
    const { sessions } = this.parts.payments.checkout;
    const options = { stripeAccount: accountId };
    const { status } = await sessions.retrieve(sessionId, {}, options);
    if (status === 'open') await sessions.expire(sessionId, {}, options);
    const now = this.parts.clock();
    await this.parts.settlement.settle({
      accountId,
      sessionId,
      stamp: systemStamp(cause, now),
      happenedAt: now,
    });
  }

  private async open(request: CardStart, checkout: CardCheckout): Promise<{ url: string }> {
    const invoice = await this.inShop(request, (scope) => scope.rows(Invoice).get(request.invoiceId));
    const session = await createSession(this.parts.payments, checkout, invoice, request.back).catch(
      async (error: unknown) => {
        // The provider keeps its refusal under the key, so the next try needs a checkout of its own.
        if (wasRefused(error)) await this.inShop(request, (scope) => giveUp(scope, checkout.id));
        throw error;
      },
    );
    const wanted = await this.inShop(request, (scope) => noteOpened(scope, checkout.id, session));
    if (!wanted || session.url === null) throw conflict('What is owed has changed. Open the invoice again.');
    return { url: session.url };
  }

  private async urlIfOpen({ stamp }: InShop, { sessionId, accountId }: CardCheckout): Promise<string | null> {
    if (!sessionId) return null;
    const session = await this.parts.payments.checkout.sessions.retrieve(
      sessionId,
      {},
      { stripeAccount: accountId },
    );
    if (session.status === 'open' && session.url) return session.url;
    await this.parts.settlement.settle({ accountId, sessionId, stamp, happenedAt: stamp.now });
    return null;
  }

  private inShop<Result>(
    { stamp, shopId }: InShop,
    work: (scope: ShopScope) => Promise<Result>,
  ): Promise<Result> {
    return this.parts.work.transaction(stamp, (scope) => work(scope.forShop(shopId)));
  }
}
