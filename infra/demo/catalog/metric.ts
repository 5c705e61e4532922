import { coating } from './coating.js';
import { hardware, material, timeRooms } from './lines.js';
import { NOT_INCLUDED, type Wood, type Work } from './work.js';

/** Shelves from wall to wall, as a shop that measures in millimeters writes them. */
export function shelfWall({ wood, sections }: { wood: Wood; sections: number }): Work {
  return {
    intro: `Shelves in ${wood.name}, ${sections * 800} mm from wall to wall, 2400 mm high, backs painted.`,
    exclusions: NOT_INCLUDED.room,
    rooms: [
      {
        name: 'Shelf wall',
        lines: [
          material('Shelf sections, 800 × 2400 × 300 mm', [sections, 'each'], 96 + wood.sheetDollars * 1.1),
          material('Plinth and cornice', [sections, 'each'], 22 + wood.boardFootDollars),
          hardware('Shelf pins, 5 mm', [sections * 20, 'each'], 0.35),
          ...coating(wood, sections * 40),
        ],
      },
      ...timeRooms({
        'Measure and draw': 4,
        'Cut sheet goods': sections * 1.4,
        'Assemble boxes': sections * 2,
        Finish: sections * 1.6,
        Deliver: 2,
        Install: 3 + sections * 1.5,
      }),
    ],
  };
}

/** A small kitchen of 600 mm modules. */
export function kitchenette({ wood, modules }: { wood: Wood; modules: number }): Work {
  return {
    intro: `Kitchenette in ${wood.name}, ${modules} modules of 600 mm, slab fronts.`,
    exclusions: NOT_INCLUDED.kitchen,
    rooms: [
      {
        name: 'Kitchenette',
        lines: [
          material('Base modules, 600 × 720 × 560 mm', [modules, 'each'], 128),
          material('Wall modules, 600 × 720 × 320 mm', [modules, 'each'], 94),
          material(`Fronts, 19 mm, ${wood.name}`, [modules * 3, 'each'], 28 + wood.boardFootDollars * 2),
          hardware('Hinges, 110 degrees, soft close', [modules * 4, 'each'], 4.1),
          hardware('Slides, 500 mm, soft close', [modules, 'set'], 26),
          ...coating(wood, modules * 22),
        ],
      },
      ...timeRooms({
        'Measure and draw': 5,
        'Cut sheet goods': modules * 1.5,
        'Assemble boxes': modules * 2.2,
        'Doors and drawers': modules * 1.8,
        Finish: modules * 2,
        Deliver: 2.5,
        Install: 4 + modules * 2.4,
      }),
    ],
  };
}
