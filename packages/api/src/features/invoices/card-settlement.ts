import { dateIn } from '@bookmatch/common/calendar/shop-dates';
import { idSchema } from '@bookmatch/common/wire/fields';
import type Stripe from 'stripe';
import type { ShopScope } from '../../platform/database/scope.js';
import type { Stamp } from '../../platform/database/stamp.js';
import type { UnitOfWork } from '../../platform/database/unit-of-work.js';
import type { Payments } from '../../platform/payments/payments-client.js';
import { openBooks } from '../ledger/ledger-public.js';
import { Shop, shopOf } from '../shops/shops-public.js';
import { CardCheckout } from './card-checkout.entity.js';
import type { InvoiceLetters } from './invoice-letters.js';
import { Invoice } from './invoice.entity.js';
import type { PaymentsService } from './payments-service.js';

type SettlementParts = {
  payments: Payments;
  work: UnitOfWork;
  records: PaymentsService;
  letters: InvoiceLetters;
};
export type SessionNews = { accountId: string; sessionId: string; stamp: Stamp; happenedAt: Date };

/**
 * Brings a checkout to where its session at the provider stands. May be asked often, late and in any order: the session
 * itself is read each time, and a checkout is settled once.
 */
export class CardSettlement {
  constructor(private readonly parts: SettlementParts) {}

  /** News about an account of no shop of ours has no effect. */
  async settle({ accountId, sessionId, stamp, happenedAt }: SessionNews): Promise<void> {
    const { work, payments } = this.parts;
    const shop = await work.read(stamp, (scope) =>
      scope.global(Shop).findOneBy({ paymentAccountId: accountId }),
    );
    if (!shop) return;
    const session = await payments.checkout.sessions.retrieve(sessionId, {}, { stripeAccount: accountId });
    await work.transaction(stamp, async (scope) => {
      const inShop = scope.forShop(shop.id);
      await openBooks(inShop);
      const locked = await lockCheckout(inShop, session);
      if (locked && locked.checkout.accountId === accountId)
        await this.note(inShop, locked, session, happenedAt);
    });
  }

  private async note(
    scope: ShopScope,
    { invoice, checkout }: Locked,
    session: Stripe.Checkout.Session,
    happenedAt: Date,
  ): Promise<void> {
    if (checkout.status === 'paid') return;
    if (session.payment_status === 'paid') {
      await scope.rows(CardCheckout).update(checkout, { status: 'paid', sessionId: session.id });
      const { timeZone } = await shopOf(scope);
      const payment = await this.parts.records.receiveCard(scope, invoice, checkout, {
        amountCents: session.amount_total ?? checkout.amountCents,
        on: dateIn(timeZone, happenedAt.toISOString()),
        reference: paymentIdOf(session),
      });
      await this.parts.letters.sendReceiptByItself(scope, payment);
    } else if (session.status === 'expired')
      await scope.rows(CardCheckout).update(checkout, { status: 'expired', sessionId: session.id });
  }
}

type Locked = { invoice: Invoice; checkout: CardCheckout };

/** Invoice first, then checkout: the order in which everything here locks. */
async function lockCheckout(scope: ShopScope, session: Stripe.Checkout.Session): Promise<Locked | null> {
  const id = idSchema.safeParse(session.metadata?.['checkoutId']);
  const found = id.success ? await scope.rows(CardCheckout).find(id.data) : null;
  if (!found) return null;
  const invoice = await scope.rows(Invoice).getForUpdate(found.invoiceId);
  return { invoice, checkout: await scope.rows(CardCheckout).getForUpdate(found.id) };
}

function paymentIdOf({ payment_intent: intent, id }: Stripe.Checkout.Session): string {
  return (typeof intent === 'string' ? intent : (intent?.id ?? id)).slice(0, 80);
}
