/** What other slices may use of `jobs`. */
export { Job } from './job.entity.js';
export { JobAssignment } from './job-assignment.entity.js';
export { JobBillingStage } from './job-billing-stage.entity.js';
export { JobOperation } from './job-operation.entity.js';
export { isAssigned, lockReadableJob, onlyReadable, readJob, type AccessedJob } from './job-access.js';
export { createJobFromAcceptance } from './job-creation.js';
export type { ClockedOperation, ClockedTime } from './clocked-time.js';
export type { JobBilling, JobInvoice } from './job-billing.js';
export { jobOfEstimate } from './job-of-estimate.js';
export { JobsService, type JobsParts, type OnJobClosed } from './jobs-service.js';
