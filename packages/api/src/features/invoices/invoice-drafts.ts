import { invoiceKindOfStage } from '@bookmatch/common/estimates/billing-stage-kind';
import { invoiceTotals } from '@bookmatch/common/invoices/invoice-totals';
import type {
  CreateInvoice,
  InvoiceLine as TypedLine,
  UpdateInvoice,
} from '@bookmatch/common/invoices/invoices-contract';
import type { InvoiceKind } from '@bookmatch/common/invoices/invoice-standings';
import type { ShopScope } from '../../platform/database/scope.js';
import { conflict, invalid, notFound } from '../../platform/http/problem-error.js';
import { Customer } from '../customers/customers-public.js';
import { Job, JobBillingStage } from '../jobs/jobs-public.js';
import { freeStage } from './invoice-amounts.js';
import { saveLines } from './invoice-lines.js';
import { InvoiceLine } from './invoice-line.entity.js';
import { Invoice } from './invoice.entity.js';
import { NO_DATE_YET, NO_NUMBER_YET } from './list-orders.js';

type Draft = {
  kind: InvoiceKind;
  customerId: string;
  jobId: string | null;
  billingStageId: string | null;
  taxRate: string;
  memo: string;
  lines: readonly TypedLine[];
  amounts: { netCents: number; taxCents: number; totalCents: number };
};

/** Invoices before they are issued. A draft has no number and stands in no book. */
export class InvoiceDrafts {
  async create(scope: ShopScope, input: CreateInvoice): Promise<Invoice> {
    return input.from === 'stage'
      ? this.fromStage(scope, input.jobId, input.billingStageId)
      : this.fromLines(scope, input);
  }

  /** Drafts the invoices that an acceptance makes due at once; nothing is issued by itself. */
  async draftDueOnAcceptance(scope: ShopScope, jobId: string): Promise<void> {
    const stages = await scope.rows(JobBillingStage).findBy({ jobId, due: 'on-acceptance' }, 'position');
    for (const stage of stages) await this.fromStage(scope, jobId, stage.id);
  }

  /** @throws stale-version, conflict */
  async update(scope: ShopScope, id: string, input: UpdateInvoice, version: number): Promise<Invoice> {
    const invoice = await this.lockDraft(scope, id);
    const { lines, taxRate, dueOn, memo } = input;
    if (invoice.billingStageId && (lines !== undefined || taxRate !== undefined))
      throw conflict('The amounts of a billing stage were agreed with the customer and stay as they are.');
    const rows = scope.rows(Invoice);
    const patch = {
      ...(memo === undefined ? {} : { memo }),
      ...(dueOn === undefined ? {} : { dueOn, dueOrder: dueOn ?? NO_DATE_YET }),
      ...(taxRate === undefined ? {} : { taxRate }),
      ...(await this.amountsAfter(scope, invoice, lines, taxRate)),
    };
    const changed = await rows.update(invoice, patch, version);
    const linesChanged = lines !== undefined && (await saveLines(scope, id, lines));
    // Lines that come to the same sum leave the invoice's own row as it was.
    return linesChanged && changed.version === version ? rows.touch(changed) : changed;
  }

  /** @throws stale-version, conflict */
  async remove(scope: ShopScope, id: string, version: number): Promise<void> {
    const invoice = await this.lockDraft(scope, id);
    await freeStage(scope, invoice);
    const lines = scope.rows(InvoiceLine);
    for (const line of await lines.findBy({ invoiceId: id })) await lines.delete(line);
    await scope.rows(Invoice).delete(invoice, version);
  }

  async lockDraft(scope: ShopScope, id: string): Promise<Invoice> {
    const invoice = await scope.rows(Invoice).getForUpdate(id);
    if (invoice.status !== 'draft')
      throw conflict('This invoice was issued and does not change any more. Correct it with a credit note.');
    return invoice;
  }

  /** Takes over a stage of the job's billing schedule as it was accepted. The lock keeps it from being billed twice. */
  private async fromStage(scope: ShopScope, jobId: string, stageId: string): Promise<Invoice> {
    const stages = scope.rows(JobBillingStage);
    const stage = await stages.findOneBy({ id: stageId, jobId }, true);
    if (!stage) throw notFound('This billing stage');
    if (stage.invoiceId)
      throw conflict(`${stage.name} has an invoice already.`, { invoiceId: stage.invoiceId });
    const job = await scope.rows(Job).get(jobId);
    const schedule = await stages.findBy({ jobId }, 'position');
    const invoice = await this.insert(scope, {
      kind: invoiceKindOfStage(schedule, stage.id),
      customerId: job.customerId,
      jobId,
      billingStageId: stage.id,
      taxRate: '0',
      memo: '',
      lines: [stageLine(scope.newId(), stage, job)],
      amounts: stage,
    });
    await stages.update(stage, { invoiceId: invoice.id });
    return invoice;
  }

  private async fromLines(
    scope: ShopScope,
    input: Extract<CreateInvoice, { from: 'lines' }>,
  ): Promise<Invoice> {
    const { customerId, jobId, lines, taxRate, memo } = input;
    await scope.rows(Customer).get(customerId);
    if (jobId && (await scope.rows(Job).get(jobId)).customerId !== customerId)
      throw invalid('jobId', 'This job belongs to another customer.');
    return this.insert(scope, {
      kind: 'other',
      customerId,
      jobId,
      billingStageId: null,
      taxRate,
      memo,
      lines,
      amounts: invoiceTotals(lines, taxRate),
    });
  }

  private async insert(scope: ShopScope, draft: Draft): Promise<Invoice> {
    const { lines, amounts, ...fields } = draft;
    const invoice = await scope.rows(Invoice).insert({
      ...fields,
      id: scope.newId(),
      number: null,
      numberOrder: NO_NUMBER_YET,
      status: 'draft',
      issuedOn: null,
      dueOn: null,
      issuedOrder: NO_DATE_YET,
      dueOrder: NO_DATE_YET,
      netCents: amounts.netCents,
      taxCents: amounts.taxCents,
      totalCents: amounts.totalCents,
      paidCents: 0,
      creditedCents: 0,
      balanceCents: 0,
      overpaidCents: 0,
      depositEarnedOn: null,
      frame: null,
    });
    await saveLines(scope, invoice.id, lines);
    return invoice;
  }

  private async amountsAfter(
    scope: ShopScope,
    invoice: Invoice,
    lines: readonly TypedLine[] | undefined,
    taxRate: string | undefined,
  ) {
    if (lines === undefined && taxRate === undefined) return {};
    const typed = lines ?? (await scope.rows(InvoiceLine).findBy({ invoiceId: invoice.id }, 'position'));
    return invoiceTotals(typed, taxRate ?? invoice.taxRate);
  }
}

/** The one line of a stage's invoice says what it bills and for which job. */
function stageLine(id: string, stage: JobBillingStage, job: Job): TypedLine {
  return {
    id,
    description: `${stage.name}: ${job.title} (job ${job.number})`,
    quantity: '1',
    unitPriceCents: stage.netCents,
    taxable: stage.taxCents !== 0,
  };
}
