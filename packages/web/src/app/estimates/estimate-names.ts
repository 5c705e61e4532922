import type { EstimateStatus } from '@bookmatch/common/estimates/estimates-contract';
import type { RevisionStatus } from '@bookmatch/common/estimates/revision-contract';
import type { TaxRule } from '@bookmatch/common/estimates/tax-rules';
import type { Tone } from '../ui/status-chip/status-chip';

export const ESTIMATE_STATUS_TONES: Record<EstimateStatus, Tone> = {
  draft: 'neutral',
  sent: 'planned',
  accepted: 'good',
  declined: 'neutral',
  expired: 'over',
};

export const REVISION_STATUS_NAMES: Record<RevisionStatus, string> = {
  draft: 'Draft',
  sent: 'Sent',
  superseded: 'Replaced',
  accepted: 'Accepted',
  declined: 'Declined',
};

export const TAX_RULE_NAMES: Record<TaxRule, string> = {
  'on-price': 'On the taxable lines of the price',
  'shop-pays-use-tax': 'None billed, the shop pays use tax',
  exempt: 'None, the customer is exempt',
};

/** `1 line`, `12 lines`. */
export function counted(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}
