import type { Job, JobBillingRow, JobStage } from '@bookmatch/common/jobs/jobs-contract';
import { JOB_STAGE_NAMES, nextStage } from '@bookmatch/common/jobs/job-stages';

/** The next stop of a job's thread: what its one primary button does. */
export type NextStep =
  | { kind: 'open-invoice'; label: string; invoiceId: string }
  | { kind: 'bill'; label: string; billingStageId: string }
  | { kind: 'move'; label: string; stage: JobStage };

export type StepRights = { bill: boolean; move: boolean };

/**
 * Money first: a deposit that waits, a draft nobody issued, and the last stage once the work is being installed. Then
 * the next stage of the work itself. Null when nothing is left, or nothing that this member may do.
 */
export function nextStep(job: Job, rights: StepRights): NextStep | null {
  if (job.stage === 'closed') return null;
  return (rights.bill ? billingStep(job) : null) ?? (rights.move ? stageStep(job.stage) : null);
}

function billingStep({ money, stage }: Job): NextStep | null {
  const rows = money?.billing ?? [];
  const draft = rows.find(({ invoice }) => invoice?.standing === 'draft');
  if (draft?.invoice)
    return { kind: 'open-invoice', label: `Issue ${inSentence(draft)}`, invoiceId: draft.invoice.id };
  const deposit = rows.find((row) => row.deposit && row.invoice === null);
  if (deposit) return bill(deposit);
  const last = rows.at(-1);
  return stage === 'installing' && last && last.invoice === null ? bill(last) : null;
}

const bill = (row: JobBillingRow): NextStep => ({
  kind: 'bill',
  label: `Bill ${inSentence(row)}`,
  billingStageId: row.billingStageId,
});

/** `Deposit` is `the deposit` after a verb; other stages keep the name they were agreed by. */
function inSentence({ name }: JobBillingRow): string {
  return name === 'Deposit' ? 'the deposit' : name;
}

function stageStep(from: JobStage): NextStep | null {
  const stage = nextStage(from);
  if (!stage) return null;
  return { kind: 'move', stage, label: stage === 'closed' ? 'Close job' : STEP_WORDS[stage] };
}

/** What is done when a stage is reached, as the button says it. */
const STEP_WORDS: Record<Exclude<JobStage, 'closed'>, string> = {
  accepted: JOB_STAGE_NAMES.accepted,
  measured: 'Site is measured',
  'drawings-approved': 'Drawings are approved',
  'materials-in': 'Materials are in',
  building: 'Start building',
  finishing: 'Start finishing',
  installing: 'Start installing',
};
