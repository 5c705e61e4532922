import { AbilityBuilder, createMongoAbility } from '@casl/ability';
import { defineAbility, type Ability } from '@bookmatch/common/access/ability';
import { abilitySql, type SqlFields } from './ability-sql.js';

const FIELDS: SqlFields = {
  openToCrew: (parameter) => `job.openToCrew = ${parameter}`,
  assignedMemberIds: (parameter) => `exists (${parameter})`,
};
const narrow = (ability: Ability) => abilitySql(ability, 'read', 'Job', FIELDS);

function abilityOf(grant: (can: AbilityBuilder<Ability>['can']) => void): Ability {
  const { can, build } = new AbilityBuilder<Ability>(createMongoAbility);
  grant(can);
  return build();
}

describe('an ability in SQL', () => {
  it('is no rows when nothing grants any', () => {
    expect(narrow(abilityOf(() => undefined))).toEqual({ sql: '1 = 0', parameters: {} });
    const invoices = abilitySql(defineAbility({ memberId: 'm', role: 'crew' }), 'read', 'Invoice', {});
    expect(invoices.sql).toBe('1 = 0');
  });

  it('is all rows for a grant without conditions', () => {
    expect(narrow(defineAbility({ memberId: 'm', role: 'owner' })).sql).toBe('1 = 1');
    expect(narrow(defineAbility({ memberId: 'm', role: 'lead-hand' })).sql).toBe('1 = 1');
  });

  it('joins what several grants give, values as parameters only', () => {
    const { sql, parameters } = narrow(defineAbility({ memberId: "m' or 1 = 1", role: 'crew' }));
    expect(sql).toBe('(exists (:granted0) or job.openToCrew = :granted1)');
    expect(parameters).toEqual({ granted0: "m' or 1 = 1", granted1: true });
  });

  it('joins the conditions of one grant with and', () => {
    const { sql } = narrow(
      abilityOf((can) => can('read', 'Job', { openToCrew: true, assignedMemberIds: 'm' })),
    );
    expect(sql).toBe('(job.openToCrew = :granted0 and exists (:granted1))');
  });

  it('asks for any value of a list, and for none of an empty one', () => {
    const some = narrow(abilityOf((can) => can('read', 'Job', { openToCrew: { $in: [true, false] } })));
    expect(some.sql).toBe('(job.openToCrew = :granted0 or job.openToCrew = :granted1)');
    const none = narrow(abilityOf((can) => can('read', 'Job', { openToCrew: { $in: [] } })));
    expect(none.sql).toBe('1 = 0');
  });

  it('throws on what it cannot ask instead of leaving it out', () => {
    const withCondition = (conditions: Record<string, unknown>) => () =>
      narrow(abilityOf((can) => can('read', 'Job', conditions)));
    expect(withCondition({ number: { $gt: 5 } })).toThrow(/operator gt/);
    expect(withCondition({ shopId: 'x' })).toThrow(/field shopId/);
    expect(withCondition({ openToCrew: null })).toThrow(/compares with/);
  });
});
