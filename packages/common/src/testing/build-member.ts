import type { Member } from '../shops/members-contract.js';
import { MADE_AT, nextId } from './ids.js';

/** Without money; pass `laborCostCentsPerHour` for one who may see it. */
export function buildMember(overrides: Partial<Member> = {}): Member {
  return {
    id: nextId(),
    version: 1,
    personId: nextId(),
    name: 'Ines Okafor',
    email: 'ines@example.com',
    role: 'crew',
    joinedAt: MADE_AT,
    ...overrides,
  };
}
