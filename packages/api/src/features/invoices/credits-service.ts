import { creditShare, refuseCredit } from '@bookmatch/common/invoices/payment-rules';
import type { CreditInvoice } from '@bookmatch/common/invoices/invoices-contract';
import { postCreditNote } from '@bookmatch/common/ledger/postings';
import type { ShopScope } from '../../platform/database/scope.js';
import { refuse } from '../../platform/http/problem-error.js';
import { openBooks, postEntry } from '../ledger/ledger-public.js';
import { shopOf, takeNumber, todayAt } from '../shops/shops-public.js';
import { withdrawCheckouts } from './checkout-withdrawal.js';
import { CreditNote } from './credit-note.entity.js';
import { moveAmounts } from './invoice-amounts.js';
import { Invoice } from './invoice.entity.js';

/** Credit notes: what is taken off an issued invoice that is not paid yet. */
export class CreditsService {
  /** Of an amount, or of all that is still owed. @throws stale-version, conflict with the field */
  async credit(
    scope: ShopScope,
    invoiceId: string,
    input: CreditInvoice,
    version: number,
  ): Promise<CreditNote> {
    await openBooks(scope);
    const invoice = await scope.rows(Invoice).getForUpdate(invoiceId);
    const shop = await shopOf(scope);
    const today = todayAt(shop, scope.now);
    const amountCents = input.amountCents ?? invoice.balanceCents;
    refuse(refuseCredit({ ...invoice, currency: shop.currency }, amountCents));
    const share = creditShare(invoice, invoice.creditedCents, amountCents);
    await moveAmounts(scope, invoice, { creditedCents: invoice.creditedCents + amountCents }, version);
    await withdrawCheckouts(scope, invoiceId);
    const note = await scope.rows(CreditNote).insert({
      ...share,
      id: scope.newId(),
      invoiceId,
      number: await takeNumber(scope, 'credit-note'),
      issuedOn: today,
      amountCents,
      reason: input.reason,
      memberId: scope.memberId,
    });
    await postEntry(scope, {
      kind: 'credit-note',
      on: today,
      memo: `Credit note ${note.number} on invoice ${invoice.number}`,
      source: { kind: 'credit-note', id: note.id },
      invoiceId,
      lines: postCreditNote(share, isUnearnedDeposit(invoice), invoice),
    });
    return note;
  }
}

const isUnearnedDeposit = ({ kind, depositEarnedOn }: Invoice): boolean =>
  kind === 'deposit' && depositEarnedOn === null;
