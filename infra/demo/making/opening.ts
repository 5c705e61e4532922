import type { Product } from '@bookmatch/api/compose';
import type { Platform } from '@bookmatch/api/platform/platform';
import type { GlobalScope, ShopScope } from '@bookmatch/api/platform/database/scope';
import { Person as PersonRow } from '@bookmatch/api/features/accounts/accounts-public';
import { hashPassword } from '@bookmatch/api/features/accounts/passwords';
import { signUpSchema, type Membership } from '@bookmatch/common/accounts/accounts-contract';
import { updateShopSchema } from '@bookmatch/common/shops/shops-contract';
import { DEMO_PASSWORD, type Person, type Place } from '../cast/people.js';
import type { DemoShop } from '../cast/shops.js';
import { OPERATION_RATES, JOB_OPERATIONS } from '../catalog/operations.js';
import { Desk, systemAt } from './desk.js';
import { submitHostedPage } from './hosted-page.js';
import { Letters } from './letters.js';

export type Ground = { platform: Platform; services: Product['services'] };

/** Signs a shop up through its owner's letter, and answers the desk to act in it from. */
export async function openShop(ground: Ground, owner: Person, shop: DemoShop, at: Date): Promise<Desk> {
  const { platform, services } = ground;
  const { shopName, timeZone, unitSystem } = shop;
  const input = signUpSchema.parse({ ...owner, password: DEMO_PASSWORD, shopName, timeZone, unitSystem });
  const passwordHash = await hashPassword(input.password);
  const act = <Result>(work: (scope: GlobalScope) => Promise<Result>) =>
    platform.work.transaction(systemAt(at), work);
  await act((scope) => services.accounts.signUp(scope, { ...input, passwordHash, personId: scope.newId() }));
  const token = await new Letters(platform).tokenTo(owner.email);
  const person = await act((scope) => services.accounts.confirmEmail(scope, token));
  const session = await act((scope) => services.accounts.session(scope, person.id));
  const membership = session.memberships.find((one) => one.shopName === shopName);
  if (!membership) throw new RangeError(`${shopName} was not made.`);
  const desk = new Desk(platform, services, membership.shopId, timeZone);
  desk.seat(owner, seatOf(person.id, membership));
  await setUp(desk, owner, shop, at);
  return desk;
}

async function setUp(desk: Desk, owner: Person, shop: DemoShop, at: Date): Promise<void> {
  const { settings, operations } = desk.services;
  await desk.as(owner, at, async (scope) => {
    const { version } = await settings.get(scope);
    await settings.update(scope, updateShopSchema.parse(shop.settings), version);
    for (const { id, name, version: seen } of await operations.list(scope)) {
      const known = JOB_OPERATIONS.find((one) => one === name);
      if (known)
        await operations.update(
          scope,
          id,
          { defaultRateCentsPerHour: OPERATION_RATES[known].costCents },
          seen,
        );
    }
    desk.nameOperations(await operations.list(scope));
  });
}

/** Invites somebody and accepts for them, by the link in the letter; somebody with an account is signed in. */
export async function takeIn(desk: Desk, owner: Person, place: Place, at: Date): Promise<void> {
  const { platform, services } = desk;
  const { person, role, laborCostCentsPerHour } = place;
  await desk.as(owner, at, (scope) => services.invitations.invite(scope, { email: person.email, role }));
  const token = await new Letters(platform).tokenTo(person.email);
  const known = await platform.work.read(systemAt(at), (scope) =>
    scope.global(PersonRow).findOneBy({ email: person.email }),
  );
  const answer = known ? { token } : { token, name: person.name, password: DEMO_PASSWORD };
  const personId = await services.acceptance.accept(platform.work, systemAt(at), answer, known?.id ?? null);
  await desk.as(owner, at, async (scope) => {
    const { rows } = await services.members.list(scope);
    const member = rows.find((one) => one.personId === personId);
    if (!member) throw new RangeError(`${person.email} did not become a member.`);
    if (laborCostCentsPerHour !== null)
      await services.members.setLaborCost(scope, member.id, laborCostCentsPerHour, member.version);
    desk.seat(person, { personId, memberId: member.id, role });
  });
}

/** Subscribes and pays with a test card. When the trial is over by then, the subscription is active at once. */
export async function subscribe(desk: Desk, owner: Person, at: Date): Promise<void> {
  const { subscription } = desk.services;
  const stamp = desk.stampOf(owner, at);
  const { url } = await reading(desk, owner, at, (scope) =>
    subscription.startCheckout(scope, stamp, desk.shopId),
  );
  await submitHostedPage(url, { card: 'pays', email: owner.email });
  await reading(desk, owner, at, (scope) => subscription.refresh(scope, stamp));
}

/** Opens the shop's own account at the provider, so that its customers can pay by card. */
export async function takeCards(desk: Desk, owner: Person, businessName: string, at: Date): Promise<void> {
  const { cardPayments } = desk.services;
  const stamp = desk.stampOf(owner, at);
  const { url } = await reading(desk, owner, at, (scope) => cardPayments.setUp(scope, stamp));
  await submitHostedPage(url, { action: 'complete', business_name: businessName });
  await reading(desk, owner, at, (scope) => cardPayments.refresh(scope, stamp));
}

/** Outside a transaction: for what calls the provider in between and writes in transactions of its own. */
export function reading<Result>(
  desk: Desk,
  person: Person,
  at: Date,
  work: (scope: ShopScope) => Promise<Result>,
): Promise<Result> {
  return desk.platform.work.read(desk.stampOf(person, at), (scope) =>
    work(desk.memberScope(scope, person, at)),
  );
}

const seatOf = (personId: string, { memberId, role }: Membership) => ({ personId, memberId, role });
