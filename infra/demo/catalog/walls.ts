import { coating } from './coating.js';
import { hardware, item, material, timeRooms } from './lines.js';
import { NOT_INCLUDED, type Wood, type Work } from './work.js';

/** A wall of bookcases over base cabinets, with a rolling ladder if asked for. */
export function libraryWall(size: { wood: Wood; runFeet: number; ladder: boolean }): Work {
  const { wood, runFeet, ladder } = size;
  const sections = Math.round(runFeet / 2.75);
  return {
    intro: `A library wall in ${wood.name}, ${runFeet} ft, adjustable shelves over base cabinets, crown to the ceiling.`,
    exclusions: NOT_INCLUDED.room,
    rooms: [
      {
        name: 'Library wall',
        lines: [
          material(
            `Bookcase sections, ${wood.name} ply with solid edges`,
            [sections, 'each'],
            118 + wood.sheetDollars * 1.6,
          ),
          material('Base cabinets, 30 in, with doors', [sections, 'each'], 104 + wood.boardFootDollars * 6),
          material(
            'Crown, pilasters and base, run in the shop',
            [runFeet * 2 + 8, 'ft'],
            4 + wood.boardFootDollars * 0.7,
          ),
          hardware('Shelf pins and sleeves, brass', [sections * 24, 'each'], 0.62),
          hardware('Concealed hinges, soft close', [sections * 4, 'each'], 4.35),
          ...(ladder ? [hardware('Rolling ladder with rail, oil rubbed bronze', [1, 'set'], 1180)] : []),
          item(
            'subcontract',
            'Low-voltage shelf lights, wired by a licensed electrician',
            [1, 'lot'],
            95 * sections,
          ),
          ...coating(wood, sections * 62),
        ],
      },
      ...timeRooms({
        'Measure and draw': 7 + sections * 0.6,
        'Cut sheet goods': sections * 2.1,
        'Mill solid stock': 4 + sections * 2.2,
        'Face frames': sections * 2,
        'Assemble boxes': sections * 2.8,
        'Doors and drawers': sections * 1.9,
        'Sand and prime': sections * 2.4,
        Finish: sections * 3,
        Deliver: 4 + sections * 0.4,
        Install: 8 + sections * 3.2 + (ladder ? 5 : 0),
      }),
    ],
  };
}

/** Around a screen: base cabinets with ventilated doors, open shelves at the sides. */
export function mediaWall({ wood, runFeet }: { wood: Wood; runFeet: number }): Work {
  const sections = Math.round(runFeet / 2.5);
  return {
    intro: `A media wall in ${wood.name}, ${runFeet} ft, with slatted doors that let remotes and air through.`,
    exclusions: NOT_INCLUDED.room,
    rooms: [
      {
        name: 'Media wall',
        lines: [
          material(
            'Base cabinets, 20 in deep, cable ways cut',
            [sections, 'each'],
            132 + wood.sheetDollars * 0.7,
          ),
          material('Side shelves, floating, 2 in', [8, 'each'], 41 + wood.boardFootDollars),
          material(`Slatted doors, ${wood.name}`, [sections * 2, 'each'], 48 + wood.boardFootDollars * 2),
          hardware('Touch latches and hinges', [sections * 2, 'set'], 13.4),
          ...coating(wood, sections * 44),
        ],
      },
      ...timeRooms({
        'Measure and draw': 5,
        'Cut sheet goods': sections * 1.6,
        'Mill solid stock': sections * 2.4,
        'Assemble boxes': sections * 2,
        'Doors and drawers': sections * 3.2,
        'Sand and prime': sections * 1.8,
        Finish: sections * 2.1,
        Deliver: 3,
        Install: 5 + sections * 2.3,
      }),
    ],
  };
}

/** A seat under a window, drawers or lids below, bookcases at its ends if asked for. */
export function windowSeat(size: { wood: Wood; runFeet: number; drawers: number; bookcases: number }): Work {
  const { wood, runFeet, drawers, bookcases } = size;
  return {
    intro: `A window seat of ${runFeet} ft in ${wood.name}, ${drawers} drawers below, made for a cushion of 4 in.`,
    exclusions: `${NOT_INCLUDED.room} Cushions.`,
    rooms: [
      {
        name: 'Window seat',
        lines: [
          material('Seat boxes with solid top', [runFeet, 'ft'], 54 + wood.boardFootDollars * 1.5),
          ...(bookcases > 0
            ? [material('Bookcases to the head casing', [bookcases, 'each'], 168 + wood.sheetDollars)]
            : []),
          hardware('Full extension slides, 150 lb', [drawers, 'set'], 38),
          ...coating(wood, runFeet * 9 + bookcases * 40),
        ],
      },
      ...timeRooms({
        'Measure and draw': 4,
        'Cut sheet goods': 2 + runFeet * 0.3 + bookcases,
        'Mill solid stock': 2 + runFeet * 0.35,
        'Face frames': 2 + bookcases * 1.5,
        'Assemble boxes': 2 + runFeet * 0.4 + bookcases * 1.8,
        'Doors and drawers': drawers * 1.5,
        'Sand and prime': 2 + runFeet * 0.4 + bookcases,
        Finish: 2.5 + runFeet * 0.4 + bookcases * 1.5,
        Deliver: 2,
        Install: 4 + runFeet * 0.5 + bookcases * 2,
      }),
    ],
  };
}
