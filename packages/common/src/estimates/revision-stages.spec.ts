import { REVISION_STATUSES, type RevisionStatus } from './revision-contract.js';
import {
  canMoveRevision,
  estimateStatus,
  refuseAccept,
  refuseDecline,
  refuseNewRevision,
  refuseSaveRevision,
} from './revision-stages.js';

const today = '2026-03-10';
const revision = (status: RevisionStatus, validUntil = '2026-03-31') => ({ status, validUntil });

describe('a revision', () => {
  it('moves only along the table', () => {
    const moves = REVISION_STATUSES.flatMap((from) =>
      REVISION_STATUSES.filter((to) => canMoveRevision(from, to)).map((to) => `${from} > ${to}`),
    );
    expect(moves).toEqual(['draft > sent', 'sent > superseded', 'sent > accepted', 'sent > declined']);
  });

  it('can be changed only while it is a draft', () => {
    expect(REVISION_STATUSES.filter((status) => refuseSaveRevision(status) === null)).toEqual(['draft']);
  });

  it('can be accepted and declined only while it is sent', () => {
    expect(
      REVISION_STATUSES.filter((status) => refuseAccept(revision(status), today, true) === null),
    ).toEqual(['sent']);
    expect(REVISION_STATUSES.filter((status) => refuseDecline(revision(status)) === null)).toEqual(['sent']);
  });

  it('can be accepted on its last valid day and not on the next', () => {
    expect(refuseAccept(revision('sent', today), today, true)).toBeNull();
    expect(refuseAccept(revision('sent', '2026-03-09'), today, true)?.detail).toMatch(/expired/);
  });

  it('cannot be accepted when it is not what was read', () => {
    expect(refuseAccept(revision('sent'), today, false)?.detail).toMatch(/changed/);
  });
});

describe('an estimate', () => {
  it.each<[string, RevisionStatus[], string]>([
    ['is a draft before anything is sent', ['draft'], 'draft'],
    ['is sent while a newer draft is being written', ['sent', 'draft'], 'sent'],
    ['is sent when a newer revision took over', ['superseded', 'sent'], 'sent'],
    ['is accepted for good', ['superseded', 'accepted'], 'accepted'],
    ['is declined', ['declined'], 'declined'],
    ['is a draft again when a new revision follows a no', ['declined', 'draft'], 'draft'],
  ])('%s', (_, statuses, expected) => {
    expect(
      estimateStatus(
        statuses.map((status) => revision(status)),
        today,
      ),
    ).toBe(expected);
  });

  it('has expired the day after its last valid day', () => {
    expect(estimateStatus([revision('sent', '2026-03-09')], today)).toBe('expired');
    expect(estimateStatus([revision('sent', today)], today)).toBe('sent');
  });

  it('takes one draft at a time and no revision after acceptance', () => {
    expect(refuseNewRevision([revision('sent')])).toBeNull();
    expect(refuseNewRevision([revision('sent'), revision('draft')])?.detail).toMatch(/draft/);
    expect(refuseNewRevision([revision('accepted')])?.detail).toMatch(/accepted/);
  });
});
