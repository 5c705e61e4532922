/** What other slices may use of `leads`. */
export { Lead } from './lead.entity.js';
export { beginEstimating, markWon } from './lead-steps.js';
export { countLeadsDue, leadsDue, openLeadsByStage } from './leads-due.js';
