import type { MemberRole } from '../models/membership.ts';

/** The demo's team: five people of the four roles. Invented, like all of the demo. */
export const TEAM = {
  noor: { name: 'Noor Haddad', email: 'noor@petrel.example', role: 'engineer' },
  tomas: { name: 'Tomas Lind', email: 'tomas@petrel.example', role: 'engineer' },
  ingrid: { name: 'Ingrid Moreau', email: 'ingrid@petrel.example', role: 'approver' },
  lucia: { name: 'Lucia Farrow', email: 'lucia@petrel.example', role: 'viewer' },
  bram: { name: 'Bram Okoye', email: 'bram@petrel.example', role: null },
} as const satisfies Record<string, { name: string; email: string; role: MemberRole | null }>;

export type Who = keyof typeof TEAM;

export const authorOf = (who: Who): string => `${TEAM[who].name} <${TEAM[who].email}>`;
