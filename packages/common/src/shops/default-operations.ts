import type { CreateOperation } from './operations-contract.js';

/** What a new shop starts with, in the order the work goes through it. Common practice, no source. */
export const DEFAULT_OPERATIONS: readonly CreateOperation[] = [
  operation('Measure and draw'),
  operation('Cut sheet goods'),
  operation('Mill solid stock'),
  operation('Face frames'),
  operation('Assemble boxes'),
  operation('Doors and drawers'),
  operation('Sand and prime', 'finishing'),
  operation('Finish', 'finishing'),
  operation('Deliver', 'delivery'),
  operation('Install', 'install'),
  { ...operation('Shop, not on a job'), onJob: false },
];

function operation(name: string, costCategory: CreateOperation['costCategory'] = 'labor'): CreateOperation {
  return { name, costCategory, onJob: true, defaultRateCentsPerHour: null };
}
