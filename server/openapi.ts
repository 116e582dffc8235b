import { OpenAPIRegistry, OpenApiGeneratorV31 } from '@asteasolutions/zod-to-openapi';
import * as z from 'zod';
import { CONTRACT, type Exchange } from '#core/api/contract.ts';
import { problemSchema } from '#core/api/problem.ts';
import { API_ROOT, ROUTES, type Route, type RouteName } from '#core/api/routes.ts';

/** The API as OpenAPI 3.1, from the same schemas that check every request. */
export function openApiDocument(publicUrl: string): object {
  const registry = new OpenAPIRegistry();
  const bearer = registry.registerComponent('securitySchemes', 'token', { type: 'http', scheme: 'bearer' });
  const cookie = registry.registerComponent('securitySchemes', 'session', {
    type: 'apiKey',
    in: 'cookie',
    name: 'steelyard_session',
  });
  for (const name of Object.keys(ROUTES) as RouteName[]) {
    const route: Route = ROUTES[name];
    const exchange: Exchange = CONTRACT[name];
    const places = [...route.path.matchAll(/:(\w+)/g)].map(([, place]) => place!);
    const security = route.who === 'anyone' || route.who === 'demo' ? [] : [{ [cookie.name]: [] }];
    if (route.token) security.push({ [bearer.name]: [] });
    registry.registerPath({
      operationId: name,
      method: route.method.toLowerCase() as 'get',
      path: API_ROOT + route.path.replace(/:(\w+)/g, '{$1}'),
      summary: exchange.summary,
      description: WHO[route.who] + (route.token ? ` A token with the scope ${route.token} may.` : ''),
      security,
      request: {
        ...(places.length > 0 && {
          params: z.object(Object.fromEntries(places.map((p) => [p, z.string()]))),
        }),
        ...(exchange.query && { query: exchange.query }),
        ...requestBody(exchange),
      },
      responses: {
        [exchange.answer ? 200 : 204]: exchange.answer
          ? {
              description: 'Done',
              content: { [exchange.media ?? 'application/json']: { schema: exchange.answer } },
            }
          : { description: 'Done' },
        default: {
          description: 'Not done',
          content: { 'application/problem+json': { schema: problemSchema } },
        },
      },
    });
  }
  return new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: '3.1.0',
    info: {
      title: 'Steelyard',
      version: '1',
      description:
        'The record of a team: runs, releases, people. SI units; products of inertia negative (I_xy = −∫ x y dm).',
    },
    servers: [{ url: publicUrl }],
  });
}

function requestBody({ body, takes }: Exchange) {
  if (takes) return { body: { content: { [takes]: { schema: z.string() } }, required: true } };
  return body ? { body: { content: { 'application/json': { schema: body } }, required: true } } : {};
}

const WHO: Record<Route['who'], string> = {
  anyone: 'For anyone.',
  person: 'For whoever is signed in.',
  viewer: 'For viewers of the project and above.',
  engineer: 'For engineers of the project and above.',
  approver: 'For approvers of the project and administrators.',
  administrator: 'For administrators.',
  demo: 'On a demo server alone.',
};
