import type { Lead as LeadView } from '@bookmatch/common/leads/leads-contract';
import type { ShopScope } from '../../platform/database/scope.js';

/** What `leads` asks of the estimates above it, given by `compose.ts`. */
export type LeadHooks = {
  /** Starts an estimate in the request's transaction and answers its id. */
  startEstimate(
    scope: ShopScope,
    estimate: { title: string; customerId: string; siteId: string | null; leadId: string },
  ): Promise<string>;
  /** The estimates that were started from the lead, by number. */
  estimatesOf(scope: ShopScope, leadId: string): Promise<LeadView['estimates']>;
};
