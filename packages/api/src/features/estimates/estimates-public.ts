/** What other slices may use of `estimates`. */
export type { AcceptedEstimate, OnAccepted } from './accepted-estimate.js';
export { Estimate } from './estimate.entity.js';
export { EstimateRevision } from './estimate-revision.entity.js';
export { EstimateBillingStage } from './estimate-billing-stage.entity.js';
