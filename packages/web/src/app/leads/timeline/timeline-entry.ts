import type { Lead, LeadNote, LeadStage } from '@bookmatch/common/leads/leads-contract';

/** A note somebody wrote, or a step from stage to stage. */
export type TimelineEntry = { id: string; at: string; by: string | null } & (
  { kind: 'note'; body: string } | { kind: 'step'; fromStage: LeadStage | null; toStage: LeadStage }
);

/** What happened to a lead, the newest first. */
export function timelineOf({ stageChanges }: Lead, notes: readonly LeadNote[]): TimelineEntry[] {
  const steps: TimelineEntry[] = stageChanges.map(({ id, changedAt, by, fromStage, toStage }) => ({
    kind: 'step',
    id,
    at: changedAt,
    by,
    fromStage,
    toStage,
  }));
  const written: TimelineEntry[] = notes.map(({ id, createdAt, by, body }) => ({
    kind: 'note',
    id,
    at: createdAt,
    by,
    body,
  }));
  return [...steps, ...written].sort((a, b) => b.at.localeCompare(a.at) || b.id.localeCompare(a.id));
}
