import { coating } from './coating.js';
import { hardware, item, material, timeRooms, type CatalogRoom } from './lines.js';
import { NOT_INCLUDED, type Wood, type Work } from './work.js';

export type KitchenSize = {
  wood: Wood;
  /** Feet of run. */
  baseFeet: number;
  wallFeet: number;
  tall: number;
  /** Feet of island, 0 without one. */
  islandFeet: number;
  doors: number;
  drawers: number;
  style: 'five-piece' | 'slab' | 'inset';
};

/** A kitchen: boxes of ply, fronts of the wood named, hung and scribed. */
export function kitchen(size: KitchenSize): Work {
  return {
    intro: `Kitchen cabinets in ${size.wood.name}, ${STYLE_WORDS[size.style]}, made to your room.`,
    exclusions: NOT_INCLUDED.kitchen,
    rooms: [perimeter(size), ...(size.islandFeet > 0 ? [island(size)] : []), ...timeRooms(hoursOf(size))],
  };
}

const STYLE_WORDS = {
  'five-piece': 'five-piece doors over face frames',
  slab: 'slab fronts, frameless',
  inset: 'inset doors in beaded face frames',
} as const;

function perimeter({ wood, baseFeet, wallFeet, tall, doors, drawers, style }: KitchenSize): CatalogRoom {
  const faces = doors * 4.2 + drawers * 1.4;
  return {
    name: 'Perimeter',
    lines: [
      material('Base cabinets, prefinished maple ply, 3/4 in boxes', [baseFeet, 'ft'], 61),
      ...(wallFeet > 0
        ? [material('Wall cabinets to the ceiling, 12 1/2 in deep', [wallFeet, 'ft'], 47)]
        : []),
      ...(tall > 0 ? [material('Tall cabinets, pantry and oven', [tall, 'each'], 236)] : []),
      material(`Doors, ${wood.name}`, [doors, 'each'], 14 + wood.boardFootDollars * 3.1),
      material(
        `Drawer fronts and boxes, ${wood.name}, dovetailed maple`,
        [drawers, 'each'],
        31 + wood.boardFootDollars,
      ),
      ...(style === 'slab'
        ? []
        : [
            material(
              `Face frame stock, ${wood.name}`,
              [frameFeet(baseFeet, wallFeet), 'bd ft'],
              wood.boardFootDollars,
            ),
          ]),
      material('Crown, light rail and toe skin', [baseFeet + wallFeet, 'ft'], wood.painted ? 4.1 : 7.9),
      hardware(
        'Concealed hinges, soft close, with plates',
        [doors * 2, 'each'],
        style === 'inset' ? 6.85 : 4.35,
      ),
      hardware('Undermount slides, soft close, 21 in', [drawers, 'set'], 29.4),
      hardware('Pulls and knobs, allowance', [doors + drawers, 'each'], 7.5),
      ...coating(wood, faces),
    ],
  };
}

function island({ wood, islandFeet }: KitchenSize): CatalogRoom {
  return {
    name: 'Island',
    lines: [
      material('Island base, paneled on three sides', [islandFeet, 'ft'], 96),
      material(`Posts and applied panels, ${wood.name}`, [4, 'each'], 52),
      hardware('Pull-out for bins, two, with soft close', [1, 'set'], 118),
      item('subcontract', 'Butcher block top, oiled, by our supplier', [1, 'lot'], 145 * islandFeet),
    ],
  };
}

function hoursOf({ baseFeet, wallFeet, tall, islandFeet, doors, drawers, style }: KitchenSize) {
  const boxes = baseFeet / 2.2 + wallFeet / 2.5 + tall * 1.6 + islandFeet / 1.8;
  const fronts = doors + drawers;
  const inset = style === 'inset' ? 1.3 : 1;
  return {
    'Measure and draw': 8 + boxes * 0.35,
    'Cut sheet goods': boxes * 0.85,
    'Mill solid stock': fronts * 0.28 + boxes * 0.25,
    'Face frames': style === 'slab' ? 0 : boxes * 0.95 * inset,
    'Assemble boxes': boxes * 1.35,
    'Doors and drawers': (doors * 0.75 + drawers * 1.1) * inset,
    'Sand and prime': fronts * 0.5 + boxes * 0.45,
    Finish: fronts * 0.55 + boxes * 0.5,
    Deliver: 4 + boxes * 0.2,
    Install: 6 + boxes * 1.9 * inset,
  };
}

const frameFeet = (baseFeet: number, wallFeet: number): number => Math.ceil((baseFeet + wallFeet) * 1.6);
