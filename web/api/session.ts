import { type QueryClient, useQuery } from '@tanstack/react-query';
import type { Session } from '#core/api/people.ts';
import { PATHS } from '#web/paths.ts';
import { queryOf, request } from './client.ts';

export const sessionQuery = { ...queryOf('showSession'), staleTime: 60_000 };

/** Who is signed in; `data.person` is null where nobody is. */
export const useSession = () => useQuery(sessionQuery);

/** Forgets everything that was loaded for someone else and keeps the new session. */
export function enter(client: QueryClient, session: Session): void {
  client.removeQueries({ predicate: (query) => query.queryKey[0] !== 'showSession' });
  client.setQueryData(sessionQuery.queryKey, session);
}

/**
 * Ends the session here, or all of one's sessions, and loads the sign-in page anew: nothing that was shown stays in
 * this page's memory.
 *
 * @throws ApiProblem where the server did not do it
 */
export async function signOut(everywhere = false): Promise<void> {
  await request(everywhere ? 'signOutEverywhere' : 'signOut');
  location.assign(PATHS.signIn);
}

/** Runs a prefetch once it is known that someone is signed in; for loaders that must not wait. */
export async function whenSignedIn(client: QueryClient, prefetch: () => void): Promise<void> {
  const session = await client.fetchQuery(sessionQuery).catch(() => null);
  if (session?.person) prefetch();
}
