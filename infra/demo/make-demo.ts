import { compose } from '@bookmatch/api/compose';
import type { Platform } from '@bookmatch/api/platform/platform';
import { FIRST_SHOP_MEMBERS, OWNER, SECOND_OWNER, SECOND_SHOP_MEMBERS } from './cast/people.js';
import { checkShop, refuseFaults } from './check/check-shop.js';
import { summaryOf } from './check/summary.js';
import { makeFirstShop } from './first-shop.js';
import { Letters } from './making/letters.js';
import { isMade, markAsMade } from './marker.js';
import { makeSecondShop } from './second-shop.js';
import { setAside } from './set-aside.js';

const PEOPLE = [
  OWNER,
  SECOND_OWNER,
  ...[...FIRST_SHOP_MEMBERS, ...SECOND_SHOP_MEMBERS].map(({ person }) => person),
];

/**
 * Makes both demo shops through the product's own services, checks them, and answers what there is. Null when they are
 * there already. What a killed run left is set aside first.
 *
 * @param now the moment at which their history ends
 * @throws when a service refuses or a sum does not come out
 */
export async function makeDemo(platform: Platform, now: Date): Promise<string | null> {
  if (await isMade(platform)) return null;
  await setAside(platform, PEOPLE, now);
  // The outbox worker is not started: no letter of the demo is sent.
  const { services } = compose(platform);
  const ground = { platform, services };
  const first = await makeFirstShop(ground, now);
  const second = await makeSecondShop(ground, now);
  const emails = PEOPLE.map(({ email }) => email);
  await new Letters(platform).keepFromSending([first.shopId, second.shopId], emails, now);
  refuseFaults([...(await checkShop(first, OWNER, now)), ...(await checkShop(second, SECOND_OWNER, now))]);
  await markAsMade(platform, now);
  return [await summaryOf(first, OWNER, now), await summaryOf(second, SECOND_OWNER, now)].join(' ');
}
