import jwt from 'jsonwebtoken';
import type { Config } from '../config.ts';
import type { Person } from '../models/index.ts';

/** A link that stops a person's mail with one click, without signing in; it can do nothing else. */
export const stopLink = (person: Person, { PUBLIC_URL, SECRET }: Config): string =>
  `${PUBLIC_URL}/mail-stop/${jwt.sign({ stop: person.id }, SECRET, { algorithm: 'HS256', noTimestamp: true })}`;

/** Whose mail a link stops; null where it is not one of ours. */
export function personOfStopLink(link: string, { SECRET }: Config): number | null {
  try {
    const claims = jwt.verify(link, SECRET, { algorithms: ['HS256'] }) as { stop?: number };
    return claims.stop ?? null;
  } catch {
    return null;
  }
}
