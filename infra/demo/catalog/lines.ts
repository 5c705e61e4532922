import type { CostCategory } from '@bookmatch/common/estimates/cost-categories';
import type { QuantityUnit } from '@bookmatch/common/estimates/revision-contract';
import { JOB_OPERATIONS, OPERATION_RATES, type JobOperation } from './operations.js';

/** A line of an estimate as the catalog writes it: the operation by name, no id yet. */
export type CatalogLine = {
  kind: CostCategory;
  description: string;
  quantity: string;
  unit: QuantityUnit;
  unitCostCents: number;
  unitPriceCents: number;
  operation: JobOperation | null;
  plannedMinutesPerUnit: string | null;
  taxable: boolean;
};
export type CatalogRoom = { name: string; lines: CatalogLine[] };

/** Hours by operation; what is left out or zero takes no time. */
export type Hours = Partial<Record<JobOperation, number>>;

/** What is put on the cost of things that are bought, in percent of the cost. */
const MARKUPS: Partial<Record<CostCategory, number>> = { material: 55, hardware: 45, finishing: 50 };
const USUAL_MARKUP = 20;

/** A thing that is bought or made up in the shop, at its cost in dollars a unit; priced to the whole quarter dollar. */
export function item(
  kind: CostCategory,
  description: string,
  [quantity, unit]: readonly [number, QuantityUnit],
  unitCostDollars: number,
): CatalogLine {
  const markup = MARKUPS[kind] ?? USUAL_MARKUP;
  return {
    ...{ kind, description, unit, quantity: plain(quantity), operation: null, plannedMinutesPerUnit: null },
    unitCostCents: Math.round(unitCostDollars * 100),
    unitPriceCents: Math.ceil((unitCostDollars * (100 + markup)) / 25) * 25,
    taxable: kind !== 'delivery' && kind !== 'subcontract',
  };
}
export const material = item.bind(null, 'material');
export const hardware = item.bind(null, 'hardware');
export const finishStock = item.bind(null, 'finishing');

/** The rooms that hold a job's time, each hour a unit: making, finish, delivery and install. */
export function timeRooms(hours: Hours): CatalogRoom[] {
  const room = (name: string, operations: readonly JobOperation[]): CatalogRoom => ({
    name,
    lines: operations.flatMap((operation) => timeLine(operation, hours[operation] ?? 0)),
  });
  const rooms = [
    room('Drawing and making', JOB_OPERATIONS.slice(0, 6)),
    room('Finish', ['Sand and prime', 'Finish']),
    room('Delivery and install', ['Deliver', 'Install']),
  ];
  return rooms.filter(({ lines }) => lines.length > 0);
}

/** Install is work on the building and not taxed; everything made in the shop is. */
function timeLine(operation: JobOperation, hours: number): CatalogLine[] {
  const quantity = halfHours(hours);
  if (quantity === 0) return [];
  const { category, costCents, priceCents } = OPERATION_RATES[operation];
  return [
    {
      ...{
        kind: category,
        description: DESCRIPTIONS[operation],
        quantity: plain(quantity),
        unit: 'hour',
        operation,
      },
      ...{ unitCostCents: costCents, unitPriceCents: priceCents, plannedMinutesPerUnit: '60' },
      taxable: category !== 'install' && category !== 'delivery',
    },
  ];
}

const DESCRIPTIONS: Record<JobOperation, string> = {
  'Measure and draw': 'Site measure, shop drawings, one round of changes',
  'Cut sheet goods': 'Cut and edge sheet goods',
  'Mill solid stock': 'Mill solid stock',
  'Face frames': 'Face frames, joined and sanded',
  'Assemble boxes': 'Assemble boxes, fit backs and hanging rails',
  'Doors and drawers': 'Doors, drawer boxes and fronts, hung and adjusted',
  'Sand and prime': 'Sand and prime',
  Finish: 'Topcoats, sanded between',
  Deliver: 'Wrap, load and deliver',
  Install: 'Install, scribe and adjust',
};

const halfHours = (hours: number): number => Math.round(hours * 2) / 2;
const plain = (quantity: number): string => String(Math.round(quantity * 1000) / 1000);
