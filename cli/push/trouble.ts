import type { Problem } from '#core/api/problem.ts';
import type { Fault } from '#core/errors.ts';
import type { Settings } from './settings.ts';

/** Why a request did not do what it should, after all retries. */
export class Trouble extends Error {
  readonly fault: Fault;
  /** The server looked at this body and will never take it: another one may fare better. */
  readonly ofThisBody: boolean;

  constructor(fault: Fault, ofThisBody = false) {
    super(fault.message);
    this.fault = fault;
    this.ofThisBody = ofThisBody;
  }
}

/** An answer that is no success, and its problem details where the server itself gave it. */
export interface BadAnswer {
  readonly status: number;
  readonly problem: Problem | null;
  readonly location: string | null;
  readonly retryAfter: number | null;
}

const AGAIN = new Set([408, 425, 429, 500, 502, 503, 504, 507]);

export const isWorthRetrying = (status: number): boolean => AGAIN.has(status);

/** Statuses by which the server says that a body is wrong; only with its own problem details, not a proxy's page. */
const OF_THE_BODY = new Set([400, 409, 413, 422]);

export function troubleOfAnswer(answer: BadAnswer, settings: Settings, attempts: number): Trouble {
  const { status, problem, location } = answer;
  const { server, project, tokenFrom } = settings;
  const said = problem ? ` (${problem.code}: ${problem.detail})` : '';
  const fault = (code: string, message: string, hint: string) =>
    new Trouble({ code, message, hint: problem?.hint ?? hint });
  if (isWorthRetrying(status))
    return fault(
      status === 429 ? 'PUSH_THROTTLED' : 'PUSH_SERVER_FAILED',
      `expected ${server} to take the records, found status ${status} ${times(attempts)}${said}`,
      answer.retryAfter
        ? `it asks to wait ${Math.ceil(answer.retryAfter / 1000)} s`
        : 'try again later; if it lasts, tell whoever runs the server',
    );
  if (status === 401)
    return fault(
      'PUSH_TOKEN',
      `expected a valid token, found that ${server} does not accept the one of ${tokenFrom}${said}`,
      'it may have expired or been revoked: make another in the dashboard',
    );
  if (status === 403)
    return fault(
      'PUSH_FORBIDDEN',
      `expected the right to push to project ${project}, found that the token of ${tokenFrom} does not give it${said}`,
      `it takes a token of ${project} with scope push, of an engineer or above`,
    );
  if (status === 404)
    return fault(
      'PUSH_PROJECT',
      `expected a project ${project} on ${server}, found none that the token of ${tokenFrom} may see${said}`,
      'check the short name of the project (STEELYARD_PROJECT or --project) and the address of the server',
    );
  if (problem && OF_THE_BODY.has(status)) return new Trouble(faultOfProblem(problem), true);
  return fault(
    'PUSH_ANSWER',
    `expected an answer of a Steelyard server from ${server}, found status ${status}${location ? `, which leads to ${location}` : ''}${said}`,
    location
      ? 'give that address as the server, if it is one'
      : 'check the address; a proxy on the way may have answered',
  );
}

/** The first fault of the input where there is one, for it points; else the problem. */
export function faultOfProblem({ code, detail, hint, faults }: Problem): Fault {
  const [first] = faults ?? [];
  if (!first) return { code, message: detail, ...(hint && { hint }) };
  return { ...first, message: `${detail}: ${first.message}`, ...(hint && !first.hint && { hint }) };
}

/** What `fetch` throws, told by the code of its cause. */
export function troubleOfConnection(error: unknown, server: string, attempts: number): Trouble {
  const code = connectionCode(error);
  if (isOfCertificate(code))
    return new Trouble({
      code: 'PUSH_CERTIFICATE',
      message: `expected a certificate that this machine trusts from ${server}, found ${code}`,
      hint: 'for an authority of your own set NODE_EXTRA_CA_CERTS to its certificate',
    });
  return new Trouble({
    code: 'PUSH_UNREACHABLE',
    message: `expected an answer from ${server}, found that ${WHY[code] ?? code} ${times(attempts)}`,
    hint: 'check the network and the address of the server',
  });
}

export const connectionCode = (error: unknown): string => {
  const { name, message, cause } = error as Error & { cause?: { code?: unknown; message?: unknown } };
  if (name === 'TimeoutError') return name;
  if (typeof cause?.code === 'string') return cause.code;
  return `the connection broke (${typeof cause?.message === 'string' ? cause.message : message})`;
};

/** Trying again does not mend a certificate, nor a server that speaks no TLS. */
export const isOfCertificate = (code: string): boolean =>
  /CERT|SELF_SIGNED|ERR_TLS|ERR_SSL|VERIFY/.test(code);

const WHY: Readonly<Record<string, string>> = {
  TimeoutError: 'none came in time',
  ECONNREFUSED: 'the connection was refused',
  ECONNRESET: 'the connection was cut',
  UND_ERR_SOCKET: 'the connection was cut',
  EPIPE: 'the connection was cut',
  UND_ERR_CONNECT_TIMEOUT: 'nobody took the connection',
  ENOTFOUND: 'there is no machine of that name',
  EAI_AGAIN: 'names cannot be looked up now',
  EHOSTUNREACH: 'no way leads to that machine',
  ENETUNREACH: 'there is no network',
};

const times = (attempts: number): string =>
  attempts === 1 ? 'at the one attempt' : `at all ${attempts} attempts`;
