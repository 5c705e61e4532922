import type { EstimateRow } from '@bookmatch/common/estimates/estimates-contract';
import { formatDate, formatTime } from '@bookmatch/common/calendar/format';
import { dateIn, daysBetween } from '@bookmatch/common/calendar/shop-dates';
import { standingWords, PAYMENT_METHOD_NAMES } from '@bookmatch/common/invoices/invoice-words';
import type { InvoiceRow, PaymentRow } from '@bookmatch/common/invoices/invoices-contract';
import { JOB_STAGE_NAMES } from '@bookmatch/common/jobs/job-stages';
import type { LeadRow } from '@bookmatch/common/leads/leads-contract';
import type { JobInHand, OnTheClock } from '@bookmatch/common/today/today-contract';
import type { Tone } from '../../ui/status-chip/status-chip';

/** One thing that waits for somebody, with the one step that is next. */
export type Task = {
  id: string;
  title: string;
  /** Where it is looked at; absent when there is no screen of its own for the one who reads. */
  link?: string;
  line: string;
  chip?: { text: string; tone: Tone };
  cents?: number;
  /** `href` for what leaves the application, such as a call. */
  action?: { name: string; link?: string; href?: string };
};

const joined = (...facts: (string | null | undefined)[]) => facts.filter(Boolean).join(' · ');
const daysLate = (days: number) => (days === 1 ? '1 day late' : `${days} days late`);

/** Call if there is a number, else open it. */
export function leadTask(lead: LeadRow, today: string): Task {
  const link = `/leads/${lead.id}`;
  const late = lead.nextStepOn === null ? 0 : daysBetween(lead.nextStepOn, today);
  return {
    id: lead.id,
    title: lead.title,
    link,
    line: joined(lead.nextStep || 'Follow up', lead.contactName),
    chip: late > 0 ? { text: daysLate(late), tone: 'over' } : { text: 'Today', tone: 'planned' },
    action: lead.phone ? { name: 'Call', href: `tel:${lead.phone}` } : { name: 'Follow up', link },
  };
}

export function estimateTask(estimate: EstimateRow, zone: string, today: string): Task {
  const link = `/estimates/${estimate.id}`;
  const sentOn = estimate.sentAt === null ? null : dateIn(zone, estimate.sentAt);
  return {
    id: estimate.id,
    title: `${estimate.number} ${estimate.title}`,
    link,
    line: joined(estimate.customerName, sentOn && `sent ${formatDate(sentOn, today)}`),
    cents: estimate.totalCents,
    ...(estimate.openQuestions > 0
      ? {
          chip: { text: questions(estimate.openQuestions), tone: 'built' as const },
          action: { name: 'Answer', link },
        }
      : { action: { name: 'Follow up', link } }),
  };
}
const questions = (count: number) => (count === 1 ? '1 question' : `${count} questions`);

export function overdueTask(invoice: InvoiceRow): Task {
  const link = `/invoices/${invoice.id}`;
  return {
    id: invoice.id,
    title: `${invoice.number ?? ''} ${invoice.customerName}`.trim(),
    link,
    line: joined(invoice.jobNumber === null ? null : `Job ${invoice.jobNumber}`, invoice.stageName),
    chip: { text: standingWords(invoice.standing, invoice.daysOverdue), tone: 'over' },
    cents: invoice.balanceCents,
    action: { name: 'Remind', link },
  };
}

export function draftTask(invoice: InvoiceRow, zone: string, today: string): Task {
  const link = `/invoices/${invoice.id}`;
  return {
    id: invoice.id,
    title: invoice.customerName,
    link,
    line: joined(
      invoice.jobNumber === null ? null : `Job ${invoice.jobNumber}`,
      invoice.stageName,
      `drafted ${formatDate(dateIn(zone, invoice.createdAt), today)}`,
    ),
    cents: invoice.totalCents,
    action: { name: 'Issue', link },
  };
}

export function paymentTask(payment: PaymentRow, today: string): Task {
  return {
    id: payment.id,
    title: payment.customerName,
    link: `/invoices/${payment.invoiceId}`,
    line: joined(
      `Invoice ${payment.invoiceNumber}`,
      PAYMENT_METHOD_NAMES[payment.method],
      formatDate(payment.receivedOn, today),
    ),
    cents: payment.amountCents,
    ...(payment.kind === 'payment' ? {} : { chip: { text: KINDS[payment.kind], tone: 'over' as const } }),
  };
}
const KINDS = { reversal: 'Taken back', refund: 'Given back' };

export function installTask(job: JobInHand, today: string): Task {
  return {
    id: job.id,
    title: job.title,
    link: `/jobs/${job.id}`,
    line: joined(`Job ${job.number}`, job.customerName, JOB_STAGE_NAMES[job.stage]),
    ...(job.installOn === null ? {} : { chip: installChip(job.installOn, today) }),
  };
}

function installChip(installOn: string, today: string): { text: string; tone: Tone } {
  if (installOn < today) return { text: `${formatDate(installOn, today)}, past`, tone: 'over' };
  return installOn === today
    ? { text: 'Today', tone: 'built' }
    : { text: formatDate(installOn, today), tone: 'planned' };
}

export function clockedTask(entry: OnTheClock, zone: string): Task {
  const onBreak = entry.kind === 'meal-break';
  return {
    id: entry.memberId,
    title: entry.memberName,
    line: onBreak
      ? 'Meal break'
      : joined(entry.operationName, entry.jobNumber === null ? null : `${entry.jobNumber} ${entry.jobTitle}`),
    ...(entry.jobId === null ? {} : { link: `/jobs/${entry.jobId}` }),
    chip: { text: `since ${formatTime(entry.startedAt, zone)}`, tone: onBreak ? 'neutral' : 'built' },
  };
}
