import { chmodSync, closeSync, existsSync, fstatSync, openSync, readFileSync, rmSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { InputError } from '#core/errors.ts';
import { whyNotWritten, writeWhole } from '../io.ts';
import { configFolder, makePrivateFolder } from './user-folders.ts';

/** What `steelyard sign-in` keeps. */
export interface SignedIn {
  readonly server: string;
  readonly project: string;
  readonly token: string;
}

export const signedInPath = (env: NodeJS.ProcessEnv): string => join(configFolder(env), 'server.json');

/**
 * The signed-in file; null where nobody has signed in.
 *
 * @throws InputError FILE_OPEN_TO_OTHERS where others may read it, FILE_SIGN_IN_DAMAGED
 */
export function readSignedIn(env: NodeJS.ProcessEnv): SignedIn | null {
  const path = signedInPath(env);
  let handle: number | undefined;
  try {
    handle = openSync(path, 'r');
    refuseIfOpen(fstatSync(handle).mode, path);
    return parse(readFileSync(handle, 'utf8'), path);
  } catch (error) {
    const { code } = error as NodeJS.ErrnoException;
    if (code === 'ENOENT' || code === 'ENOTDIR') return null;
    if (error instanceof InputError) throw error;
    throw damaged(path, whyNotWritten(error));
  } finally {
    if (handle !== undefined) closeSync(handle);
  }
}

/** Owner-only, in a folder that is owner-only too. @throws InputError FILE_NOT_WRITTEN */
export function writeSignedIn(signedIn: SignedIn, env: NodeJS.ProcessEnv): string {
  const path = signedInPath(env);
  const folder = dirname(path);
  try {
    makePrivateFolder(folder);
    chmodSync(folder, 0o700);
  } catch (error) {
    const message = `expected to write ${path}, found that ${whyNotWritten(error)}`;
    throw new InputError([{ code: 'FILE_NOT_WRITTEN', message, hint: 'mend that, or set XDG_CONFIG_HOME' }]);
  }
  writeWhole(path, `${JSON.stringify(signedIn, null, 2)}\n`, 0o600);
  return path;
}

/** Whether there was a file. */
export function forgetSignedIn(env: NodeJS.ProcessEnv): boolean {
  const path = signedInPath(env);
  const was = existsSync(path);
  rmSync(path, { force: true });
  return was;
}

function refuseIfOpen(mode: number, path: string): void {
  if (process.platform === 'win32' || (mode & 0o077) === 0) return;
  throw new InputError([
    {
      code: 'FILE_OPEN_TO_OTHERS',
      message: `expected a file that only its owner may read, found ${path} with permissions ${(mode & 0o777).toString(8)}`,
      hint: `others may have read the token: revoke it in the dashboard, then \`steelyard sign-in --forget\` and sign in again; or \`chmod 600 ${path}\``,
    },
  ]);
}

function parse(text: string, path: string): SignedIn {
  try {
    const { server, project, token } = JSON.parse(text) as Record<string, unknown>;
    if (typeof server === 'string' && typeof project === 'string' && typeof token === 'string')
      return { server, project, token };
  } catch {
    // Not JSON: said below, without the text, for the token may stand in it.
  }
  throw damaged(path, 'it is not what sign-in writes');
}

const damaged = (path: string, why: string): InputError =>
  new InputError([
    {
      code: 'FILE_SIGN_IN_DAMAGED',
      message: `expected server, project and token in ${path}, found that ${why}`,
      hint: 'sign in again with `steelyard sign-in`, or remove it with `steelyard sign-in --forget`',
    },
  ]);
