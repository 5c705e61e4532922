import { isOpenLead } from '@bookmatch/common/leads/lead-stages';
import type {
  ConvertLead,
  Lead as LeadView,
  StartedEstimate,
  StartEstimate,
} from '@bookmatch/common/leads/leads-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { conflict, notFound } from '../../platform/http/problem-error.js';
import { Customer, type CustomersService } from '../customers/customers-public.js';
import type { LeadHooks } from './lead-hooks.js';
import { lockLead, stepLead } from './lead-steps.js';
import { viewLead } from './lead-view.js';
import { Lead } from './lead.entity.js';

/** The step from an inquiry to a customer with a site, and on to an estimate. */
export class LeadConversion {
  constructor(
    private readonly customers: CustomersService,
    private readonly hooks: LeadHooks,
  ) {}

  /** Ties the lead to a customer, new or known, and makes the site if one is given. */
  async convert(scope: ShopScope, id: string, input: ConvertLead, version: number): Promise<LeadView> {
    const lead = await lockLead(scope, id, version);
    refuseLost(lead);
    if (lead.customerId !== null && lead.customerId !== input.customerId)
      throw conflict('This lead belongs to a customer already.');
    const customerId = await this.customerFor(scope, input);
    const site = input.site && (await this.customers.addSite(scope, customerId, input.site));
    const patch = { customerId, ...(site ? { siteId: site.id } : {}) };
    return viewLead(scope, await scope.rows(Lead).update(lead, patch), this.hooks);
  }

  /** Starts an estimate for the lead's customer and moves the lead on to `estimating`. */
  async startEstimate(
    scope: ShopScope,
    id: string,
    { title, siteId }: StartEstimate,
    version: number,
  ): Promise<StartedEstimate> {
    const lead = await lockLead(scope, id, version);
    refuseLost(lead);
    const { customerId } = lead;
    if (customerId === null) throw conflict('Say first which customer the estimate is for.');
    if (isOpenLead(lead.stage) && lead.stage !== 'estimating')
      await stepLead(scope, lead, { to: 'estimating', by: 'move' });
    const estimate = { title, customerId, siteId: siteId === undefined ? lead.siteId : siteId, leadId: id };
    return { estimateId: await this.hooks.startEstimate(scope, estimate) };
  }

  private async customerFor(scope: ShopScope, { customer, customerId }: ConvertLead): Promise<string> {
    if (customer) return (await this.customers.create(scope, customer)).id;
    const known = customerId === undefined ? null : await scope.rows(Customer).find(customerId);
    if (!known) throw notFound('This customer');
    return known.id;
  }
}

function refuseLost(lead: Lead): void {
  if (lead.stage === 'lost') throw conflict('A lost lead has to be reopened first.');
}
