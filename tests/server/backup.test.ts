import { mkdtempSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { execa } from 'execa';
import { describe, expect, inject, it } from 'vitest';
import type { RollUpRecord } from '#core/record/record.ts';
import { openDatabase } from '#server/database.ts';
import { AuditEntry, Person, Run } from '#server/models/index.ts';
import { machineText } from '../helpers/machine-text.ts';
import { pushBody, recordsOfText } from '../helpers/pushed-records.ts';
import { createDatabase } from '../helpers/test-database.ts';
import { PASSWORD, TestServer } from '../helpers/test-server.ts';

const built = (name: string) => join(import.meta.dirname, '..', '..', 'dist', 'server', `${name}.js`);
const run = (name: string, url: string, ...args: string[]) =>
  execa(process.execPath, [built(name), ...args], { env: { DATABASE_URL: url }, reject: false });

describe('a backup', () => {
  it('restored elsewhere is the same server: runs, inputs, people who sign in, the audit trail', async () => {
    const folder = mkdtempSync(join(tmpdir(), 'steelyard-backup-'));
    const file = join(folder, 'all.backup');
    const first = await TestServer.start();
    const project = await first.project('rover');
    const person = await first.person('Kept Well', 'engineer', project);
    const client = await first.signIn(person);
    await client.get('createToken', {
      places: { project: 'rover' },
      body: { kind: 'machine', label: 'CI', scope: 'push', days: 30 },
    });
    const ci = first.withToken(await first.token(person, project, 'push'));
    const records = recordsOfText(machineText(1), { commit: 'a'.repeat(40) });
    const { text, sha256 } = records[0]!.inputs[0]!;
    await ci.get('putInput', { places: { project: 'rover', sha256 }, body: new TextEncoder().encode(text) });
    const pushed = await ci.get<{ runs: { id: string }[] }>('pushRuns', {
      places: { project: 'rover' },
      body: pushBody(records),
    });
    // While the server runs.
    const backup = await run('backup', first.config.DATABASE_URL, file);
    expect(backup.exitCode, backup.stderr).toBe(0);
    expect(statSync(file).size).toBeGreaterThan(1000);
    const audited = await AuditEntry.count();
    await first.stop();

    const url = await createDatabase(inject('postgres'));
    const restore = await run('restore', url, file);
    expect(restore.exitCode, restore.stderr).toBe(0);
    const second = await TestServer.start({ DATABASE_URL: url });
    try {
      const again = await second.signIn(
        await Person.findOne({ where: { email: person.email } }).then((p) => p!),
        PASSWORD,
      );
      const places = { project: 'rover', run: pushed.runs[0]!.id };
      const [record] = await again.get<RollUpRecord[]>('downloadRecord', { places });
      expect(record).toEqual(JSON.parse(JSON.stringify(records[0])));
      expect(await AuditEntry.count()).toBe(audited);
      expect(await Run.count()).toBe(2);
      // One in use is not overwritten but when asked to; then it is.
      await Run.update({ branch: 'changed since' }, { where: {} });
      const refused = await run('restore', url, file);
      expect([refused.exitCode, refused.stderr]).toEqual([1, expect.stringContaining('--replace')]);
      expect(await Run.count({ where: { branch: 'changed since' } })).toBe(2);
      // Nor by what is no backup, though it is asked to.
      expect((await run('restore', url, built('restore'), '--replace')).exitCode).toBe(1);
      expect(await Run.count({ where: { branch: 'changed since' } })).toBe(2);
    } finally {
      await second.stop();
    }
    const replaced = await run('restore', url, file, '--replace');
    expect(replaced.exitCode, replaced.stderr).toBe(0);
    const sequelize = openDatabase(url, 2);
    expect(await Run.count({ where: { branch: 'changed since' } })).toBe(0);
    expect(await Run.count()).toBe(2);
    await sequelize.close();
    rmSync(folder, { recursive: true, force: true });
  });

  it('that is cut short restores nothing', async () => {
    const url = await createDatabase(inject('postgres'));
    const { exitCode, stderr } = await run('restore', url, built('restore'));
    expect(exitCode).toBe(1);
    expect(stderr).toContain('pg_restore cannot read');
    const sequelize = openDatabase(url, 2);
    const [rows] = await sequelize.query("SELECT to_regclass('public.people') AS people");
    expect(rows).toEqual([{ people: null }]);
    await sequelize.close();
  });
});

describe('the first administrator', () => {
  it('is made by the command line, with a link that sets the password once', async () => {
    const server = await TestServer.start();
    try {
      const { stdout, exitCode } = await run(
        'administrator',
        server.config.DATABASE_URL,
        'First@example.org',
        'First',
        'One',
      );
      expect(exitCode).toBe(0);
      expect(stdout).toContain('First One <first@example.org> is administrator, with a new account');
      const link = /\/reset\/(\S+)/.exec(stdout)![1]!;
      const password = 'a long one for the first';
      await server.anyone().get('resetPassword', { places: { link }, body: { password } });
      const person = await Person.findOne({ where: { email: 'first@example.org' } });
      const client = await server.signIn(person!, password);
      expect(await client.get('listPeople')).toMatchObject([{ name: 'First One', administrator: true }]);
    } finally {
      await server.stop();
    }
  });
});
