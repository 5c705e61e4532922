export const ROLES = ['owner', 'bookkeeper', 'lead-hand', 'crew'] as const;
/** A member's one role in a shop. */
export type Role = (typeof ROLES)[number];

export const ROLE_NAMES: Record<Role, string> = {
  owner: 'Owner',
  bookkeeper: 'Bookkeeper',
  'lead-hand': 'Lead hand',
  crew: 'Crew',
};
