import cookieParser from 'cookie-parser';
import express, { type Express, type RequestHandler } from 'express';
import { rateLimit } from 'express-rate-limit';
import helmet from 'helmet';
import { pinoHttp } from 'pino-http';
import type * as z from 'zod';
import { CONTRACT, type Exchange } from '#core/api/contract.ts';
import { API_ROOT, ROUTES, type Route, type RouteName } from '#core/api/routes.ts';
import type { Deps } from './deps.ts';
import { plainError } from './log-error.ts';
import { authenticate } from './middleware/authenticate.ts';
import { authorize } from './middleware/authorize.ts';
import { bodyReader } from './middleware/body.ts';
import { nothingHere, problems } from './middleware/problems.ts';
import { refuseCrossSite } from './middleware/refuse-cross-site.ts';
import { ProblemError } from './problem.ts';
import { handlers } from './routes/index.ts';
import { type AskedInProject, type Handler, SENT } from './routes/route.ts';
import { servePages } from './serve-pages.ts';

/** The application: middleware, every route of the API, the dashboard's pages. It does not listen. */
export function createApp(deps: Deps, pages: string | null): Express {
  const { config, log } = deps;
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', config.TRUST_PROXY);
  app.use(pinoHttp({ logger: log, ...LOGGED }));
  app.use(securityHeaders(config.PUBLIC_URL));
  const api = express.Router({ caseSensitive: true });
  api.use(limitRate(config.RATE_PER_MINUTE));
  api.use(refuseCrossSite(config.PUBLIC_URL));
  api.use(cookieParser());
  for (const name of Object.keys(ROUTES) as RouteName[]) addRoute(api, name, deps);
  api.use(nothingHere);
  app.use(API_ROOT, noStore, api);
  if (pages) servePages(app, pages);
  app.use(nothingHere);
  app.use(problems);
  return app;
}

/** One line a request: no headers, no cookies, no query, for secrets travel in them. */
const LOGGED = {
  quietReqLogger: true,
  genReqId: (): string => crypto.randomUUID(),
  serializers: {
    req: ({ id, method, url }: { id: string; method: string; url: string }) => ({
      id,
      method,
      url: url
        .split('?')[0]!
        .replace(/(\/(?:resets|invitations|mail-stops|reset|invitation|mail-stop)\/)[^/]+/, '$1…'),
    }),
    err: plainError,
    res: ({ statusCode }: { statusCode: number }) => ({ statusCode }),
  },
};

const securityHeaders = (publicUrl: string): RequestHandler =>
  helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'none'"],
        scriptSrc: ["'self'"],
        styleSrc: ["'self'"],
        imgSrc: ["'self'"],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        formAction: ["'self'"],
        baseUri: ["'none'"],
        frameAncestors: ["'none'"],
        ...(publicUrl.startsWith('https:') && { upgradeInsecureRequests: [] }),
      },
    },
    strictTransportSecurity: publicUrl.startsWith('https:') && { maxAge: 31_536_000 },
    referrerPolicy: { policy: 'same-origin' },
  });

const noStore: RequestHandler = (_, response, next) => {
  response.set('Cache-Control', 'no-store');
  next();
};

const limitRate = (perMinute: number): RequestHandler =>
  rateLimit({
    windowMs: 60_000,
    limit: perMinute,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    handler: () => {
      throw new ProblemError(
        429,
        'RATE',
        `expected at most ${perMinute} requests a minute from one address`,
        {
          hint: 'wait, or set RATE_PER_MINUTE on the server',
          retryAfter: 10,
        },
      );
    },
  });

const METHODS = { GET: 'get', POST: 'post', PUT: 'put', PATCH: 'patch', DELETE: 'delete' } as const;

function addRoute(api: express.Router, name: RouteName, deps: Deps): void {
  const route: Route = ROUTES[name];
  const exchange: Exchange = CONTRACT[name];
  const handler = handlers[name] as Handler<RouteName>;
  const reader = bodyReader(name);
  const answer: RequestHandler = async (request, response) => {
    const places = request.params as Record<string, string>;
    const caller = await authenticate(request, deps);
    const access = await authorize(route, places.project, caller, deps.config.DEMO === 'yes');
    // The body is read only for those who may send one.
    if (reader && request.method !== 'GET')
      await new Promise<void>((resolve, reject) => {
        reader(request, response, (error?: unknown) => (error ? reject(error) : resolve()));
      });
    const asked = {
      deps,
      places,
      query: check(exchange.query, request.query, 'QUERY_NOT_RIGHT'),
      body: check(exchange.body, request.body, 'BODY_NOT_RIGHT'),
      caller,
      access,
      address: request.ip ?? '',
      request,
      response,
    } as unknown as AskedInProject<RouteName>;
    const found = await handler(asked);
    if (found === SENT) return;
    if (exchange.answer === null) response.status(204).end();
    else response.json(found);
  };
  api[METHODS[route.method]](route.path, answer);
}

function check(schema: z.ZodType | undefined, given: unknown, code: string): unknown {
  if (!schema) return undefined;
  const parsed = schema.safeParse(given ?? {});
  if (parsed.success) return parsed.data;
  const faults = parsed.error.issues.slice(0, 20).map((issue) => ({
    code,
    message: `${issue.path.map(String).join('.') || 'the whole'}: ${issue.message}`,
  }));
  throw new ProblemError(400, code, faults[0]!.message, {
    faults,
    hint: `${API_ROOT}/openapi.json describes every request`,
  });
}
