import { cardTakes } from '@bookmatch/common/invoices/overpayment-rules';
import type Stripe from 'stripe';
import type { ShopScope } from '../../platform/database/scope.js';
import { conflict } from '../../platform/http/problem-error.js';
import { Customer } from '../customers/customers-public.js';
import { shopOf } from '../shops/shops-public.js';
import { CardCheckout } from './card-checkout.entity.js';
import { withdraw } from './checkout-withdrawal.js';
import { Invoice } from './invoice.entity.js';

/**
 * The invoice's one checkout for what is owed now: the one there is when it fits, else a new one. What does not fit any
 * more is withdrawn.
 *
 * @throws conflict when nothing is owed or the shop takes no cards
 */
export async function askForCheckout(
  scope: ShopScope,
  { invoiceId, linkId }: { invoiceId: string; linkId: string },
): Promise<CardCheckout> {
  const checkouts = scope.rows(CardCheckout);
  const invoice = await scope.rows(Invoice).getForUpdate(invoiceId);
  const amountCents = invoice.balanceCents;
  const accountId = await accountFor(scope, invoice);
  const open = await checkouts.findBy({ invoiceId, status: ['asked', 'open'] }, 'id', true);
  const fits = open.find(
    (one) => one.amountCents === amountCents && one.linkId === linkId && one.accountId === accountId,
  );
  for (const one of open) if (one !== fits) await withdraw(scope, one);
  if (fits) return fits;
  const { email } = await scope.rows(Customer).get(invoice.customerId);
  return checkouts.insert({
    id: scope.newId(),
    invoiceId,
    linkId,
    status: 'asked',
    amountCents,
    payerEmail: email,
    accountId,
    sessionId: null,
    url: null,
    expiresAt: null,
  });
}

/**
 * The provider has made the page. News of its payment may have come before this. Answers whether the page still asks for
 * what is owed; one that does not is closed.
 */
export async function noteOpened(
  scope: ShopScope,
  checkoutId: string,
  session: Stripe.Checkout.Session,
): Promise<boolean> {
  const checkouts = scope.rows(CardCheckout);
  const checkout = await checkouts.getForUpdate(checkoutId);
  const known = {
    sessionId: session.id,
    url: session.url,
    expiresAt: new Date(session.expires_at * 1000),
  };
  if (checkout.status === 'asked') await checkouts.update(checkout, { ...known, status: 'open' });
  if (checkout.status === 'withdrawn') await withdraw(scope, await checkouts.update(checkout, known));
  return checkout.status === 'asked' || checkout.status === 'open';
}

/** The provider refused to make the page. */
export async function giveUp(scope: ShopScope, checkoutId: string): Promise<void> {
  const checkout = await scope.rows(CardCheckout).getForUpdate(checkoutId);
  if (checkout.status === 'asked') await withdraw(scope, checkout);
}

async function accountFor(scope: ShopScope, invoice: Invoice): Promise<string> {
  const shop = await shopOf(scope);
  if (invoice.status !== 'issued') throw conflict('Nothing is owed on this invoice.');
  if (shop.cardPayments !== 'ready' || !shop.paymentAccountId || !cardTakes(invoice.balanceCents))
    throw conflict('This invoice cannot be paid by card. Ask the shop how to pay it.');
  return shop.paymentAccountId;
}
