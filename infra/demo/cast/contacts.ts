import type { Address, CustomerKind } from '@bookmatch/common/customers/customers-contract';

/** Somebody who asks or buys. Names, firms, streets and towns are invented; numbers and mail domains belong to nobody. */
export type Contact = {
  kind: CustomerKind;
  name: string;
  company: string;
  email: string;
  phone: string;
  address: Address;
  taxExempt: boolean;
};

type Row = readonly [name: string, street: string, town: Town, kind?: CustomerKind, company?: string];
const TOWNS = {
  'Marlow Bend': '00311',
  'Quarry Ford': '00314',
  'Nettle Creek': '00318',
  'Old Harrow': '00322',
  'Sable Landing': '00327',
  Tessaly: '00331',
} as const;
type Town = keyof typeof TOWNS;

const ROWS = {
  pell: ['Ansel Pellington', '212 Orchard Hill Road', 'Marlow Bend'],
  moreau: ['Delphine Morrowby', '7 Cooper Street', 'Quarry Ford'],
  tarn: ['Hollis Tarnbrook', '40 Ferry Lane', 'Sable Landing'],
  okafor: ['Ifeoma Okaduru', '1190 Ridgeback Drive', 'Nettle Creek'],
  birk: ['Solveig Birkmoor', '3 Chapel Yard', 'Old Harrow'],
  quill: ['Marguerite Quillfeather', '88 Mill Race Terrace', 'Quarry Ford'],
  dray: ['Percival Drayhurst', '515 Saddler Avenue', 'Tessaly'],
  ruan: ['Mei-Lin Ruanfield', '26 Larch Court', 'Marlow Bend'],
  harr: ['Georgina Harrowgate', '9 Old Toll Road', 'Old Harrow'],
  vent: ['Luca Ventresque', '61 Harbor Steps', 'Sable Landing', 'contractor', 'Ventresque Building'],
  ebb: ['Rosalind Ebbsworth', '330 Fallow Field Way', 'Nettle Creek'],
  cast: ['Amara Castellane', '14 Weaver Square', 'Quarry Ford', 'designer', 'Castellane Interiors'],
  thur: ['Magnus Thurlby', '702 Gristmill Road', 'Tessaly'],
  fenn: ['Odalys Fennimore', '45 Heron Point', 'Sable Landing'],
  yarr: ['Caspian Yarrowby', '1 Lantern Close', 'Marlow Bend'],
  osk: ['Wilhelmina Oskarsund', '260 Beacon Street', 'Quarry Ford', 'contractor', 'Oskarsund & Daughters'],
  pry: ['Tobias Pryorwell', '19 Juniper Rise', 'Nettle Creek'],
  lom: ['Severine Lomax-Vail', '84 Copper Kettle Lane', 'Old Harrow'],
  gad: ['Elias Gadsbury', '5 Stonecutter Row', 'Quarry Ford'],
  nak: ['Hanako Nakawashi', '611 Plover Street', 'Tessaly'],
  brul: ['Gideon Brulefort', '33 Kiln Street', 'Quarry Ford', 'contractor', 'The Copper Whisk Restaurant'],
  clay: ['Philippa Claydon', '140 Willow Weir', 'Marlow Bend'],
  sorr: ['Benedict Sorrelton', '8 Gatehouse Mews', 'Old Harrow'],
  abe: ['Adaeze Abernethie', '77 Cartwright Road', 'Nettle Creek'],
  wex: ['Lionel Wexcombe', '219 Mariner Way', 'Sable Landing'],
  mund: ['Astrid Mundegaard', '52 Paper Mill Road', 'Tessaly'],
  hale: ['Dorothea Halewick', '900 Prospect Ridge', 'Marlow Bend'],
  farr: [
    'Quentin Farrowdale',
    '12 Bell Founders Court',
    'Quarry Ford',
    'contractor',
    'Nettle Creek Family Clinic',
  ],
  ims: ['Zuleika Imsfeld', '4 Tidewater Place', 'Sable Landing'],
  stro: ['Rufus Strohmark', '366 Larkrise', 'Nettle Creek'],
  gwyn: ['Eirlys Gwynford', '29 Hop Garden', 'Old Harrow'],
  amb: ['Cornelius Ambleforth', '57 Saltbox Lane', 'Tessaly', 'contractor', 'Ambleforth Tasting Room'],
  del: ['Paloma Delacroy', '10 Fountain Walk', 'Marlow Bend', 'designer', 'Studio Delacroy'],
  kest: ['Ivar Kestrelmann', '831 Overlook Drive', 'Nettle Creek'],
  ott: ['Bettina Ottergate', '6 Millwright Court', 'Quarry Ford'],
  rosk: ['Thaddeus Roskilling', '48 Granary Street', 'Old Harrow'],
} as const satisfies Record<string, Row>;
export type ContactKey = keyof typeof ROWS;

/** Names of those who asked and did not buy, or not yet. */
const ASKED = [
  ['Viola Penhallow-Reed', '23 Cinder Path', 'Marlow Bend'],
  ['Oren Blackadder-Shaw', '402 Quince Street', 'Tessaly'],
  ['Cecily Thornbury-Vane', '11 Ropewalk', 'Sable Landing'],
  ['Matthias Grunewaldt', '75 Saw Pit Lane', 'Old Harrow'],
  ['Ngozi Ekwueme-Lark', '318 Basin Street', 'Nettle Creek'],
  ['Florian Castlegrove', '2 Dovecote', 'Marlow Bend', 'contractor', 'Castlegrove Homes'],
  ['Imogen Whistlecroft', '96 Paddock View', 'Quarry Ford'],
  ['Silas Underbridge', '140 Canal Bank', 'Sable Landing'],
  ['Perpetua Longacre', '57 Almshouse Row', 'Old Harrow'],
  ['Yusuf Haddonfield', '8 Cricket Green', 'Tessaly'],
  ['Lavinia Marchbanks-Roe', '221 Beechmast Road', 'Marlow Bend'],
  ['Torvald Eskesen-Pike', '16 Anchor Street', 'Sable Landing'],
  ['Clementine Ashgrove', '405 Fuller Street', 'Quarry Ford', 'designer', 'Ashgrove & Linden'],
  ['Bartholomew Kite', '30 Windmill Rise', 'Nettle Creek'],
  ['Noor Al-Safarini', '64 Linden Gate', 'Tessaly'],
  ['Winifred Tolliver-Ames', '9 Pump Court', 'Old Harrow'],
  ['Leopold Greystock', '113 Turnpike', 'Marlow Bend'],
  ['Saskia van Ravenhorst', '27 Cooperage', 'Quarry Ford'],
  ['Emeka Obiorah-Stone', '508 Meadowlark', 'Nettle Creek'],
  ['Henrietta Swanwick', '3 Priory Walk', 'Sable Landing'],
  ['Fergus Dunlowry', '72 Peat Road', 'Old Harrow'],
  ['Anneliese Birchwater', '150 Hazel Dene', 'Tessaly'],
  ['Jasper Cloudesley', '44 Bowyer Street', 'Quarry Ford'],
  ['Marisol Quintavalle', '19 Vine Terrace', 'Marlow Bend'],
  ['Edmund Farthingale', '601 Signal Hill', 'Nettle Creek', 'contractor', 'Farthingale Remodeling'],
  ['Beatrix Holloway-Finch', '5 Cornmarket', 'Old Harrow'],
  ['Rashid Mirandel', '83 Ferryman Way', 'Sable Landing'],
  ['Gwendolyn Farrier-Stowe', '37 Cloth Hall Lane', 'Quarry Ford'],
  ['Octavia Pembrooke-Lyle', '12 Tulip Tree Lane', 'Tessaly'],
] as const satisfies readonly Row[];

/** Those of the second shop. */
const ELSEWHERE = [
  ['Roderick Saltonstow', '14 Chandler Street', 'Sable Landing'],
  ['Maeve Ironquay', '3 Net Loft Lane', 'Sable Landing'],
  ['Anders Tidemann-Fell', '70 Cannery Road', 'Sable Landing', 'contractor', 'Tidemann Rooms'],
  ['Juno Pemberwick', '25 Slipway', 'Sable Landing'],
  ['Hector Lowmarsh', '9 Lighthouse Road', 'Sable Landing'],
] as const satisfies readonly Row[];

const rows: Record<ContactKey, Row> = ROWS;
const keys = Object.keys(rows) as ContactKey[];

/** Who bought something in the year. */
export function contactOf(key: ContactKey): Contact {
  return contact(rows[key], keys.indexOf(key) + 1);
}

/** The one who asked, counted from 0; there are `ASKED_COUNT`. */
export function askedContact(index: number): Contact {
  const row: Row | undefined = ASKED[index];
  if (!row) throw new RangeError(`Nobody is number ${index} among those who asked.`);
  return contact(row, keys.length + index + 1);
}
export const ASKED_COUNT = ASKED.length;

/** A contact of the second shop, counted from 0. */
export function contactElsewhere(index: number): Contact {
  const row: Row | undefined = ELSEWHERE[index];
  if (!row) throw new RangeError(`The second shop knows nobody of number ${index}.`);
  return contact(row, keys.length + ASKED.length + index + 1);
}

function contact([name, street, city, kind = 'homeowner', company = '']: Row, number: number): Contact {
  const [first = '', ...rest] = name.toLowerCase().split(' ');
  const domain = (company === '' ? rest.join('') : company.toLowerCase()).replaceAll(/[^a-z0-9]/g, '');
  return {
    ...{ kind, name, company },
    email: `${first.replaceAll(/[^a-z]/g, '')}@${domain}.example`,
    // 555-0100 to 555-0199 are kept free for fiction, and no area has the code 311.
    phone: `(311) 555-01${String(number).padStart(2, '0')}`,
    address: { street, street2: '', city, region: 'KV', postalCode: TOWNS[city] },
    taxExempt: company.includes('Clinic'),
  };
}
