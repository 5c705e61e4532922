/** What other slices may use of `estimates`. */
export type { AcceptedEstimate, OnAccepted } from './accepted-estimate.js';
