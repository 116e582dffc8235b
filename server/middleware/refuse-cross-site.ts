import type { RequestHandler } from 'express';
import { ProblemError } from '../problem.ts';

const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Refuses requests that change something and come from another site's page: a browser says where from, in headers that
 * no page can forge. A token is not sent by itself, so its requests need none.
 */
export const refuseCrossSite =
  (publicUrl: string): RequestHandler =>
  (request, _, next) => {
    if (SAFE.has(request.method) || request.get('authorization')) return next();
    // A mail program's one click: the link itself is the right to do it, and stopping mail is all that it can do.
    if (request.path.startsWith('/mail-stops/')) return next();
    const origin = request.get('origin');
    const own = new Set([new URL(publicUrl).origin, `${request.protocol}://${request.get('host')}`]);
    if (origin !== undefined && own.has(origin)) return next();
    throw new ProblemError(
      403,
      'CROSS_SITE',
      `expected a request from this server's own pages, found ${origin ?? 'no Origin'}`,
      {
        hint: 'PUBLIC_URL must be the address that people use; programs send a token',
      },
    );
  };
