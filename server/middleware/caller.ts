import type { Role } from '#core/api/people.ts';
import type { Person, Project, Session, Token } from '../models/index.ts';

/** Who asks: a person by session, or by token a person or a machine. */
export interface Caller {
  readonly person: Person;
  readonly session: Session | null;
  readonly token: Token | null;
}

/** A project that the caller may see, and their role in it. */
export interface Access {
  readonly project: Project;
  readonly role: Role;
}

const RANK: Record<Role, number> = { viewer: 0, engineer: 1, approver: 2, administrator: 3 };

export const hasRole = (role: Role, needed: Role): boolean => RANK[role] >= RANK[needed];

/** The name under which something is done: a machine's label, or the person's name. */
export const nameOf = ({ person, token }: Caller): string =>
  token?.kind === 'machine' ? `${token.label} (machine)` : person.name;
