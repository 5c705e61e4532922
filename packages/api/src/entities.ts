import type { EntityClass } from './platform/database/data-source.js';
import { AuditEntry } from './platform/database/audit-entry.entity.js';
import { IdempotencyKey } from './platform/http/idempotency-key.entity.js';
import { RateLimitCounter } from './platform/http/rate-limits.js';
import { OutboxMessage } from './platform/outbox/outbox-message.entity.js';
import { WebhookEvent } from './platform/payments/webhook-event.entity.js';
import { SessionRow } from './platform/sessions/session.entity.js';
import { Person } from './features/accounts/person.entity.js';
import { PersonToken } from './features/accounts/person-token.entity.js';
import { Customer } from './features/customers/customer.entity.js';
import { Site } from './features/customers/site.entity.js';
import { CustomerLink } from './features/customer-page/customer-link.entity.js';
import { Estimate } from './features/estimates/estimate.entity.js';
import { EstimateAcceptance } from './features/estimates/estimate-acceptance.entity.js';
import { EstimateBillingStage } from './features/estimates/estimate-billing-stage.entity.js';
import { EstimateLine } from './features/estimates/estimate-line.entity.js';
import { EstimateQuestion } from './features/estimates/estimate-question.entity.js';
import { EstimateRevision } from './features/estimates/estimate-revision.entity.js';
import { EstimateRoom } from './features/estimates/estimate-room.entity.js';
import { EstimateSend } from './features/estimates/estimate-send.entity.js';
import { CardCheckout } from './features/invoices/card-checkout.entity.js';
import { CreditNote } from './features/invoices/credit-note.entity.js';
import { Invoice } from './features/invoices/invoice.entity.js';
import { InvoiceLetter } from './features/invoices/invoice-letter.entity.js';
import { InvoiceLine } from './features/invoices/invoice-line.entity.js';
import { Payment } from './features/invoices/payment.entity.js';
import { Job } from './features/jobs/job.entity.js';
import { JobAssignment } from './features/jobs/job-assignment.entity.js';
import { JobBillingStage } from './features/jobs/job-billing-stage.entity.js';
import { JobCost } from './features/jobs/job-cost.entity.js';
import { JobFile } from './features/jobs/job-file.entity.js';
import { JobOperation } from './features/jobs/job-operation.entity.js';
import { JobPlannedCost } from './features/jobs/job-planned-cost.entity.js';
import { JobStageChange } from './features/jobs/job-stage-change.entity.js';
import { Lead } from './features/leads/lead.entity.js';
import { LeadNote } from './features/leads/lead-note.entity.js';
import { LeadStageChange } from './features/leads/lead-stage-change.entity.js';
import { LedgerEntry } from './features/ledger/ledger-entry.entity.js';
import { LedgerLine } from './features/ledger/ledger-line.entity.js';
import { Invitation } from './features/shops/invitation.entity.js';
import { Member } from './features/shops/member.entity.js';
import { Operation } from './features/shops/operation.entity.js';
import { Shop } from './features/shops/shop.entity.js';
import { ShopCounter } from './features/shops/shop-counter.entity.js';
import { Subscription } from './features/subscription/subscription.entity.js';
import { TimeCorrection } from './features/time/time-correction.entity.js';
import { TimeEntry } from './features/time/time-entry.entity.js';

/** Every table there is, slice by slice. */
export const ENTITIES: readonly EntityClass[] = [
  // platform
  AuditEntry,
  IdempotencyKey,
  RateLimitCounter,
  OutboxMessage,
  WebhookEvent,
  SessionRow,
  // accounts
  Person,
  PersonToken,
  // shops
  Shop,
  Member,
  Invitation,
  ShopCounter,
  Operation,
  // subscription
  Subscription,
  // customers
  Customer,
  Site,
  // leads
  Lead,
  LeadNote,
  LeadStageChange,
  // estimates
  Estimate,
  EstimateRevision,
  EstimateRoom,
  EstimateLine,
  EstimateBillingStage,
  EstimateSend,
  EstimateAcceptance,
  EstimateQuestion,
  // customer-page
  CustomerLink,
  // jobs
  Job,
  JobAssignment,
  JobBillingStage,
  JobCost,
  JobFile,
  JobOperation,
  JobPlannedCost,
  JobStageChange,
  // time
  TimeEntry,
  TimeCorrection,
  // ledger
  LedgerEntry,
  LedgerLine,
  // invoices
  Invoice,
  InvoiceLine,
  CardCheckout,
  Payment,
  CreditNote,
  InvoiceLetter,
];

/** Tables in which nothing is ever changed or removed: the application's database account may only read and insert. */
export const APPEND_ONLY_TABLES: readonly string[] = [
  'audit_entry',
  'credit_note',
  'estimate_acceptance',
  'invoice_letter',
  'job_cost',
  'job_stage_change',
  'lead_note',
  'lead_stage_change',
  'ledger_entry',
  'ledger_line',
  'payment',
  'time_correction',
];
