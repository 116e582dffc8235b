import { useOutletContext } from 'react-router-dom';
import type { Session } from '#core/api/people.ts';

/** The session, for pages that belong to no project. */
export function useSessionHere(): Session {
  return useOutletContext<Session>();
}

/** Who is signed in, for pages that only they see. */
export function usePerson(): NonNullable<Session['person']> {
  return useSessionHere().person!;
}
