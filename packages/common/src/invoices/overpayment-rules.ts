import type { Cents } from '../money/cents.js';
import { formatMoney } from '../money/format.js';
import type { Refusal } from '../problems/problem.js';
import type { PaymentKind, PaymentMethod } from './invoice-standings.js';

/** The least and the most that the payment provider charges a card in one go, in US dollars. */
export const LEAST_CARD_CENTS = 50;
export const MOST_CARD_CENTS = 99_999_999;

export function cardTakes(balanceCents: Cents): boolean {
  return balanceCents >= LEAST_CARD_CENTS && balanceCents <= MOST_CARD_CENTS;
}

/**
 * What money that has come already pays of an invoice, and what of it is more than is owed. A card payment cannot be
 * refused once the card was charged: the customer may have been on the provider's page while a check was recorded. What
 * is too much is kept apart and owed back, never lost and never shown as paid.
 */
export function applyReceived(
  amountCents: Cents,
  balanceCents: Cents,
): { appliedCents: Cents; excessCents: Cents } {
  const appliedCents = Math.min(amountCents, Math.max(0, balanceCents));
  return { appliedCents, excessCents: amountCents - appliedCents };
}

/** Why a payment cannot be taken back, or null. What a card paid is undone where it was charged, not by a correction. */
export function refuseReversal(payment: {
  kind: PaymentKind;
  method: PaymentMethod;
  reversed: boolean;
}): Refusal | null {
  if (payment.kind !== 'payment') return conflict('Only a payment that came in can be taken back.');
  if (payment.method === 'card')
    return conflict('The card was really charged. Refund it at the payment provider instead.');
  return payment.reversed ? conflict('This payment was taken back already.') : null;
}

/** Why what was too much cannot be given back, or null. */
export function refuseRefund(
  overpaidCents: Cents,
  refund: { amountCents: Cents; paidOn: string },
  today: string,
  currency: string,
): Refusal | null {
  if (overpaidCents === 0) return conflict('Nothing is held for this customer on this invoice.');
  if (refund.paidOn > today) return at('paidOn', 'Money cannot have gone out in the future.');
  if (refund.amountCents <= overpaidCents) return null;
  return at('amountCents', `This is more than the ${formatMoney(overpaidCents, currency)} that is held.`);
}

function conflict(detail: string): Refusal {
  return { code: 'conflict', detail };
}

function at(path: string, detail: string): Refusal {
  return { code: 'conflict', detail, fields: [{ path, message: detail }] };
}
