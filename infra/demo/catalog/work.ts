import type { CatalogRoom } from './lines.js';

/** What a shop offers to make: rooms with priced lines, and the words around them. */
export type Work = { rooms: CatalogRoom[]; intro: string; exclusions: string };

/** Sheet and face material, with its cost in dollars: a sheet of ply, a board foot, and a door's stock a square foot. */
export type Wood = { name: string; sheetDollars: number; boardFootDollars: number; painted: boolean };

export const WOODS = {
  maple: { name: 'soft maple, paint grade', sheetDollars: 88, boardFootDollars: 5.4, painted: true },
  poplar: { name: 'poplar, paint grade', sheetDollars: 82, boardFootDollars: 4.2, painted: true },
  whiteOak: { name: 'white oak, rift cut', sheetDollars: 168, boardFootDollars: 13.5, painted: false },
  cherry: { name: 'cherry', sheetDollars: 146, boardFootDollars: 10.8, painted: false },
  walnut: { name: 'walnut', sheetDollars: 212, boardFootDollars: 16.4, painted: false },
  ash: { name: 'white ash', sheetDollars: 124, boardFootDollars: 7.6, painted: false },
} as const satisfies Record<string, Wood>;

/** The usual words of what is not in the price. */
export const NOT_INCLUDED = {
  kitchen:
    'Counters, plumbing, electrical work, appliances, tile and wall repair. Removal of the old cabinets.',
  room: 'Electrical work, wall repair and painting of walls. Moving of furniture.',
  trade: 'Plumbing, electrical work, stone, permits. Work outside normal hours.',
} as const;
