import { finishStock, type CatalogLine } from './lines.js';
import type { Wood } from './work.js';

/** Primer and topcoats, or a clear coat, by the square feet of faces it goes on. */
export function coating(wood: Wood, squareFeet: number): CatalogLine[] {
  const gallons = (perGallon: number) => Math.max(1, Math.ceil(squareFeet / perGallon));
  return wood.painted
    ? [
        finishStock('Primer and waterborne enamel, two coats, color to sample', [1, 'lot'], gallons(55) * 74),
        finishStock('Paper, filters and masking', [1, 'lot'], 35 + Math.round(squareFeet / 8)),
      ]
    : [
        finishStock('Clear conversion varnish, low sheen, three coats', [1, 'lot'], gallons(60) * 81),
        finishStock('Paper, filters and masking', [1, 'lot'], 30 + Math.round(squareFeet / 9)),
      ];
}
