import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';
import { ApiProblem } from '#web/api/api-problem.ts';

/** One retry where the server is away; a refusal is final. A lost session is looked up again, which leads to sign-in. */
export function createQueryClient(): QueryClient {
  const onError = (error: unknown) => {
    if (error instanceof ApiProblem && error.status === 401)
      void client.invalidateQueries({ queryKey: ['showSession'] });
  };
  const client: QueryClient = new QueryClient({
    queryCache: new QueryCache({ onError }),
    mutationCache: new MutationCache({ onError }),
    defaultOptions: {
      queries: {
        staleTime: 15_000,
        refetchOnWindowFocus: true,
        networkMode: 'always',
        retry: (count, error) => count < 1 && error instanceof ApiProblem && error.code === 'SERVER_AWAY',
      },
      mutations: { networkMode: 'always', retry: false },
    },
  });
  return client;
}
