import { coating } from './coating.js';
import { hardware, material, timeRooms } from './lines.js';
import { NOT_INCLUDED, type Wood, type Work } from './work.js';

/** Open lockers over a bench, hooks in each bay, shoes below. */
export function mudroomLockers({ wood, bays }: { wood: Wood; bays: number }): Work {
  return {
    intro: `${bays} locker bays in ${wood.name}: hooks and a high shelf, a bench at 18 in, shoe drawers below.`,
    exclusions: NOT_INCLUDED.room,
    rooms: [
      {
        name: 'Lockers and bench',
        lines: [
          material('Locker bays, beaded backs', [bays, 'each'], 142 + wood.sheetDollars * 0.5),
          material(`Bench top, ${wood.painted ? 'white oak' : wood.name}, 1 1/2 in`, [bays * 2, 'ft'], 33),
          material('Crown and base to match the house', [bays * 2 + 6, 'ft'], 6.2),
          hardware('Double hooks, cast', [bays * 3, 'each'], 8.4),
          hardware('Undermount slides, 18 in', [bays, 'set'], 26.5),
          ...coating(wood, bays * 38),
        ],
      },
      ...timeRooms({
        'Measure and draw': 4 + bays * 0.5,
        'Cut sheet goods': bays * 1.5,
        'Mill solid stock': 3 + bays * 1.2,
        'Face frames': bays * 1.3,
        'Assemble boxes': bays * 2.2,
        'Doors and drawers': bays * 1.8,
        'Sand and prime': bays * 1.9,
        Finish: bays * 2,
        Deliver: 2 + bays * 0.3,
        Install: 4 + bays * 2,
      }),
    ],
  };
}

/** A walk-in closet: hanging, shelves, a bank of drawers, an island if there is room. */
export function closet(size: { wood: Wood; runFeet: number; drawers: number; island: boolean }): Work {
  const { wood, runFeet, drawers, island } = size;
  const boxes = runFeet / 2.4 + (island ? 4 : 0);
  return {
    intro: `Walk-in closet in ${wood.name}: double hanging, shelves and ${drawers} drawers.`,
    exclusions: NOT_INCLUDED.room,
    rooms: [
      {
        name: 'Closet',
        lines: [
          material(
            'Closet sections, 84 in, adjustable shelves',
            [runFeet, 'ft'],
            58 + wood.sheetDollars * 0.16,
          ),
          material('Drawer boxes, dovetailed, with fronts', [drawers, 'each'], 46),
          ...(island ? [material('Island with jewelry trays under glass', [1, 'each'], 640)] : []),
          hardware('Oval hanging rods with supports', [runFeet, 'ft'], 5.9),
          hardware('Undermount slides, soft close, 18 in', [drawers, 'set'], 27.2),
          hardware('Valet rods and belt racks', [2, 'set'], 64),
          ...coating(wood, runFeet * 14),
        ],
      },
      ...timeRooms({
        'Measure and draw': 5 + boxes * 0.3,
        'Cut sheet goods': boxes * 1.2,
        'Mill solid stock': boxes * 0.5,
        'Assemble boxes': boxes * 1.7,
        'Doors and drawers': drawers * 1.2 + (island ? 6 : 0),
        'Sand and prime': boxes * 1.1,
        Finish: boxes * 1.3,
        Deliver: 3 + boxes * 0.2,
        Install: 6 + boxes * 1.6,
      }),
    ],
  };
}

/** Laundry or pantry: tall storage, a folding counter or baskets, open shelves. */
export function utilityRoom(size: {
  wood: Wood;
  runFeet: number;
  tall: number;
  use: 'laundry' | 'pantry';
}): Work {
  const { wood, runFeet, tall, use } = size;
  const boxes = runFeet / 2 + tall * 2;
  return {
    intro: `${use === 'laundry' ? 'Laundry room' : 'Pantry'} in ${wood.name}, ${runFeet} ft of run and ${tall} tall cabinets.`,
    exclusions: NOT_INCLUDED.room,
    rooms: [
      {
        name: use === 'laundry' ? 'Laundry room' : 'Pantry',
        lines: [
          material('Cabinets, prefinished maple ply', [runFeet, 'ft'], 66),
          material('Tall cabinets, 90 in', [tall, 'each'], 222),
          use === 'laundry'
            ? material('Folding counter, laminate on ply', [runFeet, 'ft'], 28)
            : material('Open shelves, 1 1/4 in, with cleats', [runFeet * 2, 'ft'], 15.5),
          use === 'laundry'
            ? hardware('Pull-out hampers with liners', [2, 'each'], 86)
            : hardware('Pull-out baskets, soft close', [4, 'each'], 72),
          hardware('Concealed hinges, soft close', [Math.round(boxes * 2.5), 'each'], 4.35),
          ...coating(wood, boxes * 18),
        ],
      },
      ...timeRooms({
        'Measure and draw': 4 + boxes * 0.3,
        'Cut sheet goods': boxes * 1.1,
        'Mill solid stock': boxes * 0.6,
        'Face frames': boxes * 0.9,
        'Assemble boxes': boxes * 1.5,
        'Doors and drawers': boxes * 1.3,
        'Sand and prime': boxes * 1.1,
        Finish: boxes * 1.2,
        Deliver: 3,
        Install: 4 + boxes * 1.6,
      }),
    ],
  };
}
