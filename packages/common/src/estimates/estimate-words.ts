import type { EstimateStatus } from './estimates-contract.js';

export const ESTIMATE_STATUS_NAMES: Record<EstimateStatus, string> = {
  draft: 'Draft',
  sent: 'Sent',
  accepted: 'Accepted',
  declined: 'Declined',
  expired: 'Expired',
};
