import type { UnitSystem } from '@bookmatch/common/measure/unit-system';
import type { UpdateShop } from '@bookmatch/common/shops/shops-contract';

export type DemoShop = {
  shopName: string;
  timeZone: string;
  unitSystem: UnitSystem;
  /** What its owner sets on the first day. */
  settings: UpdateShop;
};

const TERMS = [
  'Prices hold until the date above. Work begins when the deposit is paid and the drawings are approved.',
  'Wood moves and varies in color; both are part of it. We hang our cabinets into studs or blocking, and ask that walls are closed, dry and free when we come.',
  'Changes are priced and agreed in writing before they are made.',
].join('\n\n');

export const FIRST_SHOP: DemoShop = {
  shopName: 'Quillback Cabinet Works',
  timeZone: 'America/Chicago',
  unitSystem: 'inch',
  settings: {
    phone: '(311) 555-0100',
    email: 'office@quillback.example',
    address: {
      street: '18 Tannery Row',
      street2: 'Unit C',
      city: 'Quarry Ford',
      region: 'KV',
      postalCode: '00314',
    },
    defaultTaxRate: '0.0725',
    estimateTerms: TERMS,
    estimateValidDays: 30,
    invoiceDueDays: 14,
  },
};

export const SECOND_SHOP: DemoShop = {
  shopName: 'Oxbow & Teal Joinery',
  timeZone: 'America/Halifax',
  unitSystem: 'metric',
  settings: {
    phone: '(311) 555-0180',
    email: 'hello@oxbowteal.example',
    address: {
      street: '4 Ropewalk Lane',
      street2: '',
      city: 'Sable Landing',
      region: 'KV',
      postalCode: '00327',
    },
    defaultTaxRate: '0.05',
    estimateTerms: 'Prices hold for three weeks. Half is due when you accept, half when the work stands.',
    estimateValidDays: 21,
    invoiceDueDays: 10,
    defaultBillingSchedule: [
      { name: 'Deposit', share: { percent: '50' }, deposit: true, due: 'on-acceptance' },
      { name: 'Installed', share: { remainder: true }, deposit: false, due: 'by-hand' },
    ],
  },
};
