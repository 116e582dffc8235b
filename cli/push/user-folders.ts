import { mkdirSync } from 'node:fs';
import { homedir } from 'node:os';
import { dirname, isAbsolute, join } from 'node:path';

/** A folder of the XDG base directory specification: the variable where it is absolute, else its default at home. */
function userFolder(env: NodeJS.ProcessEnv, variable: string, ...usual: string[]): string {
  const given = env[variable];
  return given && isAbsolute(given) ? given : join(env.HOME || homedir(), ...usual);
}

export const configFolder = (env: NodeJS.ProcessEnv): string =>
  join(userFolder(env, 'XDG_CONFIG_HOME', '.config'), 'steelyard');

/** Where records wait that could not be sent; STEELYARD_TRAY names another folder. */
export const trayFolder = (env: NodeJS.ProcessEnv): string =>
  env.STEELYARD_TRAY || join(userFolder(env, 'XDG_STATE_HOME', '.local', 'state'), 'steelyard', 'tray');

/**
 * A folder that its owner alone may enter, with the folders above it. Node's own way of making several goes round in
 * circles on a file system that will not have them and says that the one above is missing (automounters do).
 */
export function makePrivateFolder(path: string): void {
  try {
    mkdirSync(path, { mode: 0o700 });
  } catch (error) {
    const { code } = error as NodeJS.ErrnoException;
    if (code === 'EEXIST') return;
    if (code !== 'ENOENT' || dirname(path) === path) throw error;
    makePrivateFolder(dirname(path));
    mkdirSync(path, { mode: 0o700 });
  }
}
