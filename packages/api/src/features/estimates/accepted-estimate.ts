import type { BilledStage } from '@bookmatch/common/estimates/billing-schedule-contract';
import type { PlannedCategory } from '@bookmatch/common/estimates/revision-contract';
import type { TaxRule } from '@bookmatch/common/estimates/tax-rules';
import type { ShopScope } from '../../platform/database/scope.js';

/** What was accepted, as the slices above take it over: a job is made of it, and its first invoice drafted. */
export type AcceptedEstimate = {
  estimate: {
    id: string;
    number: number;
    title: string;
    customerId: string;
    siteId: string | null;
    leadId: string | null;
  };
  revision: {
    id: string;
    number: number;
    taxRule: TaxRule;
    /** A decimal fraction in text. */
    taxRate: string;
    /** The price without tax, its tax, and both. */
    netCents: number;
    taxCents: number;
    totalCents: number;
    plannedCostCents: number;
    /** Every category with a cost, in the order of COST_CATEGORIES. */
    plannedCostByCategory: PlannedCategory[];
    /** Minutes and cost by operation, in the order operations first stand in the lines. */
    plannedWork: { operationId: string; plannedMinutes: number; plannedCostCents: number }[];
    /** The billing stages in order; they add up to the totals to the cent. Their ids are rows of EstimateBillingStage. */
    billingSchedule: BilledStage[];
  };
  acceptance: { id: string; acceptedAt: Date; name: string };
};

/** Called once for an acceptance, in its transaction: what it refuses or throws undoes the acceptance. */
export type OnAccepted = (scope: ShopScope, accepted: AcceptedEstimate) => Promise<void>;
