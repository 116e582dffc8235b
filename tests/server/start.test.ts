import { type ChildProcess, spawn, spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { clusterFolder } from '#server/local.ts';
import { freePort } from '#server/postgres/cluster.ts';
import { until } from '../helpers/test-server.ts';

// `npm start` as a process, in a folder of its own, with everything that can be in its way.

const program = join(import.meta.dirname, '..', '..', 'dist', 'server', 'start-local.js');
let folder: string;
let cluster: string;
let port: number;
const started: ChildProcess[] = [];

interface Start {
  readonly child: ChildProcess;
  readonly said: () => string;
  readonly ended: Promise<number | null>;
}

function start(): Start {
  const { DATABASE_URL: _, ...env } = process.env;
  const child = spawn(process.execPath, [program], {
    env: { ...env, STEELYARD_FOLDER: folder, PORT: String(port) },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  started.push(child);
  let text = '';
  for (const stream of [child.stdout!, child.stderr!])
    stream.on('data', (data: Buffer) => {
      text += data;
    });
  return { child, said: () => text, ended: new Promise((resolve) => child.once('exit', resolve)) };
}

const isUp = (one: Start) =>
  until(() => one.said().includes('Steelyard is at') || one.child.exitCode !== null);
const runsInProject = async (): Promise<number> => {
  const origin = `http://127.0.0.1:${port}`;
  const signIn = await fetch(`${origin}/api/session`, {
    method: 'POST',
    headers: { origin, 'content-type': 'application/json' },
    body: JSON.stringify({ email: 'lucia@petrel.example', password: 'brass poise at rest' }),
  });
  const cookie = signIn.headers.getSetCookie()[0]!.split(';')[0]!;
  const [project] = (await (await fetch(`${origin}/api/projects`, { headers: { cookie } })).json()) as {
    runs: number;
  }[];
  return project!.runs;
};
const postmaster = (): number =>
  Number(readFileSync(join(cluster, 'data', 'postmaster.pid'), 'utf8').split('\n')[0]);

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'steelyard-start-'));
  process.env.STEELYARD_FOLDER = folder;
  cluster = clusterFolder();
  delete process.env.STEELYARD_FOLDER;
  port = await freePort();
});

afterAll(() => {
  for (const child of started) child.kill('SIGKILL');
  if (existsSync(join(cluster, 'data', 'postmaster.pid'))) spawnSync('kill', ['-INT', String(postmaster())]);
  for (const made of [folder, cluster]) rmSync(made, { recursive: true, force: true });
});

describe('npm start', () => {
  it('makes what is missing, though a start before it was cut off, and tells where it is', async () => {
    mkdirSync(join(cluster, 'making', 'base'), { recursive: true });
    const one = start();
    await isUp(one);
    expect(one.said()).toContain(`Steelyard is at http://127.0.0.1:${port}`);
    expect(one.said()).toContain('ingrid@petrel.example');
    expect(await runsInProject()).toBe(60);
    expect(existsSync(join(cluster, 'making'))).toBe(false);
    // A second one beside it says what is in its way, and leaves the first alone.
    const second = start();
    expect(await second.ended).toBe(1);
    expect(second.said()).toContain(`port ${port} of 127.0.0.1 is taken`);
    expect(await runsInProject()).toBe(60);
    one.child.kill('SIGINT');
    expect(await one.ended).toBe(0);
    expect(existsSync(join(cluster, 'data', 'postmaster.pid'))).toBe(false);
  });

  it('again is quick and keeps the data, also after the machine went down', async () => {
    const one = start();
    await isUp(one);
    expect(one.said()).not.toContain('making the demo');
    // Nothing is closed: the lock of PostgreSQL stays behind, stale.
    const pid = postmaster();
    one.child.kill('SIGKILL');
    process.kill(pid, 'SIGKILL');
    await one.ended;
    await until(() => spawnSync('kill', ['-0', String(pid)]).status !== 0);
    expect(existsSync(join(cluster, 'data', 'postmaster.pid'))).toBe(true);
    const two = start();
    await isUp(two);
    expect(two.said()).toContain('Steelyard is at');
    expect(await runsInProject()).toBe(60);
    two.child.kill('SIGTERM');
    expect(await two.ended).toBe(0);
  });
});
