import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync } from 'node:fs';
import { join } from 'node:path';

const FOLDER = '/usr/lib/postgresql';

/** PostgreSQL cannot be found or installed; the message is the command that mends it. */
export class PostgresError extends Error {}

/** The folder of PostgreSQL's programs: of a certain major version, or the newest; null where there is none. */
export function findPrograms(version?: string): string | null {
  if (!existsSync(FOLDER)) return null;
  const found = readdirSync(FOLDER)
    .filter(
      (v) => (version ? v === version : /^\d+$/.test(v)) && existsSync(join(FOLDER, v, 'bin', 'initdb')),
    )
    .sort((a, b) => Number(b) - Number(a))[0];
  return found ? join(FOLDER, found, 'bin') : null;
}

export const isRoot = (): boolean => process.getuid?.() === 0;

/**
 * Installs Debian packages, as root or through sudo without a password.
 *
 * @throws PostgresError with the command to give by hand
 */
export function installPackages(packages: readonly string[], tell: (line: string) => void): void {
  const hand = `sudo apt-get install -y ${packages.join(' ')}`;
  const sudo = isRoot() ? [] : ['sudo', '-n'];
  if (sudo.length > 0 && spawnSync('sudo', ['-n', 'true'], { stdio: 'ignore' }).status !== 0)
    throw new PostgresError(
      `${packages.join(' and ')} is not installed, and this account may not install it. Give the command\n  ${hand}\nor set DATABASE_URL to a PostgreSQL that you already have, then start again.`,
    );
  tell(`installing ${packages.join(' and ')} from Debian's packages`);
  const apt = (...args: string[]) => {
    const [command, ...rest] = [...sudo, 'env', 'DEBIAN_FRONTEND=noninteractive', 'apt-get', ...args];
    return spawnSync(command!, rest, { stdio: ['ignore', 'ignore', 'pipe'], encoding: 'utf8' });
  };
  const install = ['install', '-y', '--no-install-recommends', ...packages];
  if (apt(...install).status === 0) return;
  // An image often comes without package lists.
  apt('update', '-q');
  const again = apt(...install);
  if (again.status !== 0)
    throw new PostgresError(
      `apt-get could not install ${packages.join(' and ')}:\n${(again.stderr ?? '').trim().split('\n').slice(-3).join('\n')}\nGive the command\n  ${hand}\nand start again.`,
    );
}

/** PostgreSQL's programs, installed where missing. */
export function providePrograms(version: string | undefined, tell: (line: string) => void): string {
  const found = findPrograms(version);
  if (found) return found;
  if (version)
    throw new PostgresError(
      `the data folder was made by PostgreSQL ${version}, which is not installed: sudo apt-get install postgresql-${version}, or dump it there and restore it here (README.md, Backup and restore)`,
    );
  installPackages(['postgresql'], tell);
  const installed = findPrograms();
  if (!installed)
    throw new PostgresError(`expected ${FOLDER}/*/bin/initdb after the installation, found none`);
  return installed;
}
