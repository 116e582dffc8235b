import type { Request, Response } from 'express';
import type { Answer, Body, Query } from '#core/api/contract.ts';
import type { RouteName } from '#core/api/routes.ts';
import type { Deps } from '../deps.ts';
import type { Access, Caller } from '../middleware/caller.ts';

/** Said by a handler that has written its response itself. */
export const SENT = Symbol('sent');

/** A request after its checks. */
export interface Asked<N extends RouteName> {
  readonly deps: Deps;
  readonly places: Readonly<Record<string, string>>;
  readonly query: Query<N>;
  readonly body: Body<N>;
  /** Null on routes for anyone. */
  readonly caller: Caller | null;
  /** Null where the route names no project. */
  readonly access: Access | null;
  /** Of the client, as far as trusted proxies tell. */
  readonly address: string;
  readonly request: Request;
  readonly response: Response;
}

/** Asked on a route that needs a person. */
export type AskedByPerson<N extends RouteName> = Asked<N> & { readonly caller: Caller };
/** Asked on a route of a project. */
export type AskedInProject<N extends RouteName> = AskedByPerson<N> & { readonly access: Access };

export type Handler<N extends RouteName> = (asked: AskedInProject<N>) => Promise<Answer<N> | typeof SENT>;

/** Some routes with their handlers; all of them together answer every route exactly once. */
export type Handlers = { readonly [N in RouteName]: Handler<N> };
