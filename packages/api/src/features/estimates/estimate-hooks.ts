import type { ShopScope } from '../../platform/database/scope.js';
import type { OnAccepted } from './accepted-estimate.js';

/** What `estimates` asks of the slices above it, given by `compose.ts`. */
export type EstimateHooks = {
  /** Makes a customer's link to the estimate and answers its address. */
  linkTo(scope: ShopScope, estimate: { id: string; customerId: string }): Promise<string>;
  /** The job that came of the estimate. */
  jobOf(scope: ShopScope, estimateId: string): Promise<{ id: string; number: number } | null>;
  onAccepted: OnAccepted;
};
