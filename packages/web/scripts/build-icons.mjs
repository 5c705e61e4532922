// Builds public/icons.svg from the outlined Material Symbols, weight 400 (Apache License 2.0).
// Usage: node scripts/build-icons.mjs <folder of the unpacked package @material-symbols/svg-400>
// Add a name to ICONS, run it, commit the sprite. Left: our name, used as svgIcon; right: the symbol's name.
import { readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

const ICONS = {
  today: 'today',
  leads: 'contact_phone',
  estimates: 'request_quote',
  jobs: 'carpenter',
  time: 'schedule',
  invoices: 'receipt_long',
  customers: 'group',
  ledger: 'account_balance',
  settings: 'settings',
  search: 'search',
  add: 'add',
  check: 'check',
  close: 'close',
  'chevron-right': 'chevron_right',
  'chevron-left': 'chevron_left',
  back: 'arrow_back',
  up: 'arrow_upward',
  down: 'arrow_downward',
  sort: 'unfold_more',
  more: 'more_vert',
  menu: 'menu',
  'sign-out': 'logout',
  switch: 'swap_horiz',
  person: 'person',
  download: 'download',
  upload: 'upload',
  delete: 'delete',
  edit: 'edit',
  retry: 'refresh',
  error: 'error',
  warning: 'warning',
  about: 'info',
  offline: 'wifi_off',
  lock: 'lock',
  show: 'visibility',
  hide: 'visibility_off',
  mail: 'mail',
  phone: 'contact_phone',
  call: 'phone_in_talk',
  place: 'location_on',
  date: 'calendar_today',
  camera: 'photo_camera',
  attach: 'attach_file',
  copy: 'content_copy',
  filter: 'filter_list',
  undo: 'undo',
  send: 'send',
  payment: 'payments',
  card: 'credit_card',
  timer: 'timer',
  start: 'play_arrow',
  stop: 'stop',
  print: 'print',
  open: 'open_in_new',
  drag: 'drag_indicator',
  devices: 'devices',
  house: 'house',
  archive: 'archive',
  unarchive: 'unarchive',
  history: 'history',
  note: 'comment',
  question: 'help',
  image: 'image',
  folder: 'folder',
  shop: 'apartment',
  working: 'calculate',
  break: 'coffee',
  flag: 'flag',
  sync: 'sync',
};

const source = process.argv[2];
if (!source) throw new Error('give the folder of the unpacked package');

const symbols = await Promise.all(Object.entries(ICONS).map(toSymbol));
const sprite = `<svg xmlns="http://www.w3.org/2000/svg"><defs>\n${symbols.join('\n')}\n</defs></svg>\n`;
await writeFile(fileURLToPath(new URL('../public/icons.svg', import.meta.url)), sprite);
console.log(`${symbols.length} icons`);

async function toSymbol([name, symbol]) {
  const file = await readFile(join(source, 'outlined', `${symbol}.svg`), 'utf8');
  const paths = /<svg[^>]*>(.*)<\/svg>/s.exec(file)?.[1];
  return `<svg id="${name}" viewBox="0 -960 960 960">${paths}</svg>`;
}
