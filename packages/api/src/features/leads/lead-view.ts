import type { Lead as LeadView, LeadNote as NoteView } from '@bookmatch/common/leads/leads-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { Customer, Site } from '../customers/customers-public.js';
import { memberNames } from '../shops/shops-public.js';
import type { LeadHooks } from './lead-hooks.js';
import { LeadNote } from './lead-note.entity.js';
import { LeadStageChange } from './lead-stage-change.entity.js';
import type { Lead } from './lead.entity.js';

/** The lead with everything its page shows beside its notes. */
export async function viewLead(
  scope: ShopScope,
  lead: Lead,
  hooks: Pick<LeadHooks, 'estimatesOf'>,
): Promise<LeadView> {
  const { expectedCents, stageChangedAt, createdAt, ...rest } = lead;
  return {
    ...rest,
    ...(seesMoney(scope) ? { expectedCents } : {}),
    ...(await namesOf(scope, lead)),
    stageChangedAt: stageChangedAt.toISOString(),
    createdAt: createdAt.toISOString(),
    estimates: await hooks.estimatesOf(scope, lead.id),
    stageChanges: await stageChangesOf(scope, lead.id),
  };
}

/** Whether the actor sees what a lead may be worth; without it the column is not even read by lists. */
export const seesMoney = (scope: ShopScope): boolean => scope.can('read', 'Lead', 'money');

async function namesOf(
  scope: ShopScope,
  { customerId, siteId }: Lead,
): Promise<Pick<LeadView, 'customerName' | 'siteName'>> {
  const customer = customerId === null ? null : await scope.rows(Customer).get(customerId);
  const site = siteId === null ? null : await scope.rows(Site).get(siteId);
  return { customerName: customer?.name ?? null, siteName: site?.name ?? null };
}

async function stageChangesOf(scope: ShopScope, leadId: string): Promise<LeadView['stageChanges']> {
  const changes = await scope.rows(LeadStageChange).findBy({ leadId }, 'id');
  const names = await memberNames(scope);
  return changes.map(({ id, fromStage, toStage, memberId, createdAt }) => ({
    id,
    fromStage,
    toStage,
    by: memberId === null ? null : (names.get(memberId) ?? null),
    changedAt: createdAt.toISOString(),
  }));
}

/** The notes about a lead, the newest first. */
export async function notesOf(scope: ShopScope, leadId: string): Promise<NoteView[]> {
  const notes = await scope.rows(LeadNote).findBy({ leadId }, 'id');
  const names = await memberNames(scope);
  return notes.reverse().map((note) => viewNote(note, names));
}

export function viewNote(note: LeadNote, names: ReadonlyMap<string, string>): NoteView {
  const { id, body, memberId, createdAt } = note;
  return { id, body, by: names.get(memberId) ?? '', createdAt: createdAt.toISOString() };
}
