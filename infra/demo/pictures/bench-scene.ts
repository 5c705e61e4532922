import type { Generator } from '../chance/generator.js';

const WIDTH = 1280;
const HEIGHT = 960;
const WOODS = ['#c99a63', '#b47a45', '#d8b482', '#8a5a34', '#e0c49a'];

/** Cabinet boxes on a bench in warm light, as SVG: drawn, and meant to look it. */
export function benchScene(random: Generator): string {
  const boxes = Array.from({ length: random.whole(3, 5) }, (_, index) => boxAt(120 + index * 220, random));
  return `<svg xmlns="http://www.w3.org/2000/svg" width="${WIDTH}" height="${HEIGHT}" viewBox="0 0 ${WIDTH} ${HEIGHT}">
    <defs>
      <linearGradient id="wall" x1="0" y1="0" x2="0" y2="1"><stop offset="0" stop-color="#d9d5cc"/><stop offset="1" stop-color="#a9a297"/></linearGradient>
      <radialGradient id="lamp" cx="0.72" cy="0.05" r="0.9"><stop offset="0" stop-color="#fff6dd" stop-opacity="0.85"/><stop offset="1" stop-color="#fff6dd" stop-opacity="0"/></radialGradient>
    </defs>
    <rect width="${WIDTH}" height="${HEIGHT}" fill="url(#wall)"/>
    <rect y="700" width="${WIDTH}" height="70" fill="#7a5a3a"/><rect y="770" width="${WIDTH}" height="190" fill="#57412c"/>
    ${boxes.join('')}
    <rect width="${WIDTH}" height="${HEIGHT}" fill="url(#lamp)"/></svg>`;
}

function boxAt(left: number, random: Generator): string {
  const width = random.whole(150, 205);
  const top = 700 - random.whole(210, 430);
  const wood = random.pick(WOODS);
  const grain = Array.from({ length: 9 }, (_, index) =>
    grainLine(left + 14 + (index * (width - 28)) / 8, top, random),
  );
  return `<g><rect x="${left}" y="${top}" width="${width}" height="${700 - top}" fill="${wood}" stroke="#3c2b1a" stroke-width="4"/>
    <rect x="${left + 12}" y="${top + 12}" width="${width - 24}" height="${676 - top}" fill="#2b1e12" fill-opacity="0.28"/>
    <g stroke="#3c2b1a" stroke-opacity="0.25" stroke-width="2" fill="none">${grain.join('')}</g></g>`;
}

function grainLine(x: number, top: number, random: Generator): string {
  const bend = () => random.whole(-7, 7);
  return `<path d="M${x} ${top + 14} C${x + bend()} ${top + 80}, ${x + bend()} 620, ${x + bend()} 688"/>`;
}
