import { coating } from './coating.js';
import { hardware, item, material, timeRooms } from './lines.js';
import { NOT_INCLUDED, type Wood, type Work } from './work.js';

/** A restaurant's bar: paneled front, foot rail, back bar with shelves if asked for. */
export function barFront(size: { wood: Wood; frontFeet: number; backFeet: number }): Work {
  const { wood, frontFeet, backFeet } = size;
  return {
    intro: `Bar front of ${frontFeet} ft in ${wood.name}, raised panels over a plinth, ready for the stone top.`,
    exclusions: NOT_INCLUDED.trade,
    rooms: [
      {
        name: 'Bar front',
        lines: [
          material('Die wall skin and framing, fire treated ply', [frontFeet, 'ft'], 49),
          material(
            `Panels, stiles and rails, ${wood.name}`,
            [Math.ceil(frontFeet * 7.5), 'bd ft'],
            wood.boardFootDollars,
          ),
          material(
            'Plinth and elbow rail, run in the shop',
            [frontFeet * 2, 'ft'],
            3 + wood.boardFootDollars * 0.9,
          ),
          hardware('Foot rail, 2 in, brushed, with brackets', [frontFeet, 'ft'], 38),
          ...coating(wood, frontFeet * 16),
        ],
      },
      ...(backFeet > 0
        ? [
            {
              name: 'Back bar',
              lines: [
                material('Back bar cabinets, laminate inside', [backFeet, 'ft'], 92),
                material(
                  `Bottle shelves, ${wood.name}, on steel`,
                  [backFeet * 3, 'ft'],
                  14 + wood.boardFootDollars,
                ),
                item(
                  'subcontract',
                  'Blackened steel uprights, welded and set',
                  [Math.ceil(backFeet / 4) + 1, 'each'],
                  240,
                ),
              ],
            },
          ]
        : []),
      ...timeRooms({
        'Measure and draw': 12,
        'Cut sheet goods': frontFeet * 0.5 + backFeet * 0.7,
        'Mill solid stock': frontFeet * 1.6 + backFeet * 0.6,
        'Face frames': frontFeet * 1.1,
        'Assemble boxes': frontFeet * 0.6 + backFeet * 1.3,
        'Doors and drawers': frontFeet * 0.7 + backFeet * 0.8,
        'Sand and prime': frontFeet * 0.8 + backFeet * 0.4,
        Finish: frontFeet * 1.1 + backFeet * 0.6,
        Deliver: 9,
        Install: 12 + frontFeet * 1.2 + backFeet,
      }),
    ],
  };
}

/** A reception desk with a transaction top and a lower part for people who sit. */
export function receptionDesk({ wood, frontFeet }: { wood: Wood; frontFeet: number }): Work {
  return {
    intro: `Reception desk of ${frontFeet} ft in ${wood.name}, with a lowered part of 36 in for visitors who sit.`,
    exclusions: NOT_INCLUDED.trade,
    rooms: [
      {
        name: 'Reception desk',
        lines: [
          material('Desk carcass and modesty panels', [frontFeet, 'ft'], 118),
          material(
            `Tambour front, ${wood.name}`,
            [Math.ceil(frontFeet * 3.5), 'sq ft'],
            9 + wood.boardFootDollars * 1.1,
          ),
          material('Transaction top, solid surface, by our supplier', [frontFeet, 'ft'], 96),
          material('Pedestals with locks', [2, 'each'], 260),
          hardware('Grommets, wire ways and clamp-on power', [1, 'lot'], 285),
          ...coating(wood, frontFeet * 14),
        ],
      },
      ...timeRooms({
        'Measure and draw': 10,
        'Cut sheet goods': frontFeet * 0.8,
        'Mill solid stock': frontFeet * 2.2,
        'Assemble boxes': frontFeet * 1.6,
        'Doors and drawers': 8,
        'Sand and prime': frontFeet * 1.1,
        Finish: frontFeet * 1.4,
        Deliver: 6,
        Install: 8 + frontFeet * 1.1,
      }),
    ],
  };
}

/** An office built-in: desks between tall cabinets, files below, shelves above. */
export function officeBuiltIn(size: { wood: Wood; runFeet: number; desks: number }): Work {
  const { wood, runFeet, desks } = size;
  const boxes = runFeet / 1.8;
  return {
    intro: `Office built-in of ${runFeet} ft in ${wood.name}, ${desks === 1 ? 'one desk' : `${desks} desks`}, lateral files, shelves above.`,
    exclusions: NOT_INCLUDED.room,
    rooms: [
      {
        name: 'Office',
        lines: [
          material('Base and file cabinets', [runFeet, 'ft'], 74),
          material('Upper shelves and tall ends', [runFeet, 'ft'], 48 + wood.sheetDollars * 0.15),
          material(`Desk tops, ${wood.name}, 1 1/4 in`, [desks * 6, 'ft'], 26 + wood.boardFootDollars * 2),
          hardware('File slides with follower blocks', [desks * 2, 'set'], 46),
          hardware('Concealed hinges, soft close', [Math.round(boxes * 2), 'each'], 4.35),
          item('subcontract', 'Under-shelf lights, wired by a licensed electrician', [1, 'lot'], 340),
          ...coating(wood, runFeet * 15),
        ],
      },
      ...timeRooms({
        'Measure and draw': 6 + desks,
        'Cut sheet goods': boxes * 1.2,
        'Mill solid stock': boxes * 1.1,
        'Face frames': boxes * 1.1,
        'Assemble boxes': boxes * 1.7,
        'Doors and drawers': boxes * 1.5,
        'Sand and prime': boxes * 1.3,
        Finish: boxes * 1.5,
        Deliver: 4,
        Install: 6 + boxes * 1.8,
      }),
    ],
  };
}
