import { type QueryClient, useQuery, useQueryClient } from '@tanstack/react-query';
import type { Session } from '#core/api/people.ts';
import { queryOf, request } from './client.ts';

export const sessionQuery = { ...queryOf('showSession'), staleTime: 60_000 };

/** Who is signed in; `data.person` is null where nobody is. */
export const useSession = () => useQuery(sessionQuery);

/** Forgets everything that was loaded for someone else and keeps the new session. */
export function enter(client: QueryClient, session: Session): void {
  client.removeQueries({ predicate: (query) => query.queryKey[0] !== 'showSession' });
  client.setQueryData(sessionQuery.queryKey, session);
}

/** Ends the session here, or all of one's sessions. */
export function useSignOut() {
  const client = useQueryClient();
  return async (everywhere = false) => {
    await request(everywhere ? 'signOutEverywhere' : 'signOut');
    client.removeQueries({ predicate: (query) => query.queryKey[0] !== 'showSession' });
    await client.invalidateQueries({ queryKey: sessionQuery.queryKey });
  };
}

/** Runs a prefetch once it is known that someone is signed in; for loaders that must not wait. */
export async function whenSignedIn(client: QueryClient, prefetch: () => void): Promise<void> {
  const session = await client.fetchQuery(sessionQuery).catch(() => null);
  if (session?.person) prefetch();
}
