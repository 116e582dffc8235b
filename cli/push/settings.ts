import { slugSchema } from '#core/api/projects.ts';
import { InputError } from '#core/errors.ts';
import { serverAddress } from './server-address.ts';
import { readSignedIn, type SignedIn, signedInPath } from './signed-in-file.ts';

/** What a call may say about where to push; the token is not among it, for a command line is seen by others. */
export interface PushOptions {
  server?: string;
  project?: string;
  insecure?: boolean;
  retries: number;
}

/** Where to push, and by which right. */
export interface Settings {
  /** Without a slash at its end. */
  readonly server: string;
  readonly project: string;
  readonly token: string;
  /** The variable or the file that the token came from, for messages; never the token. */
  readonly tokenFrom: string;
  readonly retries: number;
}

/**
 * Server, project and token: options go before the environment, and that before the signed-in file.
 *
 * @throws InputError CALL_SERVER, CALL_PROJECT, CALL_TOKEN, FILE_SIGN_IN_DAMAGED, FILE_OPEN_TO_OTHERS
 */
export function readSettings(options: PushOptions, env: NodeJS.ProcessEnv): Settings {
  const needsFile =
    !env.STEELYARD_TOKEN ||
    !(options.server || env.STEELYARD_SERVER) ||
    !(options.project || env.STEELYARD_PROJECT);
  const signedIn = needsFile ? readSignedIn(env) : null;
  const { server, project } = readDestination(options, env, signedIn);
  return { server, project, ...readToken(server, env, signedIn), retries: options.retries };
}

/** @throws InputError CALL_SERVER, CALL_PROJECT */
export function readDestination(
  options: PushOptions,
  env: NodeJS.ProcessEnv,
  signedIn: SignedIn | null,
): { server: string; project: string } {
  const server = options.server || env.STEELYARD_SERVER || signedIn?.server;
  if (!server)
    throw callFault(
      'CALL_SERVER',
      'expected the address of the team server, found none',
      'set STEELYARD_SERVER, give --server, or sign in with `steelyard sign-in --server URL --project NAME`',
    );
  const project = options.project || env.STEELYARD_PROJECT || signedIn?.project;
  if (!project || !slugSchema.safeParse(project).success)
    throw callFault(
      'CALL_PROJECT',
      `expected the short name of a project, found ${project ? `'${project}'` : 'none'}`,
      `${project ? 'small letters, digits and hyphens, as in the address of its page' : 'set STEELYARD_PROJECT or give --project'}`,
    );
  return { server: serverAddress(server, options.insecure === true), project };
}

/** The token of the file goes to the file's own server alone. */
function readToken(
  server: string,
  env: NodeJS.ProcessEnv,
  signedIn: SignedIn | null,
): { token: string; tokenFrom: string } {
  const given = env.STEELYARD_TOKEN?.trim();
  if (given) return { token: checkToken(given, 'STEELYARD_TOKEN'), tokenFrom: 'STEELYARD_TOKEN' };
  const path = signedInPath(env);
  if (signedIn?.server === server) return { token: checkToken(signedIn.token, path), tokenFrom: path };
  throw callFault(
    'CALL_TOKEN',
    signedIn
      ? `expected a token for ${server}, found one for ${signedIn.server} in ${path}`
      : 'expected a token, found none',
    'set STEELYARD_TOKEN (in CI, from its store of secrets), or sign in with `steelyard sign-in`',
  );
}

/** @throws InputError CALL_TOKEN where it could not stand in a header; the message does not show it */
export function checkToken(token: string, from: string): string {
  if (/^[\x21-\x7e]{8,4096}$/.test(token)) return token;
  throw callFault(
    'CALL_TOKEN',
    `expected a token in ${from}, found ${token === '' ? 'nothing' : 'something else'}`,
    'a token is one line of letters, digits and signs, shown once when it is made in the dashboard',
  );
}

export const callFault = (code: string, message: string, hint: string): InputError =>
  new InputError([{ code, message, hint }]);
