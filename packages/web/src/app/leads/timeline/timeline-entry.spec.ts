import type { LeadNote } from '@bookmatch/common/leads/leads-contract';
import { buildLead } from '@bookmatch/common/testing/build-lead';
import { nextId } from '@bookmatch/common/testing/ids';
import { timelineOf } from './timeline-entry';

it('puts notes and steps in one line of time, the newest first', () => {
  const step = (toStage: 'new' | 'contacted', changedAt: string) => ({
    ...{ id: nextId(), fromStage: null, toStage, by: 'Ada Fenwick', changedAt },
  });
  const lead = buildLead({
    stageChanges: [step('new', '2027-01-10T15:00:00.000Z'), step('contacted', '2027-01-12T15:00:00.000Z')],
  });
  const note: LeadNote = {
    id: nextId(),
    body: 'Wants white oak',
    by: 'Ada Fenwick',
    createdAt: '2027-01-11T15:00:00.000Z',
  };
  const told = timelineOf(lead, [note]).map((entry) => (entry.kind === 'note' ? entry.body : entry.toStage));
  expect(told).toEqual(['contacted', 'Wants white oak', 'new']);
});
