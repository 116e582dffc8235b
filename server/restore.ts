import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { migrate, openDatabase } from './database.ts';
import { localDatabase } from './local.ts';
import { runTool, unpackBackup } from './postgres/tools.ts';

// npm run restore -- FILE [--replace]: puts a backup back; into an empty database, or in place of what is there.
const [file, ...options] = process.argv.slice(2);
if (!file || !existsSync(file)) {
  process.stderr.write('usage: npm run restore -- FILE [--replace]\n');
  process.exit(2);
}
const cluster = await localDatabase((line) => process.stderr.write(`steelyard: ${line}\n`));
const sequelize = openDatabase(cluster.url, 2);
try {
  const [rows] = await sequelize.query("SELECT to_regclass('public.people') AS people");
  const isEmpty = (rows[0] as { people: string | null }).people === null;
  if (!isEmpty && !options.includes('--replace')) {
    process.stderr.write(
      'steelyard: expected an empty database, found one in use. Stop the server, make a backup of it, and add --replace to put the file in its place.\n',
    );
    process.exitCode = 1;
  } else {
    const folder = mkdtempSync(join(tmpdir(), 'steelyard-restore-'));
    try {
      const sql = join(folder, 'backup.sql');
      await unpackBackup(file, sql);
      // One transaction: all of the backup, or the database as it was.
      await runTool('psql', cluster.url, [
        '--no-psqlrc',
        '--quiet',
        '--set=ON_ERROR_STOP=1',
        '--single-transaction',
        '--command=DROP SCHEMA IF EXISTS pgboss CASCADE',
        '--command=DROP SCHEMA IF EXISTS public CASCADE',
        '--command=CREATE SCHEMA public',
        `--file=${sql}`,
      ]);
    } finally {
      rmSync(folder, { recursive: true, force: true });
    }
    const steps = await migrate(sequelize, cluster.url);
    process.stdout.write(
      `${file} is back${steps.length > 0 ? `, brought up by ${steps.length} steps` : ''}.\n`,
    );
  }
} catch (error) {
  process.stderr.write(`steelyard: ${(error as Error).message}\n`);
  process.exitCode = 1;
} finally {
  await sequelize.close();
  await cluster.stop();
}
