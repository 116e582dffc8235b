import { homedir } from 'node:os';
import { isAbsolute, join } from 'node:path';

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
