import type { ShopScope } from '@bookmatch/api/platform/database/scope';
import { Invoice } from '@bookmatch/api/features/invoices/invoices-public';
import { JobBillingStage } from '@bookmatch/api/features/jobs/jobs-public';
import {
  createInvoiceSchema,
  recordPaymentSchema,
  type CreateInvoiceInput,
} from '@bookmatch/common/invoices/invoices-contract';
import type { RecordedMethod } from '@bookmatch/common/invoices/invoice-standings';
import type { DateText } from '@bookmatch/common/calendar/shop-dates';
import type { Person } from '../cast/people.js';
import type { Desk } from './desk.js';
import { submitHostedPage } from './hosted-page.js';
import { reading } from './opening.js';
import type { Trail } from './trail.js';

export type Received = { by: RecordedMethod; share: number; on: DateText; reference: string };

/** What is done about one invoice, by the bookkeeper and by the customer. */
export class InvoiceMaker {
  constructor(
    private readonly desk: Desk,
    private readonly trail: Trail,
    /** Under which the invoice's id is kept. */
    private readonly name: string,
  ) {}

  /** The draft of a billing stage: the one that the acceptance made, or a new one. */
  async draftStage(scope: ShopScope, jobId: string, position: number): Promise<void> {
    const stages = await scope.rows(JobBillingStage).findBy({ jobId }, 'position');
    const stage = stages[position];
    if (!stage) throw new RangeError(`The job has no stage ${position}.`);
    const { drafts } = this.desk.services.invoices;
    const input = { from: 'stage', jobId, billingStageId: stage.id } as const;
    this.trail.keep(this.name, stage.invoiceId ?? (await drafts.create(scope, input)).id);
  }

  async draftLines(scope: ShopScope, input: Omit<Extract<CreateInvoiceInput, { from: 'lines' }>, 'from'>) {
    const { drafts } = this.desk.services.invoices;
    const draft = await drafts.create(scope, createInvoiceSchema.parse({ from: 'lines', ...input }));
    this.trail.keep(this.name, draft.id);
  }

  /** Issues it and sends it to the customer. */
  async issue(scope: ShopScope, to: string): Promise<void> {
    const { id, version } = await this.read(scope);
    await this.desk.services.invoices.issuing.issue(scope, id, version);
    await this.send(scope, to, '');
  }

  async send(scope: ShopScope, to: string, message: string): Promise<void> {
    const { id, version } = await this.read(scope);
    await this.desk.services.invoices.letters.sendInvoice(scope, id, { to, message }, version);
  }

  async receive(scope: ShopScope, { by, share, on, reference }: Received): Promise<void> {
    const { id, version, balanceCents } = await this.read(scope);
    // Part of it is paid in whole dollars.
    const amountCents = share === 1 ? balanceCents : Math.round((balanceCents * share) / 100) * 100;
    const payment = recordPaymentSchema.parse({ method: by, amountCents, receivedOn: on, reference });
    const { id: paymentId } = await this.desk.services.invoices.payments.record(scope, id, payment, version);
    this.trail.keep(`payment of ${this.name}`, paymentId);
  }

  /** The last payment was not good. */
  async takeBack(scope: ShopScope, reason: string): Promise<void> {
    const paymentId = this.trail.id(`payment of ${this.name}`);
    await this.desk.services.invoices.payments.reverse(scope, paymentId, { reason });
  }

  /** Of an amount with its tax, or of all that is owed. */
  async credit(scope: ShopScope, reason: string, amountCents?: number): Promise<void> {
    const { id, version } = await this.read(scope);
    const input = amountCents === undefined ? { reason } : { reason, amountCents };
    await this.desk.services.invoices.credits.credit(scope, id, input, version);
  }

  /** The customer pays all that is owed on the provider's page, and comes back from it. */
  async payByCard(payer: { reader: Person; at: Date }): Promise<void> {
    const { cards } = this.desk.services.invoices;
    const { links } = this.desk.services;
    const subjectId = this.trail.id(this.name);
    const { rows } = await reading(this.desk, payer.reader, payer.at, (scope) =>
      links.list(scope, { subject: 'invoice', subjectId }),
    );
    const [newest] = rows;
    if (!newest) throw new RangeError(`${this.name} was not sent.`);
    const stamp = {
      author: { kind: 'customer', linkId: newest.id },
      requestId: 'demo',
      now: payer.at,
    } as const;
    const page = links.addressOf(newest.id);
    const back = { paid: `${page}?payment=made`, canceled: `${page}?payment=canceled` };
    const request = { stamp, shopId: this.desk.shopId, invoiceId: subjectId };
    const { url } = await cards.start({ ...request, linkId: newest.id, back });
    await submitHostedPage(url, { card: 'pays' });
    await cards.check(request);
  }

  private read(scope: ShopScope): Promise<Invoice> {
    return scope.rows(Invoice).get(this.trail.id(this.name));
  }
}
