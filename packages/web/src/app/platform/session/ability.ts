import { inject, InjectionToken } from '@angular/core';
import { createMongoAbility } from '@casl/ability';
import { AbilityServiceSignal } from '@casl/angular';
import type { Ability, Action, Subject } from '@bookmatch/common/access/ability';
import { CurrentShop } from './current-shop';

/** What the signed-in member may do; filled when the session is known, empty before. */
export const ABILITY = new InjectionToken<Ability>('ABILITY');

/** Nobody may do anything. Rows are told apart as in `defineAbility`, since updating the rules keeps this. */
export function emptyAbility(): Ability {
  return createMongoAbility<Ability>([], {
    detectSubjectType: (row) => row.__caslSubjectType__ ?? 'Shop',
  });
}

export type Can = (
  action: Action,
  subject: Subject | (Record<PropertyKey, unknown> & { __caslSubjectType__?: Subject }),
  field?: 'floor' | 'money',
) => boolean;

const CHANGES_NOTHING: ReadonlySet<Action> = new Set(['read', 'export']);

/**
 * In a field of a component: `protected readonly can = injectCan();`, in its template `can('create', 'Customer')`.
 * While the subscription has lapsed only reading, exporting and the subscription itself are left.
 */
export function injectCan(): Can {
  const ability = inject<AbilityServiceSignal<Ability>>(AbilityServiceSignal);
  const { readOnly } = inject(CurrentShop);
  return (action, subject, field) => {
    const open = !readOnly() || CHANGES_NOTHING.has(action) || subject === 'Subscription';
    return open && ability.can(action, subject, field);
  };
}

/** The row as the ability's conditions see it. A copy, since rows of the store cannot be marked. */
export function asSubject<Row extends object>(
  type: Subject,
  row: Row,
): Row & { __caslSubjectType__: Subject } {
  return { ...row, __caslSubjectType__: type };
}
