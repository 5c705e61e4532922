import type { JobOperation } from '../catalog/operations.js';

/** The order in which work goes through the shop. What stands in one phase can be done side by side. */
export const PHASES = ['measure', 'build', 'finish', 'deliver', 'install'] as const;
export type Phase = (typeof PHASES)[number];

export const PHASE_OF: Record<JobOperation, Phase> = {
  'Measure and draw': 'measure',
  'Cut sheet goods': 'build',
  'Mill solid stock': 'build',
  'Face frames': 'build',
  'Assemble boxes': 'build',
  'Doors and drawers': 'build',
  'Sand and prime': 'finish',
  Finish: 'finish',
  Deliver: 'deliver',
  Install: 'install',
};

/** What of the earlier operations must be done, as a share, before one can begin. */
export const NEEDS: Partial<Record<JobOperation, readonly JobOperation[]>> = {
  'Face frames': ['Mill solid stock'],
  'Assemble boxes': ['Cut sheet goods'],
  'Doors and drawers': ['Mill solid stock'],
  Finish: ['Sand and prime'],
};
export const SHARE_NEEDED = 0.6;
