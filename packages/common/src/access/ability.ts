import { AbilityBuilder, createMongoAbility, type MongoAbility } from '@casl/ability';
import type { Role } from './roles.js';

export const ACTIONS = [
  'read',
  'create',
  'update',
  'delete',
  'send',
  'issue',
  'pay',
  'credit',
  'correct',
  'export',
  'manage',
] as const;
export type Action = (typeof ACTIONS)[number];

export const SUBJECTS = [
  'Shop',
  'Member',
  'Invitation',
  'Subscription',
  'PaymentAccount',
  'Operation',
  'Customer',
  'Site',
  'Lead',
  'Estimate',
  'Job',
  'JobCost',
  'JobFile',
  'TimeEntry',
  'Invoice',
  'Payment',
  'LedgerEntry',
  'AuditEntry',
] as const;
export type Subject = (typeof SUBJECTS)[number];

/** Who is acting: a member of one shop. The shop itself is held by the database scope, not by conditions here. */
export type Actor = { memberId: string; role: Role };

export type Ability = MongoAbility<
  [Action, Subject | (Record<PropertyKey, unknown> & { readonly __caslSubjectType__?: Subject })]
>;
type Grant = AbilityBuilder<Ability>['can'];

/**
 * The field groups of a subject that not every reader may see. A grant that names `floor` gives only what the floor
 * needs; a grant without fields gives the `money` too. What is not granted is absent from an answer, not blank.
 */
export const FIELD_GROUPS = ['floor', 'money'] as const;

/**
 * The one definition of who may do what, for both sides. It only grants; what is not granted is refused.
 * Each role's function adds to the one below it where the roles really nest.
 */
export function defineAbility(actor: Actor): Ability {
  const { can, build } = new AbilityBuilder<Ability>(createMongoAbility);
  GRANTS[actor.role](can, actor);
  return build({ detectSubjectType: (row) => row.__caslSubjectType__ ?? 'Shop' });
}

const GRANTS: Record<Role, (can: Grant, actor: Actor) => void> = {
  crew: grantCrew,
  'lead-hand': grantLeadHand,
  bookkeeper: grantBookkeeper,
  owner: grantOwner,
};

function grantCrew(can: Grant, { memberId }: Actor): void {
  can('read', 'Operation', ['floor']);
  can('read', 'Job', ['floor'], { openToCrew: true });
  can('read', 'Job', ['floor'], { assignedMemberIds: memberId });
  can(['read', 'create'], 'JobFile');
  can(['read', 'create', 'update'], 'TimeEntry', ['floor'], { memberId });
}

function grantLeadHand(can: Grant): void {
  can('read', ['Operation', 'Member'], ['floor']);
  can('read', ['Customer', 'Site', 'JobFile']);
  can(['read', 'update'], 'Job', ['floor']);
  can(['read', 'create', 'update', 'correct'], 'TimeEntry', ['floor']);
  can(['create', 'delete'], 'JobFile');
}

function grantBookkeeper(can: Grant): void {
  can('read', [
    'Shop',
    'Member',
    'Operation',
    'Customer',
    'Site',
    'Lead',
    'Estimate',
    'Job',
    'JobCost',
    'JobFile',
  ]);
  can(['create', 'update'], ['Customer', 'Site']);
  can(['read', 'create', 'update', 'delete', 'send', 'issue', 'credit', 'export'], 'Invoice');
  can(['read', 'create', 'correct', 'export'], 'Payment');
  can(['read', 'export'], 'LedgerEntry');
  can(['read', 'create', 'update', 'correct', 'export'], 'TimeEntry');
  can(['create', 'delete'], ['JobCost', 'JobFile']);
  can('read', 'AuditEntry');
}

function grantOwner(can: Grant): void {
  can([...ACTIONS], [...SUBJECTS]);
}
