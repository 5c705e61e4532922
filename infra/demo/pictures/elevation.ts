import type { Generator } from '../chance/generator.js';

/** Blueprint blue on white, as the shop's own drawings are; no text, since a machine may have no fonts. */
const INK = '#1d3f8f';
const WIDTH = 1200;
const HEIGHT = 760;

/** An elevation as SVG: a run of base cabinets, another above it, a counter line, dimension ticks below. */
export function elevation(random: Generator): string {
  const columns = cutUp(120, WIDTH - 120, random);
  const tall = random.whole(0, columns.length - 1);
  const boxes = columns.map(([left, right], index) =>
    index === tall
      ? box(left, 120, right, 600, random.whole(2, 3))
      : box(left, 390, right, 600, random.whole(1, 4)) + box(left, 120, right, 300, 1),
  );
  const ticks = columns.map(([left]) => line(left, 650, left, 680)).join('');
  return svg(
    `<rect width="${WIDTH}" height="${HEIGHT}" fill="#fbfcfe"/>${hatch()}
     <g stroke="${INK}" fill="none" stroke-width="3">${boxes.join('')}${line(100, 384, WIDTH - 100, 384)}
     ${line(100, 640, WIDTH - 100, 640)}${line(60, 620, WIDTH - 60, 620)}</g>
     <g stroke="${INK}" stroke-width="2">${ticks}${line(WIDTH - 120, 650, WIDTH - 120, 680)}${line(120, 665, WIDTH - 120, 665)}</g>`,
  );
}

function cutUp(from: number, to: number, random: Generator): [number, number][] {
  const columns: [number, number][] = [];
  let left = from;
  while (to - left > 150) {
    const right = Math.min(to, left + random.whole(110, 210));
    columns.push([left, right]);
    left = right;
  }
  const last = columns.at(-1);
  if (last) last[1] = to;
  return columns;
}

/** A cabinet front cut into as many drawers; a single one is a door, with the lines that show where it hangs. */
function box(left: number, top: number, right: number, bottom: number, fronts: number): string {
  const height = (bottom - top) / fronts;
  const rows = Array.from({ length: fronts }, (_, index) => {
    const y = top + index * height;
    return `<rect x="${left + 6}" y="${y + 6}" width="${right - left - 12}" height="${height - 12}" rx="2"/>`;
  });
  const swing =
    fronts === 1
      ? `<path d="M${right - 8} ${top + 8} L${left + 8} ${(top + bottom) / 2} L${right - 8} ${bottom - 8}" stroke-width="1" stroke-dasharray="9 7"/>`
      : '';
  return `<rect x="${left}" y="${top}" width="${right - left}" height="${bottom - top}"/>${rows.join('')}${swing}`;
}

const line = (x1: number, y1: number, x2: number, y2: number): string =>
  `<line x1="${x1}" y1="${y1}" x2="${x2}" y2="${y2}"/>`;

function hatch(): string {
  const lines = Array.from({ length: 24 }, (_, index) => line(60 + index * 46, 646, 40 + index * 46, 700));
  return `<g stroke="#c9d4ec" stroke-width="2">${lines.join('')}</g>`;
}

const svg = (content: string): string =>
  `<svg xmlns="http://www.w3.org/2000/svg" width="${WIDTH}" height="${HEIGHT}" viewBox="0 0 ${WIDTH} ${HEIGHT}">${content}</svg>`;
