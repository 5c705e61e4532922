import type { DateText } from '../calendar/shop-dates.js';
import type { Cents } from '../money/cents.js';
import { formatMoney } from '../money/format.js';
import { splitCents } from '../money/split.js';
import type { Refusal } from '../problems/problem.js';
import type { InvoiceStatus } from './invoice-standings.js';
import { balanceOf, type InvoiceAmounts } from './invoice-standing.js';

export type PayableInvoice = InvoiceAmounts & { status: InvoiceStatus; currency: string };

/**
 * Why a payment cannot be recorded, or null. More than the balance is refused: it would be money of the customer's that
 * nothing in the books stands for.
 */
export function refusePayment(
  invoice: PayableInvoice,
  payment: { amountCents: Cents; receivedOn: DateText },
  today: DateText,
): Refusal | null {
  const settled = refuseSettled(invoice, 'paid');
  if (settled) return settled;
  if (payment.receivedOn > today) return refusal('receivedOn', 'A payment cannot be received in the future.');
  return refuseAmount(invoice, payment.amountCents, 'payment');
}

/** Why a credit cannot be given, or null. Only what is still owed can be credited; what was paid is refunded. */
export function refuseCredit(invoice: PayableInvoice, amountCents: Cents): Refusal | null {
  return refuseSettled(invoice, 'credited') ?? refuseAmount(invoice, amountCents, 'credit');
}

/**
 * The net and tax of a credit, in the proportion of the invoice. Each credit is what all credits up to it come to less
 * what the earlier ones came to, so that credits of the whole invoice give back its net and tax to the cent.
 */
export function creditShare(
  invoice: { netCents: Cents; taxCents: Cents },
  creditedBefore: Cents,
  amountCents: Cents,
): { netCents: Cents; taxCents: Cents } {
  const taxBefore = taxOf(invoice, creditedBefore);
  const taxCents = taxOf(invoice, creditedBefore + amountCents) - taxBefore;
  return { netCents: amountCents - taxCents, taxCents };
}

function taxOf({ netCents, taxCents }: { netCents: Cents; taxCents: Cents }, creditedCents: Cents): Cents {
  return splitCents(creditedCents, [netCents, taxCents])[1]!;
}

function refuseSettled({ status }: PayableInvoice, verb: 'paid' | 'credited'): Refusal | null {
  if (status === 'issued') return null;
  const why: Record<Exclude<InvoiceStatus, 'issued'>, string> = {
    draft: `A draft cannot be ${verb}. Issue it first.`,
    paid: 'This invoice is paid already.',
    credited: 'This invoice was credited, and nothing is owed on it.',
  };
  return { code: 'conflict', detail: why[status] };
}

function refuseAmount(
  invoice: PayableInvoice,
  amountCents: Cents,
  what: 'payment' | 'credit',
): Refusal | null {
  if (amountCents <= 0) return refusal('amountCents', `A ${what} must be above zero.`);
  const balance = balanceOf(invoice);
  if (amountCents <= balance) return null;
  const owed = formatMoney(balance, invoice.currency);
  return refusal('amountCents', `This ${what} is more than the ${owed} that is owed.`);
}

function refusal(path: string, detail: string): Refusal {
  return { code: 'conflict', detail, fields: [{ path, message: detail }] };
}
