import { subject } from '@casl/ability';
import { ACTIONS, SUBJECTS, defineAbility, type Action, type Subject } from './ability.js';
import { ROLES, type Role } from './roles.js';

const me = '01930000-0000-7000-8000-000000000001';
const someoneElse = '01930000-0000-7000-8000-000000000002';
const row = (of: Subject, fields: Record<PropertyKey, unknown>) => subject(of, { ...fields });
const as = (role: Role) => defineAbility({ memberId: me, role });

/** Who may do what at all, from the table of people in the product's description. An owner may do everything. */
const MATRIX: Record<Subject, Record<Exclude<Role, 'owner'>, Action[]>> = {
  Shop: { bookkeeper: ['read'], 'lead-hand': [], crew: [] },
  Member: { bookkeeper: ['read'], 'lead-hand': ['read'], crew: [] },
  Invitation: { bookkeeper: [], 'lead-hand': [], crew: [] },
  Subscription: { bookkeeper: [], 'lead-hand': [], crew: [] },
  PaymentAccount: { bookkeeper: [], 'lead-hand': [], crew: [] },
  Operation: { bookkeeper: ['read'], 'lead-hand': ['read'], crew: ['read'] },
  Customer: { bookkeeper: ['read', 'create', 'update'], 'lead-hand': ['read'], crew: [] },
  Site: { bookkeeper: ['read', 'create', 'update'], 'lead-hand': ['read'], crew: [] },
  Lead: { bookkeeper: ['read'], 'lead-hand': [], crew: [] },
  Estimate: { bookkeeper: ['read'], 'lead-hand': [], crew: [] },
  Job: { bookkeeper: ['read'], 'lead-hand': ['read', 'update'], crew: ['read'] },
  JobCost: { bookkeeper: ['read', 'create', 'delete'], 'lead-hand': [], crew: [] },
  JobFile: {
    bookkeeper: ['read', 'create', 'delete'],
    'lead-hand': ['read', 'create', 'delete'],
    crew: ['read', 'create'],
  },
  TimeEntry: {
    bookkeeper: ['read', 'create', 'update', 'correct', 'export'],
    'lead-hand': ['read', 'create', 'update', 'correct'],
    crew: ['read', 'create', 'update'],
  },
  Invoice: {
    bookkeeper: ['read', 'create', 'update', 'delete', 'send', 'issue', 'credit', 'export'],
    'lead-hand': [],
    crew: [],
  },
  Payment: { bookkeeper: ['read', 'create', 'correct', 'export'], 'lead-hand': [], crew: [] },
  LedgerEntry: { bookkeeper: ['read', 'export'], 'lead-hand': [], crew: [] },
  AuditEntry: { bookkeeper: ['read'], 'lead-hand': [], crew: [] },
};

describe.each(ROLES)('as %s', (role) => {
  const ability = as(role);
  const expected = (of: Subject): readonly Action[] => (role === 'owner' ? ACTIONS : MATRIX[of][role]);

  it.each(SUBJECTS)('%s: exactly what the table says', (of) => {
    expect(ACTIONS.filter((action) => ability.can(action, of))).toEqual(
      ACTIONS.filter((action) => expected(of).includes(action)),
    );
  });
});

describe('money', () => {
  it.each([
    ['owner', true],
    ['bookkeeper', true],
    ['lead-hand', false],
    ['crew', false],
  ] as const)('of jobs and time, as %s: %s', (role, seen) => {
    const job = row('Job', { openToCrew: true, assignedMemberIds: [me] });
    expect(as(role).can('read', job, 'money')).toBe(seen);
    expect(as(role).can('read', job, 'floor')).toBe(true);
    expect(as(role).can('read', row('TimeEntry', { memberId: me }), 'money')).toBe(seen);
  });

  it.each(['Operation', 'Member'] as const)('of %s is kept from the floor', (of) => {
    expect(as('lead-hand').can('read', of, 'money')).toBe(false);
    expect(as('crew').can('read', of, 'money')).toBe(false);
    expect(as('bookkeeper').can('read', of, 'money')).toBe(true);
  });
});

describe('the crew', () => {
  const crew = as('crew');

  it('sees the jobs open to it or assigned to it, and no other', () => {
    const job = (openToCrew: boolean, assignedMemberIds: string[]) =>
      row('Job', { openToCrew, assignedMemberIds });
    expect(crew.can('read', job(true, []))).toBe(true);
    expect(crew.can('read', job(false, [someoneElse, me]))).toBe(true);
    expect(crew.can('read', job(false, [someoneElse]))).toBe(false);
  });

  it('reads, clocks and changes its own time only, and corrects none', () => {
    const own = () => row('TimeEntry', { memberId: me });
    const other = () => row('TimeEntry', { memberId: someoneElse });
    expect(
      (['read', 'create', 'update', 'correct'] as const).map((action) => crew.can(action, own())),
    ).toEqual([true, true, true, false]);
    expect(
      (['read', 'create', 'update', 'correct'] as const).some((action) => crew.can(action, other())),
    ).toBe(false);
  });
});

describe('the lead hand', () => {
  it('reads and corrects everybody’s time', () => {
    expect(as('lead-hand').can('correct', row('TimeEntry', { memberId: someoneElse }))).toBe(true);
  });
});
