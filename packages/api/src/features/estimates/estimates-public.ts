/** What other slices may use of `estimates`. */
export type { AcceptedEstimate, OnAccepted } from './accepted-estimate.js';
export { customerEstimate, customerOfEstimate, shownEstimatePdf } from './customer-estimate.js';
export { Estimate } from './estimate.entity.js';
export { EstimateAcceptance } from './estimate-acceptance.entity.js';
export { EstimateAnswers } from './estimate-answers.js';
export { EstimateBillingStage } from './estimate-billing-stage.entity.js';
export type { EstimateHooks } from './estimate-hooks.js';
export { EstimateQuestion } from './estimate-question.entity.js';
export { EstimateQuestions } from './estimate-questions.js';
export { EstimateRevision } from './estimate-revision.entity.js';
export { estimatesOfLead } from './estimates-of-lead.js';
export { EstimatesService } from './estimates-service.js';
export { countOpenQuestions, estimatesWaiting } from './estimates-waiting.js';
