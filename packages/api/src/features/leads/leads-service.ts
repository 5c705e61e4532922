import { reopenedStage } from '@bookmatch/common/leads/lead-stages';
import type {
  AddLeadNote,
  CreateLead,
  Lead as LeadView,
  LeadNote as NoteView,
  LoseLead,
  MoveLead,
  UpdateLead,
} from '@bookmatch/common/leads/leads-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { conflict, notFound } from '../../platform/http/problem-error.js';
import { Customer } from '../customers/customers-public.js';
import { memberNames } from '../shops/shops-public.js';
import type { LeadHooks } from './lead-hooks.js';
import { LeadNote } from './lead-note.entity.js';
import { LeadStageChange } from './lead-stage-change.entity.js';
import { lockLead, NOT_LOST, recordStage, stepLead } from './lead-steps.js';
import { notesOf, viewLead, viewNote } from './lead-view.js';
import { Lead } from './lead.entity.js';

/** In a list by next step, leads without one come last: lists are paged by columns that are never empty. */
const NO_NEXT_STEP = '9999-12-31';

/** Leads: inquiries, followed up until they are won or lost. */
export class LeadsService {
  constructor(private readonly hooks: Pick<LeadHooks, 'estimatesOf'>) {}

  async get(scope: ShopScope, id: string): Promise<LeadView> {
    return this.view(scope, await scope.rows(Lead).get(id));
  }

  async create(scope: ShopScope, input: CreateLead): Promise<LeadView> {
    await requireCustomer(scope, input.customerId);
    const lead = await scope.rows(Lead).insert({
      ...input,
      ...NOT_LOST,
      id: scope.newId(),
      nextStepOrder: input.nextStepOn ?? NO_NEXT_STEP,
      siteId: null,
      stage: 'new',
      stageChangedAt: scope.now,
    });
    await recordStage(scope, lead.id, null, 'new');
    return this.view(scope, lead);
  }

  async update(scope: ShopScope, id: string, input: UpdateLead, version: number): Promise<LeadView> {
    const lead = await lockLead(scope, id, version);
    const { nextStepOn, customerId } = input;
    const order = nextStepOn === undefined ? {} : { nextStepOrder: nextStepOn ?? NO_NEXT_STEP };
    const moves = customerId !== undefined && customerId !== lead.customerId;
    if (moves) await this.checkCustomerChange(scope, lead, customerId);
    // The site was the former customer's.
    const site = moves ? { siteId: null } : {};
    return this.view(scope, await scope.rows(Lead).update(lead, { ...input, ...order, ...site }));
  }

  /** By hand, between the open stages. */
  async move(scope: ShopScope, id: string, input: MoveLead, version: number): Promise<LeadView> {
    const lead = await lockLead(scope, id, version);
    return this.view(scope, await stepLead(scope, lead, { to: input.stage, by: 'move' }));
  }

  /** Won by hand: the work was agreed without an estimate of ours. */
  async win(scope: ShopScope, id: string, version: number): Promise<LeadView> {
    const lead = await lockLead(scope, id, version);
    return this.view(scope, await stepLead(scope, lead, { to: 'won', by: 'win', patch: NOT_LOST }));
  }

  async lose(scope: ShopScope, id: string, input: LoseLead, version: number): Promise<LeadView> {
    const lead = await lockLead(scope, id, version);
    const patch = { lostReason: input.reason, lostNote: input.note };
    return this.view(scope, await stepLead(scope, lead, { to: 'lost', by: 'lose', patch }));
  }

  /** Back to the stage it was lost from. */
  async reopen(scope: ShopScope, id: string, version: number): Promise<LeadView> {
    const lead = await lockLead(scope, id, version);
    const lost = (await scope.rows(LeadStageChange).findBy({ leadId: id, toStage: 'lost' }, 'id')).at(-1);
    const to = reopenedStage(lost?.fromStage ?? null);
    return this.view(scope, await stepLead(scope, lead, { to, by: 'reopen', patch: NOT_LOST }));
  }

  async notes(scope: ShopScope, id: string): Promise<{ rows: NoteView[] }> {
    await scope.rows(Lead).get(id);
    return { rows: await notesOf(scope, id) };
  }

  async addNote(scope: ShopScope, id: string, input: AddLeadNote): Promise<NoteView> {
    const { id: leadId } = await scope.rows(Lead).get(id);
    const { memberId } = scope;
    const note = await scope.rows(LeadNote).insert({ id: scope.newId(), leadId, memberId, body: input.body });
    return viewNote(note, await memberNames(scope));
  }

  private view(scope: ShopScope, lead: Lead): Promise<LeadView> {
    return viewLead(scope, lead, this.hooks);
  }

  private async checkCustomerChange(scope: ShopScope, lead: Lead, customerId: string | null): Promise<void> {
    await requireCustomer(scope, customerId);
    if ((await this.hooks.estimatesOf(scope, lead.id)).length > 0)
      throw conflict('Estimates were started for this customer, so the lead stays with them.');
  }
}

async function requireCustomer(scope: ShopScope, customerId: string | null): Promise<void> {
  if (customerId !== null && !(await scope.rows(Customer).find(customerId))) throw notFound('This customer');
}
