import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Project } from '../../../server/models/index.ts';
import { CliTest } from '../../helpers/cli-test.ts';
import { TestServer } from '../../helpers/test-server.ts';

const BUOY = `
  assembly: buoy
  units: { length: mm, mass: kg }
  states: { afloat: {}, on deck: {} }
  parts: [ { name: float, solid: { sphere: { diameter: 420 } }, mass: 9 } ]
  limits: [ { name: mass, quantity: mass, max: 12 } ]
`;

interface Page {
  rows: { id: string; assembly: string; state: string; recomputation: { status: string } }[];
}

describe('the command and the server', () => {
  let server: TestServer;
  let project: Project;
  let token: string;
  let readToken: string;

  beforeAll(async () => {
    server = await TestServer.start();
    project = await server.project('heron');
    const engineer = await server.person('Edda Engineer', 'engineer', project);
    token = await server.token(engineer, project, 'push');
    readToken = await server.token(engineer, project, 'read');
  });
  afterAll(() => server.stop());

  const pusher = (secret: string) =>
    new CliTest().file('buoy.yaml', BUOY).withEnv({
      STEELYARD_SERVER: server.address,
      STEELYARD_PROJECT: 'heron',
      STEELYARD_TOKEN: secret,
      STEELYARD_PUSH_WAIT_MS: '5',
    });
  const history = async () =>
    (await server.withToken(readToken).ask<Page>('listRuns', { places: { project: 'heron' } })).body.rows;

  it('signs in by a token of the project', async () => {
    const test = new CliTest().withInput(token);
    const { status, stderr } = await test.steelyard(
      'sign-in',
      '--server',
      server.address,
      '--project',
      'heron',
    );
    expect([status, stderr]).toEqual([0, expect.stringContaining('as engineer')]);
  });

  it('pushes records that are in the history when the command ends; the same commit again is the same run', async () => {
    const test = pusher(token);
    await test.git('init', '-q', '-b', 'main');
    await test.git('add', '.');
    await test.git('commit', '-q', '-m', 'buoy');
    const first = await test.steelyard('run', 'buoy.yaml', '--push');
    expect([first.status, first.stderr]).toEqual([0, expect.stringContaining('pushed buoy, on deck: http')]);
    const rows = await history();
    expect(rows.map((row) => row.state).sort()).toEqual(['afloat', 'on deck']);
    expect(first.stderr).toContain(`/projects/heron/runs/${rows[0]!.id}`);
    const again = await test.steelyard('run', 'buoy.yaml', '--push', '--format', 'json');
    expect([again.status, again.stderr]).toEqual([0, expect.stringContaining('it was there already')]);
    test.file('again.json', again.stdout);
    expect((await test.steelyard('push', 'again.json')).stderr).toContain('it was there already');
    expect((await history()).map((row) => row.id)).toEqual(rows.map((row) => row.id));
  });

  it('sends what the server needs to compute the records again', async () => {
    await expect
      .poll(async () => (await history()).map((row) => row.recomputation.status), { timeout: 30_000 })
      .toEqual(['recomputed', 'recomputed']);
  });

  it('keeps what a token of scope read may not push', async () => {
    const test = pusher(readToken);
    const { status, stderr } = await test.steelyard('run', 'buoy.yaml', '--push');
    expect([status, stderr]).toEqual([3, expect.stringContaining('PUSH_FORBIDDEN')]);
    expect(await test.json<unknown[]>('tray')).toHaveLength(2);
    const later = await test.withEnv({ STEELYARD_TOKEN: token }).steelyard('push');
    expect(later.status).toBe(0);
    expect(await test.json('tray')).toEqual([]);
  });

  it('says that there is no such project, or no such token', async () => {
    const elsewhere = await pusher(token)
      .withEnv({ STEELYARD_PROJECT: 'egret' })
      .steelyard('run', 'buoy.yaml', '--push');
    expect([elsewhere.status, elsewhere.stderr]).toEqual([
      3,
      expect.stringMatching(/PUSH_(PROJECT|FORBIDDEN)/),
    ]);
    const nobody = await pusher('sy_no-such-token-at-all').steelyard('run', 'buoy.yaml', '--push');
    expect([nobody.status, nobody.stderr]).toEqual([3, expect.stringContaining('PUSH_TOKEN')]);
  });

  it('sets apart a record whose figures contradict the one under its stamp', async () => {
    const test = pusher(token);
    const { stdout } = await test.steelyard('run', 'buoy.yaml', '--state', 'afloat');
    await test.file('a.json', stdout).steelyard('push', 'a.json');
    const forged = stdout.replace(/("basic": \{\s+"mass": )9/, '$18');
    const { status, stderr } = await test.file('b.json', forged).steelyard('push', 'b.json');
    expect(forged).not.toBe(stdout);
    expect([status, stderr]).toEqual([3, expect.stringContaining('RECORD_CONTRADICTS')]);
    expect((await test.json<{ where: string }[]>('tray')).map((r) => r.where)).toEqual(['refused']);
  });
});
