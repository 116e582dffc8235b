import { join } from 'node:path';
import pg from 'pg';
import { inject } from 'vitest';
import { TEAM, type Who } from '#server/demo/people.ts';
import { seedDemo } from '#server/demo/seed.ts';
import { StoredRecord } from '#server/models/index.ts';
import { projectRoot } from '#server/project-root.ts';
import { DEMO_PASSWORD } from '#server/services/demo-sign-ins.ts';
import { buildWebIfStale } from '../../server/build.js';
import { TestServer, until } from './test-server.ts';

export const PETREL = 'petrel';
const FILLED = 'filled_demo';

/** How someone of the demo signs in. */
export const signInOf = (who: Who) => ({ email: TEAM[who].email, password: DEMO_PASSWORD });

/** A server that shows the dashboard as its sources are now; its database is empty. */
export const startDashboard = (more: Record<string, string> = {}): Promise<TestServer> =>
  oneAtATime(async () => {
    await buildWebIfStale((line: string) => console.error(line));
    return TestServer.start(more, join(projectRoot(), 'dist', 'web'));
  });

/** The same with the demo in it. The first file of tests that asks fills a database; all take copies of it. */
export async function startDemo(): Promise<TestServer> {
  const copy = await oneAtATime(async (client) => {
    const there = await client.query('SELECT 1 FROM pg_database WHERE datname = $1', [FILLED]);
    if (there.rowCount === 0) await client.query(`ALTER DATABASE ${await fillDemo()} RENAME TO ${FILLED}`);
    const name = `demo_${crypto.randomUUID().replaceAll('-', '')}`;
    await client.query(`CREATE DATABASE ${name} TEMPLATE ${FILLED}`);
    return name;
  });
  const url = new URL(inject('postgres'));
  url.pathname = copy;
  return startDashboard({ DEMO: 'yes', DATABASE_URL: url.toString() });
}

/** Fills a database with the demo, every run of it recomputed, and gives its name. */
async function fillDemo(): Promise<string> {
  const server = await TestServer.start();
  try {
    await seedDemo(server.running.deps, () => {});
    await until(async () => (await StoredRecord.count({ where: { recomputation: 'waiting' } })) === 0);
  } finally {
    await server.stop();
  }
  return new URL(server.config.DATABASE_URL).pathname.slice(1);
}

const LOCK = 4780;

/** Does some work while no other file of tests does such work. */
async function oneAtATime<T>(work: (client: pg.Client) => Promise<T>): Promise<T> {
  const client = new pg.Client({ connectionString: inject('postgres') });
  await client.connect();
  try {
    await client.query('SELECT pg_advisory_lock($1)', [LOCK]);
    return await work(client);
  } finally {
    await client.end();
  }
}
