import { queryOptions } from '@tanstack/react-query';
import type { Answer, Body, Query } from '#core/api/contract.ts';
import { addressOf, ROUTES, type RouteName } from '#core/api/routes.ts';
import { ApiProblem, serverAway } from './api-problem.ts';

export interface RequestParts<N extends RouteName> {
  /** By the name after the colon in the route's path. */
  readonly places?: Readonly<Record<string, string>>;
  readonly query?: Partial<Query<N>>;
  readonly body?: Body<N>;
  /** Of a request that takes files. */
  readonly form?: FormData;
  readonly signal?: AbortSignal;
}

/**
 * Asks the server by the name of a route.
 *
 * @returns the answer of the contract; null where it has no body
 * @throws ApiProblem with the server's problem details; code `SERVER_AWAY` where it does not answer
 */
export async function request<N extends RouteName>(name: N, parts: RequestParts<N> = {}): Promise<Answer<N>> {
  const address = addressOf(name, parts.places, parts.query as Record<string, string | number | undefined>);
  const response = await send(address, {
    method: ROUTES[name].method,
    credentials: 'same-origin',
    headers: {
      accept: 'application/json, application/problem+json',
      ...(parts.body !== undefined && { 'content-type': 'application/json' }),
    },
    body: parts.form ?? (parts.body === undefined ? undefined : JSON.stringify(parts.body)),
    signal: parts.signal,
  });
  const text = await textOf(response, parts.signal);
  if (!response.ok) throw problemOf(response, text);
  return (text === '' ? null : JSON.parse(text)) as Answer<N>;
}

/** The same as a query, under the key [route, places, query]. */
export function queryOf<N extends RouteName>(name: N, parts: Pick<RequestParts<N>, 'places' | 'query'> = {}) {
  return queryOptions({
    queryKey: [name, parts.places ?? {}, parts.query ?? {}] as const,
    queryFn: ({ signal }) => request(name, { ...parts, signal }),
  });
}

async function send(address: string, init: RequestInit): Promise<Response> {
  try {
    return await fetch(address, init);
  } catch (error) {
    if (init.signal?.aborted) throw error;
    throw serverAway();
  }
}

async function textOf(response: Response, signal: AbortSignal | undefined): Promise<string> {
  try {
    return await response.text();
  } catch (error) {
    if (signal?.aborted) throw error;
    throw serverAway();
  }
}

function problemOf(response: Response, text: string): ApiProblem {
  const problem = parsed(text);
  if (problem) return new ApiProblem(problem);
  if ([502, 503, 504].includes(response.status)) return serverAway();
  return new ApiProblem({
    status: response.status,
    code: 'SERVER_ANSWER',
    title: 'An answer that is not ours',
    detail: `The server answered ${response.status} without saying why.`,
    hint: 'Something between you and the server may have answered in its place.',
  });
}

function parsed(text: string): ConstructorParameters<typeof ApiProblem>[0] | undefined {
  try {
    const value: unknown = JSON.parse(text);
    const is = typeof value === 'object' && value !== null && 'code' in value && 'detail' in value;
    return is ? (value as ConstructorParameters<typeof ApiProblem>[0]) : undefined;
  } catch {
    return undefined;
  }
}
