import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest';
import { CONTRACT } from '#core/api/contract.ts';
import { ROUTES, type RouteName } from '#core/api/routes.ts';
import { migrations } from '#migrations/index.ts';
import { ConfigError, configSchema, readConfig } from '#server/config.ts';
import { createMigrator, migrate, NewerSchema, openDatabase } from '#server/database.ts';
import { createDatabase } from '../helpers/test-database.ts';
import { TestServer } from '../helpers/test-server.ts';

describe('the environment', () => {
  it('is told by name and meaning where it says too little', () => {
    const read = () => readConfig({ SECRET: 'short', PORT: 'x' });
    expect(read).toThrow(ConfigError);
    expect(read).toThrow(/DATABASE_URL is not set: the PostgreSQL database/);
    expect(read).toThrow(/SECRET is not right: signs session cookies/);
    expect(read).toThrow(/PORT is not right/);
  });

  it('has a meaning for every variable', () => {
    for (const [name, schema] of Object.entries(configSchema.shape))
      expect(schema.description, name).toBeTruthy();
  });
});

describe('the schema', () => {
  const tables = (sequelize: ReturnType<typeof openDatabase>) =>
    sequelize.query<{ name: string }>(
      `SELECT table_name AS name FROM information_schema.tables WHERE table_schema = 'public' ORDER BY 1`,
      { type: QueryTypes.SELECT },
    );

  it('goes up, down step by step, and up again to the same', async () => {
    const url = await createDatabase(inject('postgres'));
    const sequelize = openDatabase(url, 2);
    try {
      expect(await migrate(sequelize, url)).toEqual(migrations.map((m) => m.name));
      const whole = await tables(sequelize);
      expect(whole.length).toBeGreaterThan(14);
      expect(await migrate(sequelize, url)).toEqual([]);
      const migrator = createMigrator(sequelize);
      for (const { name } of [...migrations].reverse()) {
        await migrator.down();
        expect((await migrator.executed()).map((m) => m.name)).not.toContain(name);
      }
      expect((await tables(sequelize)).map((t) => t.name)).toEqual(['schema_migrations']);
      await migrate(sequelize, url);
      expect(await tables(sequelize)).toEqual(whole);
    } finally {
      await sequelize.close();
    }
  });

  it('of a newer program is left alone, and explained', async () => {
    const url = await createDatabase(inject('postgres'));
    const sequelize = openDatabase(url, 2);
    try {
      await migrate(sequelize, url);
      await sequelize.query("INSERT INTO schema_migrations (name) VALUES ('29990101000000-of-the-future')");
      await expect(migrate(sequelize, url)).rejects.toThrow(NewerSchema);
      await expect(migrate(sequelize, url)).rejects.toThrow(/29990101000000-of-the-future/);
    } finally {
      await sequelize.close();
    }
  });

  it('holds by itself what must always be so', async () => {
    const url = await createDatabase(inject('postgres'));
    const sequelize = openDatabase(url, 2);
    try {
      await migrate(sequelize, url);
      const refuse = (sql: string) =>
        expect(sequelize.query(sql), sql).rejects.toThrow(/violates|invalid input/);
      await refuse(`INSERT INTO projects (slug, name) VALUES ('Not A Slug', 'x')`);
      await refuse(`INSERT INTO people (email, name) VALUES ('Capital@example.org', 'x')`);
      await refuse(`INSERT INTO memberships (project_id, person_id, role) VALUES (99, 99, 'viewer')`);
      await sequelize.query(
        `INSERT INTO projects (slug, name) VALUES ('p', 'P'); INSERT INTO people (email, name) VALUES ('a@b.example', 'A')`,
      );
      await refuse(
        `INSERT INTO memberships (project_id, person_id, role) SELECT p.id, q.id, 'king' FROM projects p, people q`,
      );
      await refuse(
        `INSERT INTO inputs (project_id, sha256, size, content) SELECT id, 'no hash', 1, '' FROM projects`,
      );
      const record = (mass: string) =>
        `WITH r AS (INSERT INTO records (project_id, stamp, content_sha256, content) SELECT id, repeat('a', 64), '', '' FROM projects RETURNING id, project_id)
         INSERT INTO runs (project_id, record_id, origin, assembly, state, verdict, person_id, judged_on, mass, figures, file_units, provenance)
         SELECT project_id, id, 'o', 'a', 's', 'within', (SELECT id FROM people), 'basic', ${mass}, '{1}', '{}', '{}' FROM r`;
      await refuse(record("'NaN'"));
      await refuse(record("'Infinity'"));
      await sequelize.query(record('1'));
      await refuse(
        `INSERT INTO releases (project_id, run_id, state, prepared_by) SELECT project_id, id, 'released', person_id FROM runs`,
      );
      await refuse(
        `INSERT INTO releases (project_id, run_id, state, prepared_by) SELECT project_id, id, 'withdrawn', person_id FROM runs`,
      );
    } finally {
      await sequelize.close();
    }
  });
});

describe('the server', () => {
  let server: TestServer;
  beforeAll(async () => {
    server = await TestServer.start();
  });
  afterAll(() => server.stop());

  it('describes every route of its contract as OpenAPI', async () => {
    const document = await server
      .anyone()
      .get<{ openapi: string; paths: Record<string, Record<string, { operationId: string }>> }>('openApi');
    expect(document.openapi).toMatch(/^3\.1/);
    const named = Object.values(document.paths).flatMap((path) =>
      Object.values(path).map((o) => o.operationId),
    );
    expect(named.sort()).toEqual(Object.keys(ROUTES).sort());
    expect(Object.keys(CONTRACT).sort()).toEqual(Object.keys(ROUTES).sort());
  });

  it('sends a strict policy with every answer, and nothing of what it is made of', async () => {
    const { headers } = await server.anyone().ask('health');
    expect(headers.get('content-security-policy')).toMatch(/default-src 'none';script-src 'self'/);
    expect(headers.get('content-security-policy')).not.toContain('unsafe');
    expect(headers.get('x-content-type-options')).toBe('nosniff');
    expect(headers.get('x-powered-by')).toBeNull();
    expect(headers.get('cache-control')).toBe('no-store');
  });

  it('answers what is not there with problem details', async () => {
    const response = await fetch(`${server.address}/api/nothing`);
    expect(response.headers.get('content-type')).toContain('application/problem+json');
    expect(await response.json()).toMatchObject({
      type: 'about:blank',
      status: 404,
      code: 'NOT_FOUND',
      requestId: expect.stringMatching(/^[0-9a-f-]{36}$/),
    });
  });

  it('lets nobody see mail but on a demo', async () => {
    expect(await server.anyone().problem('listDemoMail')).toBe('404 NOT_FOUND');
  });

  it('slows an address that asks too often', async () => {
    const slow = await TestServer.start({ RATE_PER_MINUTE: '20' });
    try {
      const answers: number[] = [];
      for (let i = 0; i < 25; i++)
        answers.push((await slow.anyone().ask('health' satisfies RouteName)).status);
      expect(answers.slice(0, 20).every((s) => s === 200)).toBe(true);
      expect(answers.slice(20).every((s) => s === 429)).toBe(true);
    } finally {
      await slow.stop();
    }
  });
});

describe('README.md', () => {
  it('documents every variable of the environment, as the server itself does', () => {
    const page = readFileSync(join(import.meta.dirname, '..', '..', 'README.md'), 'utf8');
    const text = page.replace(/ +/g, ' ');
    for (const [name, { description }] of Object.entries(configSchema.shape))
      expect(text, name).toContain(`| \`${name}\` | ${description} |`);
  });
});
