import { spawn } from 'node:child_process';
import { findPrograms, PostgresError } from './programs.ts';

/**
 * Runs one of PostgreSQL's own programs against a database; the password goes by the environment, where no list of
 * processes shows it.
 *
 * @throws PostgresError with what the program says
 */
export function runTool(name: 'pg_dump' | 'pg_restore', url: string, args: readonly string[]): Promise<void> {
  const folder = findPrograms();
  const { username, password, hostname, port, pathname } = new URL(url);
  const env = {
    ...process.env,
    PGUSER: decodeURIComponent(username),
    PGPASSWORD: decodeURIComponent(password),
    PGHOST: hostname,
    PGPORT: port || '5432',
    PGDATABASE: pathname.slice(1),
  };
  return new Promise((resolve, reject) => {
    const child = spawn(
      folder ? `${folder}/${name}` : name,
      [...args, ...(name === 'pg_restore' ? ['-d', env.PGDATABASE] : [])],
      {
        env,
        stdio: ['ignore', 'ignore', 'pipe'],
      },
    );
    let said = '';
    child.stderr.on('data', (data: Buffer) => {
      said += data;
    });
    child.once('error', () =>
      reject(new PostgresError(`${name} is not here: sudo apt-get install postgresql-client`)),
    );
    child.once('close', (status) =>
      status === 0
        ? resolve()
        : reject(new PostgresError(`${name} failed:\n${said.trim().split('\n').slice(-5).join('\n')}`)),
    );
  });
}
