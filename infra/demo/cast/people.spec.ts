import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { newPasswordSchema } from '@bookmatch/common/accounts/accounts-contract';
import { ROLE_NAMES, type Role } from '@bookmatch/common/access/roles';
import { DEMO_PASSWORD, FIRST_SHOP_MEMBERS, OWNER, SECOND_OWNER, type Person } from './people.js';
import { FIRST_SHOP, SECOND_SHOP } from './shops.js';

type SignIn = { role: string; email: string; password: string; shop: string };
const signIns = JSON.parse(readFileSync(join(__dirname, '../sign-ins.json'), 'utf8')) as SignIn[];

describe('the sign-ins that are printed', () => {
  it('are those of the people who are made, one a role', () => {
    const places: [Person, Role][] = [
      [OWNER, 'owner'],
      ...FIRST_SHOP_MEMBERS.map(({ person, role }): [Person, Role] => [person, role]),
      [SECOND_OWNER, 'owner'],
    ];
    expect(signIns.map(({ role, email }) => [role, email])).toEqual(
      places.map(([{ email }, role]) => [ROLE_NAMES[role], email]),
    );
    expect([...new Set(signIns.map(({ role }) => role))].sort()).toEqual(Object.values(ROLE_NAMES).sort());
  });

  it('have the password that the people have, and one that may be chosen', () => {
    for (const { password } of signIns) expect(password).toBe(DEMO_PASSWORD);
    expect(newPasswordSchema.safeParse(DEMO_PASSWORD).success).toBe(true);
  });

  it('name the shops', () => {
    for (const { shop } of signIns)
      expect(shop).toMatch(new RegExp(`${FIRST_SHOP.shopName}|${SECOND_SHOP.shopName}`));
  });
});
