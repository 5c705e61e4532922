import type { ShopScope } from '@bookmatch/api/platform/database/scope';
import { customerEstimate } from '@bookmatch/api/features/estimates/estimates-public';
import type { BillingStagePlan } from '@bookmatch/common/estimates/billing-schedule-contract';
import type { Estimate } from '@bookmatch/common/estimates/estimates-contract';
import { saveRevisionSchema, type Revision } from '@bookmatch/common/estimates/revision-contract';
import type { Contact } from '../cast/contacts.js';
import type { CatalogRoom } from '../catalog/lines.js';
import type { Work } from '../catalog/work.js';
import type { Desk } from './desk.js';
import type { Trail } from './trail.js';

export type Wording = { work: Work; discountCents: number; schedule: readonly BillingStagePlan[] | null };

/** What is done about one estimate, by the shop and by its customer. */
export class EstimateMaker {
  constructor(
    private readonly desk: Desk,
    private readonly trail: Trail,
    /** Under which the estimate's id is kept. */
    private readonly name: string,
  ) {}

  started(estimateId: string): void {
    this.trail.keep(this.name, estimateId);
  }

  /** Writes the current draft as a whole. */
  async write(scope: ShopScope, { work, discountCents, schedule }: Wording): Promise<void> {
    const { id, currentRevision } = await this.read(scope);
    const content = saveRevisionSchema.parse({
      ...kept(currentRevision),
      ...{ intro: work.intro, exclusions: work.exclusions, discountCents },
      rooms: this.rooms(scope, work.rooms),
      billingSchedule: (schedule ?? plansOf(currentRevision)).map((stage) => ({
        ...stage,
        id: scope.newId(),
      })),
    });
    const key = { id, revisionId: currentRevision.id };
    await this.desk.services.estimates.saveRevision(scope, key, content, currentRevision.version);
  }

  async send(scope: ShopScope, { email }: Contact, message: string): Promise<void> {
    const { id, version, currentRevision } = await this.read(scope);
    const letter = { to: email, message, revisionVersion: currentRevision.version };
    await this.desk.services.sending.send(scope, id, letter, version);
  }

  async revise(scope: ShopScope): Promise<void> {
    const { id, version } = await this.read(scope);
    await this.desk.services.estimates.createRevision(scope, id, version);
  }

  async declineForCustomer(scope: ShopScope, reason: string): Promise<void> {
    const { id, version } = await this.read(scope);
    await this.desk.services.estimates.decline(scope, id, { reason }, version);
  }

  async answer(scope: ShopScope, body: string): Promise<void> {
    const { id, questions } = await this.read(scope);
    const open = questions.find(({ answer }) => answer === null);
    if (!open) throw new RangeError(`Nothing was asked about ${this.name}.`);
    await this.desk.services.questions.answer(scope, { id, questionId: open.id }, body);
  }

  /** The customer opens the link they were sent, and asks. */
  async ask(scope: ShopScope, body: string): Promise<void> {
    const { customer, linkId, estimateId } = await this.openLink(scope);
    await this.desk.services.questions.ask(customer, { estimateId, linkId, body });
  }

  /** The customer opens the link, reads, types their name and accepts what they read. */
  async accept(scope: ShopScope, { name }: Contact): Promise<void> {
    const { customer, linkId, estimateId } = await this.openLink(scope);
    const { document, documentHash } = await customerEstimate(customer, estimateId);
    const read = { revisionId: document.revisionId, documentHash };
    const from = { estimateId, linkId, ...BROWSER };
    await this.desk.services.answers.accept(customer, from, { ...read, name, agreed: true });
  }

  async decline(scope: ShopScope, reason: string): Promise<void> {
    const { customer, linkId, estimateId } = await this.openLink(scope);
    const { document } = await customerEstimate(customer, estimateId);
    const from = { estimateId, linkId, ...BROWSER };
    await this.desk.services.answers.decline(customer, from, { revisionId: document.revisionId, reason });
  }

  /** By the token in the address, so that it is noted as seen. */
  private async openLink(scope: ShopScope) {
    const { links } = this.desk.services;
    const estimateId = this.trail.id(this.name);
    const [newest] = (await links.list(scope, { subject: 'estimate', subjectId: estimateId })).rows;
    if (!newest) throw new RangeError(`${this.name} was not sent.`);
    const customer = this.desk.outsideScope(scope, { kind: 'customer', linkId: newest.id });
    const token = links.addressOf(newest.id).split('/c/')[1] ?? '';
    const { id: linkId } = await links.resolve(customer, token);
    return { customer, linkId, estimateId };
  }

  private rooms(scope: ShopScope, rooms: readonly CatalogRoom[]) {
    return rooms.map(({ name, lines }) => ({
      id: scope.newId(),
      name,
      lines: lines.map(({ operation, ...line }) => ({
        ...line,
        id: scope.newId(),
        operationId: operation === null ? null : this.desk.operationId(operation),
      })),
    }));
  }

  private read(scope: ShopScope): Promise<Estimate> {
    return this.desk.services.estimates.get(scope, this.trail.id(this.name));
  }
}

/** An address kept free for documents (RFC 5737), and no browser in particular. */
const BROWSER = { address: '203.0.113.24', userAgent: 'Mozilla/5.0 (demo)' };

function kept({ validUntil, taxRule, taxRate, terms }: Revision) {
  return { validUntil, taxRule, taxRate, terms };
}

function plansOf({ billingSchedule }: Revision): BillingStagePlan[] {
  return billingSchedule.map(({ name, share, deposit, due }) => ({ name, share, deposit, due }));
}
