import { execFile, spawn } from 'node:child_process';
import { promisify } from 'node:util';
import { findPrograms, PostgresError } from './programs.ts';

/**
 * Runs one of PostgreSQL's own programs against a database; the password goes by the environment, where no list of
 * processes shows it.
 *
 * @throws PostgresError with what the program says
 */
export function runTool(name: 'pg_dump' | 'psql', url: string, args: readonly string[]): Promise<void> {
  const folder = findPrograms();
  const target = new URL(url);
  const env = { ...process.env, PGPASSWORD: decodeURIComponent(target.password) };
  target.password = '';
  return new Promise((resolve, reject) => {
    const child = spawn(folder ? `${folder}/${name}` : name, [...args, `--dbname=${target}`], {
      env,
      stdio: ['ignore', 'ignore', 'pipe'],
    });
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

/**
 * Writes a backup out as SQL; a file that is no backup, or is cut short, fails here, before anything is touched.
 *
 * @throws PostgresError with what the program says
 */
export async function unpackBackup(file: string, sql: string): Promise<void> {
  const folder = findPrograms();
  const program = folder ? `${folder}/pg_restore` : 'pg_restore';
  await promisify(execFile)(program, ['--no-owner', '--exit-on-error', `--file=${sql}`, file]).catch(
    (error: { stderr?: string; message: string }) => {
      throw new PostgresError(`pg_restore cannot read ${file}: ${(error.stderr || error.message).trim()}`);
    },
  );
}
