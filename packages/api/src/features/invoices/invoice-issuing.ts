import { addDays } from '@bookmatch/common/calendar/shop-dates';
import { issueRefusals } from '@bookmatch/common/invoices/invoice-totals';
import { entryKindOf, postInvoice } from '@bookmatch/common/ledger/postings';
import type { ShopScope } from '../../platform/database/scope.js';
import { conflict } from '../../platform/http/problem-error.js';
import { openBooks, postEntry } from '../ledger/ledger-public.js';
import { shopOf, takeNumber, todayAt, type Shop } from '../shops/shops-public.js';
import { earnDeposits } from './earned-deposits.js';
import type { InvoiceDrafts } from './invoice-drafts.js';
import { InvoiceLine } from './invoice-line.entity.js';
import { Invoice } from './invoice.entity.js';
import { currentFrame } from './issued-frame.js';

/** Gives drafts their number. */
export class InvoiceIssuing {
  constructor(private readonly drafts: InvoiceDrafts) {}

  /** Number, dates, the frozen frame, and the books. @throws stale-version, conflict */
  async issue(scope: ShopScope, id: string, version: number): Promise<Invoice> {
    await openBooks(scope);
    const draft = await this.drafts.lockDraft(scope, id);
    await this.refuseUnfit(scope, draft);
    const shop = await shopOf(scope);
    const today = todayAt(shop, scope.now);
    const dueOn = dueDate(draft, shop, today);
    const frame = await currentFrame(scope, draft);
    const number = await takeNumber(scope, 'invoice');
    const issued = await scope.rows(Invoice).update(
      draft,
      {
        number,
        numberOrder: number,
        status: 'issued',
        issuedOn: today,
        issuedOrder: today,
        dueOn,
        dueOrder: dueOn,
        balanceCents: draft.totalCents,
        frame,
      },
      version,
    );
    await this.book(scope, issued, today);
    return issued;
  }

  private async refuseUnfit(scope: ShopScope, draft: Invoice): Promise<void> {
    const lines = await scope.rows(InvoiceLine).findBy({ invoiceId: draft.id }, 'position');
    const [refusal] = issueRefusals(lines, draft);
    if (refusal) throw conflict(refusal);
  }

  private async book(scope: ShopScope, issued: Invoice, today: string): Promise<void> {
    await postEntry(scope, {
      kind: entryKindOf(issued.kind),
      on: today,
      memo: `Invoice ${issued.number}`,
      source: { kind: 'invoice', id: issued.id },
      invoiceId: issued.id,
      lines: postInvoice(issued.kind, issued, issued),
    });
    if (issued.jobId) await earnDeposits(scope, issued.jobId, today);
  }
}

function dueDate(draft: Invoice, shop: Shop, today: string): string {
  if (draft.dueOn === null) return addDays(today, shop.invoiceDueDays);
  if (draft.dueOn < today) throw conflict('The due date has passed. Choose a later one, or leave it empty.');
  return draft.dueOn;
}
