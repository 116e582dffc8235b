import type { Problem } from '#core/api/problem.ts';

export type Fault = NonNullable<Problem['faults']>[number];

/** A request that failed: the server's problem details, or `SERVER_AWAY` (status 0) where it did not answer. */
export class ApiProblem extends Error {
  readonly status: number;
  readonly code: string;
  readonly title: string;
  /** What was found and what was expected. */
  readonly detail: string;
  readonly hint: string | undefined;
  readonly faults: readonly Fault[];
  readonly requestId: string | undefined;

  constructor(problem: Omit<Problem, 'type' | 'requestId'> & { requestId?: string }) {
    super(problem.detail);
    this.name = 'ApiProblem';
    this.status = problem.status;
    this.code = problem.code;
    this.title = problem.title;
    this.detail = problem.detail;
    this.hint = problem.hint;
    this.faults = problem.faults ?? [];
    this.requestId = problem.requestId;
  }
}

/** What is said where no server answers, or something else answers in its place. */
export function serverAway(): ApiProblem {
  return new ApiProblem({
    status: 0,
    code: 'SERVER_AWAY',
    title: 'The server does not answer',
    detail: 'The server could not be reached. Nothing that you entered is lost.',
    hint: 'See whether you are connected, then try again.',
  });
}

/** Any failure as a problem; one that is none of ours is a fault of the page. */
export function asProblem(error: unknown): ApiProblem {
  if (error instanceof ApiProblem) return error;
  return new ApiProblem({
    status: 0,
    code: 'PAGE_FAULT',
    title: 'This page failed',
    detail: error instanceof Error ? error.message : String(error),
    hint: 'Load the page again. If it fails again, tell your administrator what you did.',
  });
}
