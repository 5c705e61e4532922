import type { Refusal } from '../problems/problem.js';
import type { EstimateStatus } from './estimates-contract.js';
import type { RevisionStatus } from './revision-contract.js';

/** Where a revision can go from where it is. What was accepted, declined or superseded never changes again. */
export const REVISION_TRANSITIONS: Record<RevisionStatus, readonly RevisionStatus[]> = {
  draft: ['sent'],
  sent: ['superseded', 'accepted', 'declined'],
  superseded: [],
  accepted: [],
  declined: [],
};

export function canMoveRevision(from: RevisionStatus, to: RevisionStatus): boolean {
  return REVISION_TRANSITIONS[from].includes(to);
}

type Standing = { status: RevisionStatus; validUntil: string };

/**
 * An estimate's status from its revisions, oldest first. The sent revision speaks for it until a newer one is sent,
 * so a draft beside it changes nothing for the customer. The last valid day counts whole, in the shop's zone.
 *
 * @param today the date in the shop's zone
 */
export function estimateStatus(revisions: readonly Standing[], today: string): EstimateStatus {
  if (revisions.some((revision) => revision.status === 'accepted')) return 'accepted';
  const sent = revisions.find((revision) => revision.status === 'sent');
  if (sent) return sent.validUntil < today ? 'expired' : 'sent';
  return revisions.at(-1)?.status === 'declined' ? 'declined' : 'draft';
}

export function refuseSaveRevision(status: RevisionStatus): Refusal | null {
  return status === 'draft'
    ? null
    : conflict('This revision was sent and does not change any more. Make a new revision.');
}

/** A new revision starts from the current one; only one draft at a time, and none after acceptance. */
export function refuseNewRevision(revisions: readonly Standing[]): Refusal | null {
  if (revisions.some((revision) => revision.status === 'accepted'))
    return conflict('This estimate was accepted. What changes now is agreed on the job.');
  if (revisions.some((revision) => revision.status === 'draft'))
    return conflict('There is a draft revision already. Change that one.');
  return null;
}

export function refuseDecline(revision: Standing): Refusal | null {
  if (revision.status === 'sent') return null;
  return conflict(
    revision.status === 'draft' ? 'This revision was not sent yet.' : answeredAlready(revision.status),
  );
}

/** @param sameDocument whether the hash sent back is that of the revision as it stands */
export function refuseAccept(revision: Standing, today: string, sameDocument: boolean): Refusal | null {
  if (revision.status !== 'sent') return conflict(answeredAlready(revision.status));
  if (revision.validUntil < today)
    return conflict('This estimate has expired. Ask the shop to renew it before you accept.');
  if (!sameDocument)
    return conflict('The estimate changed since you opened it. Read it again before you accept.');
  return null;
}

function answeredAlready(status: RevisionStatus): string {
  const ANSWERS: Record<RevisionStatus, string> = {
    draft: 'This revision cannot be accepted yet.',
    sent: 'This revision is still open.',
    superseded: 'A newer revision of this estimate was sent. Open that one.',
    accepted: 'This estimate was accepted already.',
    declined: 'This estimate was declined.',
  };
  return ANSWERS[status];
}

function conflict(detail: string): Refusal {
  return { code: 'conflict', detail };
}
