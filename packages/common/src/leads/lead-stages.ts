import type { Refusal } from '../problems/problem.js';
import { OPEN_LEAD_STAGES, type LeadStage, type OpenLeadStage } from './leads-contract.js';

export const LEAD_STAGE_NAMES: Record<LeadStage, string> = {
  new: 'New',
  contacted: 'Contacted',
  'site-visit': 'Site visit',
  estimating: 'Estimating',
  won: 'Won',
  lost: 'Lost',
};

/** By what a lead comes to a stage: dragged there by hand, or by a command that asks for more. */
export type LeadMove = 'move' | 'win' | 'lose' | 'reopen';

/**
 * Every move a lead can make. Open stages are moved between freely, in both directions: an inquiry may be measured
 * before anybody called back. Won and lost are reached by their commands alone and won is final. A lost lead can be
 * reopened, and it is won after all when its customer accepts an estimate in spite of everything.
 */
export const LEAD_TRANSITIONS: Record<LeadStage, Partial<Record<LeadStage, LeadMove>>> = {
  new: { contacted: 'move', 'site-visit': 'move', estimating: 'move', won: 'win', lost: 'lose' },
  contacted: { new: 'move', 'site-visit': 'move', estimating: 'move', won: 'win', lost: 'lose' },
  'site-visit': { new: 'move', contacted: 'move', estimating: 'move', won: 'win', lost: 'lose' },
  estimating: { new: 'move', contacted: 'move', 'site-visit': 'move', won: 'win', lost: 'lose' },
  won: {},
  lost: { won: 'win', new: 'reopen', contacted: 'reopen', 'site-visit': 'reopen', estimating: 'reopen' },
};

/** Why a lead cannot come from one stage to another by this command, or null. */
export function refuseLeadMove(from: LeadStage, to: LeadStage, by: LeadMove): Refusal | null {
  if (LEAD_TRANSITIONS[from][to] === by) return null;
  return { code: 'conflict', detail: whyNot(from, to) };
}

/** A lost lead comes back to where it was lost; what was lost before its stage was kept comes back as contacted. */
export function reopenedStage(lostFrom: LeadStage | null): OpenLeadStage {
  return OPEN_LEAD_STAGES.find((stage) => stage === lostFrom) ?? 'contacted';
}

/** Whether something has to be done about the lead. */
export function isOpenLead(stage: LeadStage): boolean {
  return stage !== 'won' && stage !== 'lost';
}

/** How a next step stands against today's date in the shop's zone; null when there is none or nothing to do. */
export function nextStepStanding(
  lead: { stage: LeadStage; nextStepOn: string | null },
  today: string,
): 'overdue' | 'today' | 'ahead' | null {
  if (lead.nextStepOn === null || !isOpenLead(lead.stage)) return null;
  if (lead.nextStepOn < today) return 'overdue';
  return lead.nextStepOn === today ? 'today' : 'ahead';
}

function whyNot(from: LeadStage, to: LeadStage): string {
  if (from === to) return `The lead is at ${LEAD_STAGE_NAMES[to]} already.`;
  if (from === 'won') return 'A won lead stays won.';
  if (from === 'lost') return 'A lost lead has to be reopened first.';
  return `A lead does not come from ${LEAD_STAGE_NAMES[from]} to ${LEAD_STAGE_NAMES[to]} this way.`;
}
