import type { CostCategory } from '@bookmatch/common/estimates/cost-categories';
import type { CatalogLine } from '../catalog/lines.js';
import type { Generator } from '../chance/generator.js';
import type { Milestones } from '../crew/job-progress.js';
import type { Project, WorkdayIndex } from './project.js';

export type Purchase = {
  on: WorkdayIndex;
  category: CostCategory;
  description: string;
  supplier: string;
  amountCents: number;
  /** Entered by mistake and taken back the day after. */
  mistake: boolean;
};

/** What is bought, where, and from which stage on it is needed. Suppliers are invented. */
const BUYING: readonly {
  category: CostCategory;
  share: number;
  from: keyof Milestones;
  description: string;
  supplier: string;
}[] = [
  {
    category: 'material',
    share: 0.58,
    from: 'materialOn',
    description: 'Sheet goods',
    supplier: 'Cinderford Panel & Ply',
  },
  {
    category: 'material',
    share: 0.42,
    from: 'materialOn',
    description: 'Hardwood, surfaced two sides',
    supplier: 'Three Weirs Lumber',
  },
  {
    category: 'hardware',
    share: 1,
    from: 'buildingOn',
    description: 'Hinges, slides and pulls',
    supplier: 'Latchkey Hardware Supply',
  },
  {
    category: 'finishing',
    share: 1,
    from: 'finishingOn',
    description: 'Coatings, thinner, abrasives',
    supplier: 'Wren Street Coatings',
  },
  {
    category: 'subcontract',
    share: 1,
    from: 'installingOn',
    description: 'Subcontract, as quoted',
    supplier: '',
  },
];
/** Invented firms that other trades are bought from. */
const TRADES = ['Pennywhistle Electric', 'Gantry Steel & Weld', 'Blockfield Tops'];

/** What a job's material and the rest really cost, in a few bills each near the plan. */
export function purchasesOf({ key, work }: Project, milestones: Milestones, random: Generator): Purchase[] {
  const lines = work.rooms.flatMap((room) => room.lines);
  const bought = BUYING.flatMap(({ category, share, from, description, supplier }): Purchase[] => {
    const planned = plannedCents(lines, category) * share;
    const on = milestones[from];
    if (on === null || planned === 0) return [];
    const amountCents = Math.round(planned * random.around(1.02, 0.16));
    const who = category === 'subcontract' ? random.pick(TRADES) : supplier;
    return [{ on, category, description, supplier: who, amountCents, mistake: false }];
  });
  return [...bought, ...forgotten(milestones, random), ...mistakes(key, bought)];
}

/** A second trip for a sheet that was not counted, and the dump: what every third job has. */
function forgotten({ buildingOn, installingOn }: Milestones, random: Generator): Purchase[] {
  const extra: Purchase[] = [];
  const usual = { mistake: false };
  if (buildingOn !== null && random.chance(0.34))
    extra.push({
      ...usual,
      on: buildingOn + 3,
      category: 'material',
      description: 'One more sheet, 3/4 in',
      supplier: 'Cinderford Panel & Ply',
      amountCents: random.whole(8_200, 19_900),
    });
  if (installingOn !== null && random.chance(0.3))
    extra.push({
      ...usual,
      on: installingOn + 1,
      category: 'delivery',
      description: 'Van for a day',
      supplier: 'Long Meadow Rentals',
      amountCents: random.whole(9_500, 16_500),
    });
  return extra;
}

/** Two of the year's bills were entered twice. */
function mistakes(key: string, bought: readonly Purchase[]): Purchase[] {
  const [first] = bought;
  return first && ['job 206', 'job 94'].includes(key) ? [{ ...first, mistake: true }] : [];
}

function plannedCents(lines: readonly CatalogLine[], category: CostCategory): number {
  return lines
    .filter(({ kind, operation }) => kind === category && operation === null)
    .reduce((sum, { quantity, unitCostCents }) => sum + Number(quantity) * unitCostCents, 0);
}
