import { type ChildProcess, spawn } from 'node:child_process';
import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { connect } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { execa } from 'execa';
import pg from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { addressOf } from '#core/api/routes.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { migrate, openDatabase } from '#server/database.ts';
import { type Cluster, freePort, startCluster } from '#server/postgres/cluster.ts';
import { hashSecret, newSecret } from '#server/services/secrets.ts';
import { machineText } from '../helpers/machine-text.ts';
import { pushBody, recordsOfText } from '../helpers/pushed-records.ts';
import { until } from '../helpers/test-server.ts';

// What a team may trust: nothing acknowledged is lost, nothing is doubled, what was not acknowledged waits in the tray.
// The server is the built one, a process that is killed; the PostgreSQL is its own, for it is stopped under load.

const root = join(import.meta.dirname, '..', '..');
const COMMAND = join(root, 'dist', 'cli', 'steelyard.js');
const token = newSecret();

let folder: string;
let cluster: Cluster;
let db: pg.Pool;
let port: number;
let server: ChildProcess | null = null;

/** A folder of its own: the account that PostgreSQL runs under may not go where the tests' own files lie. */
const postgresFolder = mkdtempSync(join(tmpdir(), 'steelyard-faults-postgres-'));
const startPostgres = (wanted?: number) =>
  startCluster({
    folder: postgresFolder,
    durable: true,
    tell: () => {},
    ...(wanted !== undefined && { port: wanted }),
  });

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'steelyard-faults-'));
  cluster = await startPostgres();
  const sequelize = openDatabase(cluster.url, 2);
  await migrate(sequelize, cluster.url);
  await sequelize.close();
  db = new pg.Pool({ connectionString: cluster.url, max: 2 });
  db.on('error', () => {});
  await db.query(`INSERT INTO people (email, name) VALUES ('ci@example.org', 'Ci')`);
  await db.query(`INSERT INTO projects (slug, name) VALUES ('rover', 'Rover')`);
  await db.query(
    `INSERT INTO tokens (project_id, person_id, kind, label, scope, secret_hash, expires_at)
     SELECT p.id, q.id, 'machine', 'CI', 'push', $1, now() + interval '1 day' FROM projects p, people q`,
    [hashSecret(token)],
  );
  port = await freePort();
});

afterAll(async () => {
  server?.kill('SIGKILL');
  await db.end();
  await cluster.stop();
  for (const made of [folder, postgresFolder]) rmSync(made, { recursive: true, force: true });
});

async function startServer(): Promise<void> {
  server = spawn(process.execPath, [join(root, 'dist', 'server', 'main.js')], {
    stdio: 'ignore',
    env: {
      PATH: process.env.PATH,
      DATABASE_URL: cluster.url,
      SECRET: 'a secret of the tests, long enough to sign with',
      PUBLIC_URL: `http://127.0.0.1:${port}`,
      PORT: String(port),
      MAIL_FOLDER: join(folder, 'mail'),
      LOG_LEVEL: 'silent',
    },
  });
  await until(() =>
    fetch(`http://127.0.0.1:${port}/api/ready`).then(
      (r) => r.status === 200,
      () => false,
    ),
  );
}

/** As a machine that loses its power does: nothing is closed, nothing is said. */
async function killServer(): Promise<void> {
  const gone = new Promise((resolve) => server!.once('exit', resolve));
  server!.kill('SIGKILL');
  await gone;
}

async function stopServer(): Promise<number | null> {
  const gone = new Promise<number | null>((resolve) => server!.once('exit', resolve));
  server!.kill('SIGTERM');
  return gone;
}

const tray = () => join(folder, 'tray');

/** The command, pushing records that it reads as its standard input names them. */
const steelyard = (...args: string[]) =>
  execa(process.execPath, [COMMAND, ...args], {
    cwd: folder,
    reject: false,
    extendEnv: false,
    env: {
      PATH: process.env.PATH!,
      HOME: folder,
      STEELYARD_SERVER: `http://127.0.0.1:${port}`,
      STEELYARD_PROJECT: 'rover',
      STEELYARD_TOKEN: token,
      STEELYARD_TRAY: tray(),
      STEELYARD_PUSH_WAIT_MS: '5',
    },
  });

const waiting = (): number => {
  try {
    return readdirSync(join(tray(), 'waiting')).filter((name) => !name.startsWith('.')).length;
  } catch {
    return 0;
  }
};

const runsOf = async (like: string): Promise<string[]> => {
  const { rows } = await db.query<{ commit: string }>(
    'SELECT commit FROM runs WHERE commit LIKE $1 ORDER BY id',
    [like],
  );
  return rows.map((row) => row.commit);
};

/** Records of one state of machines with masses of their own, a commit each. */
function recordsFrom(first: number, count: number, prefix: string): RollUpRecord[] {
  return Array.from({ length: count }, (_, i) => {
    const commit = prefix + (first + i).toString(16).padStart(40 - prefix.length, '0');
    return recordsOfText(machineText(1 + (first + i) / 1000), { commit, branch: 'main' })[0]!;
  });
}

async function writeRecords(name: string, records: readonly RollUpRecord[]): Promise<string> {
  const { writeFileSync } = await import('node:fs');
  const file = join(folder, name);
  writeFileSync(file, records.map((record) => `${JSON.stringify(record)}\n`).join(''));
  return file;
}

describe('500 pushes while the server is killed at random', () => {
  it('are all in the history in the end, each once; what was not acknowledged waits in the tray', async () => {
    await startServer();
    let pushing = true;
    const killer = (async () => {
      let seed = 7;
      while (pushing) {
        seed = (seed * 48271) % 2147483647;
        await new Promise((resolve) => setTimeout(resolve, 150 + (seed % 900)));
        if (!pushing) break;
        await killServer();
        await startServer();
      }
    })();
    const statuses = new Set<number | undefined>();
    for (let batch = 0; batch < 20; batch++) {
      const records = recordsFrom(batch * 25, 25, 'a');
      const file = await writeRecords(`batch-${batch}.ndjson`, records);
      const { exitCode, stderr } = await steelyard('push', file, '--retries', '1');
      statuses.add(exitCode);
      expect([0, 3], stderr).toContain(exitCode);
      // Every record so far is in the history or in the tray, whenever the server died.
      const kept = new Set(await runsOf('a%')).size;
      expect(kept + waiting()).toBeGreaterThanOrEqual((batch + 1) * 25);
      if (exitCode === 0) expect(waiting()).toBe(0);
    }
    pushing = false;
    await killer;
    await until(async () => (await steelyard('push')).exitCode === 0);
    expect(waiting()).toBe(0);
    const commits = await runsOf('a%');
    expect(commits).toHaveLength(500);
    expect(new Set(commits).size).toBe(500);
    // The jobs of the dead servers are done by the one that lives.
    await until(async () => {
      const { rows } = await db.query("SELECT 1 FROM records WHERE recomputation = 'waiting' LIMIT 1");
      return rows.length === 0;
    });
    const { rows } = await db.query('SELECT DISTINCT recomputation FROM records');
    expect(rows).toEqual([{ recomputation: 'recomputed' }]);
    await stopServer();
  }, 240_000);
});

describe('PostgreSQL restarted under load', () => {
  it('costs answers of 503 and nothing else', async () => {
    await startServer();
    const records = recordsFrom(0, 120, 'b');
    const acknowledged: string[] = [];
    const answers = new Set<number>();
    const push = async (record: RollUpRecord) => {
      const response = await fetch(`http://127.0.0.1:${port}${addressOf('pushRuns', { project: 'rover' })}`, {
        method: 'POST',
        headers: { authorization: `Bearer ${token}`, 'content-type': 'application/json' },
        body: JSON.stringify(pushBody([record])),
      });
      answers.add(response.status);
      if (response.status < 300) acknowledged.push(record.provenance.commit!);
      return response.status < 300;
    };
    const load = Promise.all(
      Array.from({ length: 6 }, async (_, lane) => {
        for (let i = lane; i < records.length; i += 6)
          await until(
            async () => (await push(records[i]!)) || new Promise((r) => setTimeout(() => r(false), 100)),
          );
      }),
    );
    await until(() => acknowledged.length > 20);
    await cluster.stop();
    cluster = await restartOnSamePort(cluster);
    await load;
    for (const status of answers) expect([200, 201, 503]).toContain(status);
    const commits = await runsOf('b%');
    expect(new Set(commits)).toEqual(new Set(acknowledged));
    expect(commits).toHaveLength(120);
    expect(await stopServer()).toBe(0);
  }, 120_000);
});

/** A server keeps the address of its database; so the database comes back where it was. */
const restartOnSamePort = (before: Cluster): Promise<Cluster> =>
  startPostgres(Number(new URL(before.url).port));

describe('a push that breaks off', () => {
  it('leaves nothing behind when the line is cut in the middle of the body', async () => {
    await startServer();
    const [record] = recordsFrom(0, 1, 'c');
    const body = JSON.stringify(pushBody([record!]));
    await new Promise<void>((resolve) => {
      const socket = connect(port, '127.0.0.1', () => {
        socket.write(
          `POST ${addressOf('pushRuns', { project: 'rover' })} HTTP/1.1\r\nHost: x\r\nAuthorization: Bearer ${token}\r\nContent-Type: application/json\r\nContent-Length: ${body.length}\r\n\r\n${body.slice(0, body.length / 2)}`,
          () => setTimeout(() => socket.destroy(), 100),
        );
      });
      socket.once('close', () => resolve());
    });
    expect(await runsOf('c%')).toEqual([]);
    expect((await fetch(`http://127.0.0.1:${port}/api/ready`)).status).toBe(200);
    await stopServer();
  });

  it('waits in the tray when the database has no room, and is sent when it has', async () => {
    await startServer();
    // What PostgreSQL says on a full disk (SQLSTATE 53100, disk_full), said by a trigger.
    await db.query(`
      CREATE FUNCTION full_disk() RETURNS trigger LANGUAGE plpgsql AS
        $$ BEGIN RAISE EXCEPTION 'could not extend file: No space left on device' USING ERRCODE = '53100'; END $$;
      CREATE TRIGGER full_disk BEFORE INSERT ON runs EXECUTE FUNCTION full_disk()`);
    const file = await writeRecords('full.ndjson', recordsFrom(0, 3, 'd'));
    const { exitCode, stderr } = await steelyard('push', file, '--retries', '0');
    expect(exitCode, stderr).toBe(3);
    expect(stderr).toContain('tray');
    expect(waiting()).toBe(3);
    expect(await runsOf('d%')).toEqual([]);
    await db.query('DROP TRIGGER full_disk ON runs; DROP FUNCTION full_disk');
    expect((await steelyard('push')).exitCode).toBe(0);
    expect(await runsOf('d%')).toHaveLength(3);
    expect(waiting()).toBe(0);
    await stopServer();
  });
});

describe('a server that is told to stop', () => {
  it('finishes what it has begun, and answers it', async () => {
    await startServer();
    const records = recordsFrom(0, 40, 'e');
    const pushed = fetch(`http://127.0.0.1:${port}${addressOf('pushRuns', { project: 'rover' })}`, {
      method: 'POST',
      headers: { authorization: `Bearer ${token}`, 'content-type': 'application/json' },
      body: JSON.stringify(pushBody(records)),
    });
    await new Promise((resolve) => setTimeout(resolve, 30));
    const stopped = stopServer();
    const answer = await pushed.then(
      (response) => response.status,
      () => 'refused',
    );
    expect(await stopped).toBe(0);
    const kept = (await runsOf('e%')).length;
    // Begun and answered, or never begun.
    expect([answer, kept]).toEqual(answer === 201 ? [201, 40] : ['refused', 0]);
  });
});
