import type { ShopScope } from '@bookmatch/api/platform/database/scope';
import { Lead } from '@bookmatch/api/features/leads/leads-public';
import {
  createLeadSchema,
  updateLeadSchema,
  type LeadSource,
  type LostReason,
  type OpenLeadStage,
} from '@bookmatch/common/leads/leads-contract';
import type { DateText } from '@bookmatch/common/calendar/shop-dates';
import type { Contact } from '../cast/contacts.js';
import { customerInput, keepCustomer, knownCustomer, siteInput } from './customer-maker.js';
import type { Services } from './desk.js';
import type { Trail } from './trail.js';

export type NextStep = { step: string; on: DateText };
export type NewLead = {
  title: string;
  contact: Contact;
  source: LeadSource;
  expectedCents: number | null;
  next: NextStep | null;
};

/** What is done about one inquiry. Each act reads the lead anew, as somebody at a screen does. */
export class LeadMaker {
  constructor(
    private readonly services: Services,
    private readonly trail: Trail,
    /** Under which the lead's id is kept. */
    private readonly name: string,
  ) {}

  async take(scope: ShopScope, { title, contact, source, expectedCents, next }: NewLead): Promise<void> {
    const lead = await this.services.leads.create(
      scope,
      createLeadSchema.parse({
        ...{ title, source, expectedCents, ...nextFields(next) },
        ...{
          contactName: contact.name,
          company: contact.company,
          email: contact.email,
          phone: contact.phone,
        },
        siteAddress: contact.address,
        customerId: knownCustomer(this.trail, contact)?.customerId ?? null,
      }),
    );
    this.trail.keep(this.name, lead.id);
  }

  async note(scope: ShopScope, body: string): Promise<void> {
    await this.services.leads.addNote(scope, this.trail.id(this.name), { body });
  }

  async move(scope: ShopScope, stage: OpenLeadStage): Promise<void> {
    const { id, version } = await this.read(scope);
    await this.services.leads.move(scope, id, { stage }, version);
  }

  async plan(scope: ShopScope, next: NextStep | null): Promise<void> {
    const { id, version } = await this.read(scope);
    await this.services.leads.update(scope, id, updateLeadSchema.parse(nextFields(next)), version);
  }

  async lose(scope: ShopScope, reason: LostReason, note: string): Promise<void> {
    const { id, version } = await this.read(scope);
    await this.services.leads.lose(scope, id, { reason, note }, version);
  }

  /** Makes a customer and a site of whoever asked, or ties the lead to the customer they are already. */
  async convert(scope: ShopScope, contact: Contact): Promise<void> {
    const { id, version } = await this.read(scope);
    const known = knownCustomer(this.trail, contact);
    const who = known
      ? { customerId: known.customerId }
      : { customer: customerInput(contact), site: siteInput(contact) };
    const { customerId, siteId } = await this.services.conversion.convert(scope, id, who, version);
    if (known || customerId === null || siteId === null) return;
    keepCustomer(this.trail, contact, { customerId, siteId });
  }

  /** Answers the new estimate's id. The lead moves on to estimating. */
  async startEstimate(scope: ShopScope, title: string, contact: Contact): Promise<string> {
    const { id, version } = await this.read(scope);
    const siteId = knownCustomer(this.trail, contact)?.siteId ?? null;
    const started = await this.services.conversion.startEstimate(scope, id, { title, siteId }, version);
    return started.estimateId;
  }

  private read(scope: ShopScope): Promise<Lead> {
    return scope.rows(Lead).get(this.trail.id(this.name));
  }
}

const nextFields = (next: NextStep | null) => ({ nextStep: next?.step ?? '', nextStepOn: next?.on ?? null });
