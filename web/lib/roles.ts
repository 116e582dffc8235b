import type { ROLES, Role } from '#core/api/people.ts';

// The contract's own order; its module brings zod, so the words stand here and the type holds them to it.
const ORDER: typeof ROLES = ['viewer', 'engineer', 'approver', 'administrator'];

/** Whether a role may do what another may. */
export function atLeast(role: Role, needed: Role): boolean {
  return ORDER.indexOf(role) >= ORDER.indexOf(needed);
}

/** What a membership can be, with what it may do in a few words. */
export const MEMBER_ROLES = [
  { role: 'viewer', may: 'reads runs, differences and reports' },
  { role: 'engineer', may: 'also pushes, uploads, comments, makes tokens' },
  { role: 'approver', may: 'also releases runs that others pushed' },
] as const;
