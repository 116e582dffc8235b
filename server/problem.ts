import type { Fault } from '#core/errors.ts';

/** What a request cannot have: becomes problem details. */
export class ProblemError extends Error {
  readonly status: number;
  readonly code: string;
  readonly hint: string | undefined;
  readonly faults: readonly Fault[] | undefined;
  /** Seconds, where waiting helps. */
  readonly retryAfter: number | undefined;

  constructor(
    status: number,
    code: string,
    detail: string,
    more: { hint?: string; faults?: readonly Fault[]; retryAfter?: number } = {},
  ) {
    super(detail);
    this.status = status;
    this.code = code;
    this.hint = more.hint;
    this.faults = more.faults;
    this.retryAfter = more.retryAfter;
  }
}

export const notSignedIn = (): ProblemError =>
  new ProblemError(401, 'NOT_SIGNED_IN', 'expected a signed-in person or a token, found neither', {
    hint: 'sign in, or send Authorization: Bearer with a token of the project',
  });

export const notAllowed = (needs: string): ProblemError =>
  new ProblemError(403, 'NOT_ALLOWED', `expected ${needs}, found that you are not`, {
    hint: 'an administrator gives roles on the page People',
  });

export const notFound = (what: string): ProblemError =>
  new ProblemError(404, 'NOT_FOUND', `expected ${what}, found none that you can see`, {
    hint: 'check the address; what is in a project is seen by its people alone',
  });

export const conflict = (code: string, detail: string, hint: string): ProblemError =>
  new ProblemError(409, code, detail, { hint });

export const badRequest = (code: string, detail: string, hint: string): ProblemError =>
  new ProblemError(400, code, detail, { hint });
