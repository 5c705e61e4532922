import { LEAD_TRANSITIONS, type LeadMove } from '@bookmatch/common/leads/lead-stages';
import { LEAD_STAGES, type LeadStage } from '@bookmatch/common/leads/leads-contract';
import type { Tone } from '../ui/status-chip/status-chip';

/** Where a lead can go from its stage by somebody's hand, in the order of the stages, and by which command. */
export function movesFrom(stage: LeadStage): { to: LeadStage; by: LeadMove }[] {
  return LEAD_STAGES.flatMap((to) => {
    const by = LEAD_TRANSITIONS[stage][to];
    // A lost lead comes back to where it was lost: one command, not one for each stage.
    return by === undefined || by === 'reopen' ? [] : [{ to, by }];
  });
}

/** The stage a card goes to when it is pushed one column on (1) or back (-1). */
export function neighborStage(stage: LeadStage, step: 1 | -1): LeadStage | null {
  const to = LEAD_STAGES[LEAD_STAGES.indexOf(stage) + step];
  return to && movesFrom(stage).some((move) => move.to === to) ? to : null;
}

export const STAGE_TONES: Record<LeadStage, Tone> = {
  new: 'neutral',
  contacted: 'neutral',
  'site-visit': 'planned',
  estimating: 'planned',
  won: 'good',
  lost: 'over',
};
