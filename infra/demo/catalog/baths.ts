import { coating } from './coating.js';
import { hardware, material, timeRooms } from './lines.js';
import { NOT_INCLUDED, type Wood, type Work } from './work.js';

/** One or more bath vanities, each with a bank of drawers beside the sink, and linen towers if asked for. */
export function vanities({ wood, count, towers }: { wood: Wood; count: number; towers: number }): Work {
  const boxes = count * 2.4 + towers * 2;
  return {
    intro: `${count === 1 ? 'A vanity' : `${count} vanities`} in ${wood.name}, drawers beside the sink, boxes sealed on all edges.`,
    exclusions: NOT_INCLUDED.kitchen,
    rooms: [
      {
        name: count === 1 ? 'Vanity' : 'Vanities',
        lines: [
          material('Vanity boxes, moisture resistant ply, 21 in deep', [count, 'each'], 188),
          material(`Fronts and end panels, ${wood.name}`, [count, 'set'], 74 + wood.boardFootDollars * 9),
          ...(towers > 0
            ? [material('Linen towers, 84 in', [towers, 'each'], 214 + wood.sheetDollars * 0.4)]
            : []),
          hardware('Undermount slides, soft close, 18 in', [count * 4, 'set'], 27.2),
          hardware('Concealed hinges, soft close', [count * 4 + towers * 6, 'each'], 4.35),
          hardware('Pulls, allowance', [count * 6 + towers * 2, 'each'], 9),
          ...coating(wood, boxes * 16),
        ],
      },
      ...timeRooms({
        'Measure and draw': 3 + boxes * 0.4,
        'Cut sheet goods': boxes * 0.9,
        'Mill solid stock': boxes * 0.7,
        'Face frames': boxes * 0.8,
        'Assemble boxes': boxes * 1.4,
        'Doors and drawers': count * 5.5 + towers * 2.5,
        'Sand and prime': boxes * 1.1,
        Finish: boxes * 1.3,
        Deliver: 2 + boxes * 0.2,
        Install: 3 + boxes * 1.4,
      }),
    ],
  };
}
