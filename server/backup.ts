import { renameSync, rmSync, statSync } from 'node:fs';
import { localDatabase } from './local.ts';
import { runTool } from './postgres/tools.ts';

// npm run backup [-- FILE]: everything that the server keeps, in one file; while the server runs.
const day = new Date().toISOString().slice(0, 19).replace(/[:T]/g, '-');
const file = process.argv[2] ?? `steelyard-${day}.backup`;
const cluster = await localDatabase((line) => process.stderr.write(`steelyard: ${line}\n`));
try {
  await runTool('pg_dump', cluster.url, ['--format=custom', '--no-owner', `--file=${file}.part`]);
  renameSync(`${file}.part`, file);
  process.stdout.write(`${file}: ${(statSync(file).size / 2 ** 20).toFixed(1)} MiB\n`);
} catch (error) {
  rmSync(`${file}.part`, { force: true });
  process.stderr.write(`steelyard: ${(error as Error).message}\n`);
  process.exitCode = 1;
} finally {
  await cluster.stop();
}
