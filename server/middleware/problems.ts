import type { ErrorRequestHandler, RequestHandler } from 'express';
import multer from 'multer';
import { ForeignKeyConstraintError, UniqueConstraintError } from 'sequelize';
import type { Problem } from '#core/api/problem.ts';
import { InputError } from '#core/errors.ts';
import { conflict, notFound, ProblemError } from '../problem.ts';
import { isDatabaseAway, stateOf } from '../services/database-away.ts';

const TITLES: Record<number, string> = {
  400: 'The request is not right',
  401: 'Not signed in',
  403: 'Not allowed',
  404: 'Not found',
  409: 'It is otherwise by now',
  413: 'Too large',
  415: 'Of another kind',
  422: 'The input is wrong',
  429: 'Too many, too soon',
  500: 'A bug',
  503: 'Not now',
};

export const nothingHere: RequestHandler = (request) => {
  throw notFound(`something at ${request.path}`);
};

/** Everything thrown becomes problem details; what was not meant to be thrown is logged, and tells nothing. */
export const problems: ErrorRequestHandler = (error, request, response, next) => {
  if (response.headersSent) return next(error);
  const problem = problemOf(error);
  if (problem.status >= 500) request.log.error({ err: error }, 'request failed');
  if (problem.retryAfter) response.set('Retry-After', String(problem.retryAfter));
  const body: Problem = {
    type: 'about:blank',
    title: TITLES[problem.status] ?? 'Not done',
    status: problem.status,
    code: problem.code,
    detail: problem.message,
    ...(problem.hint && { hint: problem.hint }),
    ...(problem.faults && { faults: [...problem.faults] }),
    requestId: String(request.id),
  };
  response.status(problem.status).type('application/problem+json').send(JSON.stringify(body));
};

function problemOf(error: unknown): ProblemError {
  if (error instanceof ProblemError) return error;
  if (error instanceof InputError)
    return new ProblemError(422, error.faults[0]!.code, error.message, { faults: error.faults });
  if (error instanceof UniqueConstraintError || error instanceof ForeignKeyConstraintError)
    return conflict(
      'CHANGED_MEANWHILE',
      'expected it as you saw it, found that someone was faster',
      'load again',
    );
  if (error instanceof multer.MulterError) return uploadProblem(error);
  const { status, type } = error as { status?: number; type?: string };
  if (type === 'entity.too.large')
    return new ProblemError(413, 'BODY_TOO_LARGE', 'expected a smaller body', { hint: 'send less at once' });
  if (status === 415) return new ProblemError(415, 'BODY_ENCODING', 'expected gzip or no encoding');
  if (status !== undefined && status >= 400 && status < 500)
    return new ProblemError(
      400,
      'BODY_NOT_READ',
      'expected a body as its headers say, found one that cannot be read',
      {
        hint: 'send JSON, whole, as UTF-8',
      },
    );
  if (isDatabaseAway(error))
    return new ProblemError(503, 'DATABASE_AWAY', 'expected the database to answer, found that it does not', {
      hint: 'nothing was done; try again in a moment',
      retryAfter: 2,
    });
  if (stateOf(error).startsWith('53'))
    return new ProblemError(503, 'DATABASE_FULL', 'expected room in the database, found none left', {
      hint: 'nothing was done; the administrator makes room, and what waits is sent again',
      retryAfter: 30,
    });
  if (/^40P01$|^40001$/.test(stateOf(error)))
    return new ProblemError(
      503,
      'DATABASE_BUSY',
      'expected a turn at the database, found others in the way',
      {
        hint: 'nothing was done; try again in a moment',
        retryAfter: 1,
      },
    );
  return new ProblemError(500, 'BUG', 'the server has a fault; the request id stands in its log', {
    hint: 'report it with the request id',
  });
}

function uploadProblem(error: multer.MulterError): ProblemError {
  const large = error.code === 'LIMIT_FILE_SIZE' || error.code === 'LIMIT_FILE_COUNT';
  return new ProblemError(
    large ? 413 : 400,
    'UPLOAD_LIMIT',
    `expected files within the limits, found: ${error.message}`,
    {
      hint: 'at most 200 files, 64 MB each; push larger ones with the command',
    },
  );
}
