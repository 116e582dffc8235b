import { randomBytes } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import pg from 'pg';
import type { TestProject } from 'vitest/node';
import { startCluster } from '../../server/postgres/cluster.ts';

declare module 'vitest' {
  interface ProvidedContext {
    /** Of a PostgreSQL that this run of the tests has for itself. */
    postgres: string;
  }
}

/** Before all tests: a PostgreSQL on loopback in a folder of its own, installed where missing; gone after them. */
export default async function setup({ provide }: TestProject): Promise<() => Promise<void>> {
  const folder = mkdtempSync(join(tmpdir(), 'steelyard-postgres-'));
  const tell = (line: string) => console.error(line);
  const cluster = await startCluster({ folder, durable: false, tell }).catch((error: Error) => error);
  if (cluster instanceof Error) {
    // The tests of core and command need none; those of the server say why they fail.
    provide('postgres', `not here: ${cluster.message}`);
    return async () => {};
  }
  provide('postgres', cluster.url);
  return async () => {
    await cluster.stop();
    rmSync(folder, { recursive: true, force: true });
  };
}

/** An empty database of its own in the tests' PostgreSQL. */
export async function createDatabase(postgres: string): Promise<string> {
  if (postgres.startsWith('not here')) throw new Error(`PostgreSQL is ${postgres}`);
  const name = `test_${randomBytes(6).toString('hex')}`;
  const client = new pg.Client({ connectionString: postgres });
  await client.connect();
  try {
    await client.query(`CREATE DATABASE ${name}`);
  } finally {
    await client.end();
  }
  const url = new URL(postgres);
  url.pathname = name;
  return url.toString();
}
