/** What other slices may use of `jobs`. */
export { Job } from './job.entity.js';
export { JobAssignment } from './job-assignment.entity.js';
export { JobBillingStage } from './job-billing-stage.entity.js';
export { JobOperation } from './job-operation.entity.js';
export type { ClockedOperation, ClockedTime } from './clocked-time.js';
export type { JobBilling, JobInvoice } from './job-billing.js';
