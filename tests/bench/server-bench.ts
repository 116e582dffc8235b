// npm run bench:server: the history of a million runs, pushes in parallel, and the size of the first load. Ratios of one
// run, each beside its yardstick; never a verdict, for clocks differ between machines.
import { type ChildProcess, spawn } from 'node:child_process';
import { mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import Table from 'cli-table3';
import pg from 'pg';
import { addressOf } from '#core/api/routes.ts';
import { migrate, openDatabase } from '#server/database.ts';
import { freePort, startCluster } from '#server/postgres/cluster.ts';
import { hashSecret, newSecret } from '#server/services/secrets.ts';
import { machineText } from '../helpers/machine-text.ts';
import { pushBody, recordsOfText } from '../helpers/pushed-records.ts';

const root = join(import.meta.dirname, '..', '..');
const RUNS = Number(process.env.BENCH_HISTORY ?? 1_000_000);
const READERS = 50;
const JOBS = 200;
const say = (line: string) => process.stderr.write(`${line}\n`);
const token = newSecret();
const headers = { authorization: `Bearer ${token}` };
const quantile = (times: readonly number[], q: number): number =>
  [...times].sort((a, b) => a - b)[Math.min(times.length - 1, Math.floor(q * times.length))]!;
const table = new Table({ head: ['what', 'measured', 'target'] });

const folder = mkdtempSync(join(tmpdir(), 'steelyard-bench-'));
const cluster = await startCluster({ folder, durable: true, tell: say });
const children: ChildProcess[] = [];
try {
  const sequelize = openDatabase(cluster.url, 4);
  await migrate(sequelize, cluster.url);
  await sequelize.close();
  const db = new pg.Pool({ connectionString: cluster.url, max: 2 });
  await fill(db);
  const [port, beside] = [await freePort(), await freePort()];
  await start('tests/bench/yardsticks.ts', beside);
  await start('dist/server/main.js', port);
  await history(`http://127.0.0.1:${port}`, `http://127.0.0.1:${beside}`);
  await pushes(`http://127.0.0.1:${port}`, `http://127.0.0.1:${beside}`, db);
  await db.end();
  firstLoad();
  process.stdout.write(`${table}\n`);
} finally {
  for (const child of children) child.kill('SIGTERM');
  await cluster.stop();
  rmSync(folder, { recursive: true, force: true });
}

async function fill(db: pg.Pool): Promise<void> {
  say(`writing a history of ${RUNS} runs`);
  await db.query(`
    INSERT INTO people (email, name) VALUES ('ci@example.org', 'Ci');
    INSERT INTO projects (slug, name) VALUES ('rover', 'Rover'), ('pushed', 'Pushed');`);
  for (const project of ['rover', 'pushed'])
    await db.query(
      `INSERT INTO tokens (project_id, person_id, kind, label, scope, secret_hash, expires_at)
       SELECT p.id, q.id, 'machine', 'CI', 'push', $1, now() + interval '1 day' FROM projects p, people q WHERE p.slug = $2`,
      [hashSecret(project === 'rover' ? token : `${token}2`), project],
    );
  await db.query(
    `INSERT INTO records (project_id, stamp, content_sha256, content, recomputation)
     SELECT 1, encode(sha256(i::text::bytea), 'hex'), '', '\\x', 'recomputed' FROM generate_series(1, 1000) i`,
  );
  // Six assemblies, three states, a main branch and many small ones, one verdict in ten outside.
  await db.query(
    `INSERT INTO runs (project_id, record_id, origin, assembly, state, branch, verdict, at, commit, person_id, token_id,
       judged_on, mass, figures, nearest, outside, file_units, provenance)
     SELECT 1, 1 + i % 1000, 'commit:' || i, 'assembly ' || i % 6, 'state ' || (i / 6) % 3,
       CASE WHEN i % 10 < 7 THEN 'main' ELSE 'branch ' || i % 997 END,
       CASE WHEN i % 10 = 3 THEN 'outside' ELSE 'within' END,
       now() - make_interval(secs => ($1 - i) * 30.0), md5(i::text), 1, 1, 'predicted', 2 + (i % 1000) / 1000.0,
       ARRAY[2, 0.1, 0.2, 0.3, 1, 2, 3, 1, 2, 3], '{x,y,z}', '{}',
       '{"length":"mm","mass":"kg","inertia":"kg*m^2"}', '{"tool":"bench","at":"2026-01-01T00:00:00Z"}'
     FROM generate_series(1, $1::int) i`,
    [RUNS],
  );
  await db.query('VACUUM ANALYZE runs');
}

/** A process with its own environment; from source where it is TypeScript. */
async function start(file: string, port: number): Promise<void> {
  const args = file.endsWith('.ts') ? ['--import', 'tsx', file] : [file];
  const child = spawn(process.execPath, args, {
    cwd: root,
    stdio: ['ignore', 'inherit', 'inherit'],
    env: {
      PATH: process.env.PATH,
      DATABASE_URL: cluster.url,
      SECRET: 'a secret of the bench, long enough to sign with',
      PUBLIC_URL: `http://127.0.0.1:${port}`,
      PORT: String(port),
      MAIL_FOLDER: join(folder, 'mail'),
      LOG_LEVEL: 'error',
      RATE_PER_MINUTE: '10000000',
    },
  });
  children.push(child);
  for (;;) {
    const answers = await fetch(`http://127.0.0.1:${port}/`).then(
      () => true,
      () => false,
    );
    if (answers) return;
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
}

/** How long each of some requests took, by so many readers at once [ms]. */
async function load(addresses: readonly string[], total: number): Promise<number[]> {
  const times: number[] = [];
  let next = 0;
  await Promise.all(
    Array.from({ length: READERS }, async () => {
      while (next < total) {
        const address = addresses[next++ % addresses.length]!;
        const start = performance.now();
        const response = await fetch(address, { headers });
        await response.arrayBuffer();
        if (response.status !== 200) throw new Error(`${address} answered ${response.status}`);
        times.push(performance.now() - start);
      }
    }),
  );
  return times;
}

async function history(base: string, beside: string): Promise<void> {
  const list = (query: Record<string, string>) => base + addressOf('listRuns', { project: 'rover' }, query);
  const all = { assembly: 'assembly 2', state: 'state 1', branch: 'main', verdict: 'outside' };
  const keys = Object.keys(all) as (keyof typeof all)[];
  const sets = Array.from({ length: 16 }, (_, bits) => keys.filter((__, i) => (bits >> i) & 1));
  const queryOf = (set: readonly (keyof typeof all)[]) => Object.fromEntries(set.map((k) => [k, all[k]]));
  // A far page: the cursor that stands four fifths down the history.
  const far = async (query: Record<string, string>) => {
    const when = new Date(Date.now() - RUNS * 0.8 * 30_000).toISOString();
    return { ...query, cursor: Buffer.from(JSON.stringify(['newest', when, '1'])).toString('base64url') };
  };
  const few = sets.filter((s) => s.length <= 2);
  const many = sets.filter((s) => s.length > 2);
  const pages = async (some: typeof sets) => ({
    first: some.map((s) => list(queryOf(s))),
    far: await Promise.all(some.map(async (s) => list(await far(queryOf(s))))),
  });
  const [simple, combined] = [await pages(few), await pages(many)];
  const one = Array.from({ length: 50 }, (_, i) => `${beside}/one/rover/${1 + Math.floor((RUNS / 50) * i)}`);
  const groups: [string, string[], number][] = [
    ['none, one or two filters, first pages', simple.first, 5],
    ['none, one or two filters, far pages', simple.far, 5],
    ['three or four filters, first pages', combined.first, 20],
    ['three or four filters, far pages', combined.far, 20],
  ];
  await load(one, 500);
  for (const [what, addresses, target] of groups) {
    await load(addresses, 200);
    const ratios: number[] = [];
    // In turn, so that a machine that drifts moves both.
    for (let round = 0; round < 3; round++) {
      const yardstick = quantile(await load(one, 1500), 0.99);
      ratios.push(quantile(await load(addresses, 1500), 0.99) / yardstick);
    }
    const ratio = quantile(ratios, 0.5);
    table.push([
      `p99 of the history, ${RUNS} runs, ${READERS} readers: ${what}, beside one row by key`,
      `${ratio.toFixed(2)} ×`,
      `≤ ${target} ×`,
    ]);
  }
}

async function pushes(base: string, beside: string, db: pg.Pool): Promise<void> {
  say(`${JOBS} jobs pushing at once`);
  const jobs = Array.from({ length: JOBS }, (_, job) =>
    Array.from({ length: 5 }, (__, i) => {
      const n = job * 5 + i;
      const [record] = recordsOfText(machineText(1 + n / 7919), {
        commit: n.toString(16).padStart(40, '0'),
        branch: 'main',
      });
      const { text, sha256 } = record!.inputs[0]!;
      return { text: text!, sha256, body: JSON.stringify(pushBody([record!])) };
    }),
  );
  const authorization = `Bearer ${token}2`;
  const ask = (address: string, method: string, body: string, type = 'application/json') =>
    fetch(address, { method, body, headers: { authorization, 'content-type': type } });
  const places = { project: 'pushed' };
  const timed = async (push: (item: (typeof jobs)[number][number]) => Promise<number>) => {
    const acknowledged: number[] = [];
    const start = performance.now();
    await Promise.all(
      jobs.map(async (items) => {
        for (const item of items) acknowledged.push(await push(item));
      }),
    );
    return { rate: (1000 * JOBS * 5) / (performance.now() - start), acknowledged };
  };
  const bare = await timed(async ({ body }) => {
    const start = performance.now();
    await (await ask(`${beside}/bare`, 'POST', body)).arrayBuffer();
    return performance.now() - start;
  });
  const own = await timed(async ({ text, sha256, body }) => {
    await (
      await ask(base + addressOf('findMissingInputs', places), 'POST', JSON.stringify({ sha256: [sha256] }))
    ).arrayBuffer();
    await (
      await ask(base + addressOf('putInput', { ...places, sha256 }), 'PUT', text, 'application/octet-stream')
    ).arrayBuffer();
    const start = performance.now();
    const response = await ask(base + addressOf('pushRuns', places), 'POST', body);
    await response.arrayBuffer();
    if (response.status !== 201) throw new Error(`a push answered ${response.status}`);
    return performance.now() - start;
  });
  const drained = performance.now();
  for (;;) {
    const { rows } = await db.query("SELECT count(*)::int AS n FROM records WHERE recomputation = 'waiting'");
    if (rows[0].n === 0) break;
    await new Promise((resolve) => setTimeout(resolve, 250));
  }
  const after = (performance.now() - drained) / 1000;
  table.push(
    [
      `rate of whole pushes (three requests each), ${JOBS} jobs at once, beside bare inserts`,
      `${(own.rate / bare.rate).toFixed(2)} ×`,
      '≥ 0.2 ×',
    ],
    ['p99 of the acknowledgement', `${(quantile(own.acknowledged, 0.99) / 1000).toFixed(2)} s`, '< 2 s'],
    ['the queue drained', `${after.toFixed(1)} s after the last push`, 'drained'],
  );
}

function firstLoad(): void {
  const assets = join(root, 'dist', 'web', 'assets');
  const html = readFileSync(join(root, 'dist', 'web', 'index.html'), 'utf8');
  const names = new Set(readdirSync(assets));
  const seen = new Set<string>();
  const take = (name: string) => {
    if (seen.has(name) || !names.has(name)) return;
    seen.add(name);
    if (!name.endsWith('.js')) return;
    // What a script imports by itself; what it imports when asked is not of the first load.
    for (const [, inner] of readFileSync(join(assets, name), 'utf8').matchAll(
      /(?:from|import)\s*["']\.\/([\w.-]+)["']/g,
    ))
      take(inner!);
  };
  for (const [, name] of html.matchAll(/assets\/([\w.-]+\.(?:js|css))/g)) take(name!);
  for (const name of names) if (/^(history|project-frame|layout)-.*\.(js|css)$/.test(name)) take(name);
  const bytes = [...seen].reduce((sum, name) => sum + gzipSync(readFileSync(join(assets, name))).length, 0);
  table.push([
    'script and style of the first load of the history, compressed',
    `${(bytes / 1000).toFixed(0)} kB`,
    '≤ 170 kB',
  ]);
}
