import { readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { execa } from 'execa';
import { describe, expect, it, onTestFinished } from 'vitest';
import { BATCH_AT_MOST } from '../../../core/api/push.ts';
import { CliTest } from '../../helpers/cli-test.ts';
import { PushServer, problem, TOKEN } from '../../helpers/push-server.ts';

const BUOY = `
  assembly: buoy
  units: { length: mm, mass: kg }
  states: { afloat: {}, on deck: {} }
  parts:
    - { name: float, solid: { sphere: { diameter: 420 } }, mass: 9 }
    - { name: keel, include: keel.yaml, at: [ 0, 0, -300 ] }
  limits: [ { name: mass, quantity: mass, max: 12 } ]
`;
const KEEL = `
  assembly: keel
  units: { length: mm, mass: kg }
  parts: [ { name: weight, solid: { cylinder: { diameter: 90, length: 40 } }, mass: 2 } ]
`;
const HEAVY = BUOY.replace('mass: 9', 'mass: 19');
const CUBE = `solid cube
${[
  [0, 2, 1],
  [0, 1, 3],
  [0, 3, 2],
  [1, 2, 3],
]
  .map((corners) => {
    const points = [
      [0, 0, 0],
      [10, 0, 0],
      [0, 10, 0],
      [0, 0, 10],
    ];
    const lines = corners.map((c) => `vertex ${points[c]!.join(' ')}`).join('\n');
    return `facet normal 0 0 0\nouter loop\n${lines}\nendloop\nendfacet`;
  })
  .join('\n')}
endsolid cube
`;
const WITH_MESH = `
  assembly: wedge
  parts: [ { name: wedge, solid: { mesh: { file: wedge.stl, unit: mm } }, mass: 1 } ]
`;

interface Listed {
  id: string;
  where: string;
  assembly: string;
  state: string;
  why: { code: string; message: string } | null;
}

/** A folder with an assembly, and the environment of somebody who may push it to a server. */
function pusher(server: { url: string }, env: Record<string, string> = {}): CliTest {
  return new CliTest()
    .file('buoy.yaml', BUOY)
    .file('keel.yaml', KEEL)
    .withEnv({
      STEELYARD_SERVER: server.url,
      STEELYARD_PROJECT: 'heron',
      STEELYARD_TOKEN: TOKEN,
      STEELYARD_PUSH_WAIT_MS: '5',
      ...env,
    });
}

const tray = (test: CliTest) => test.json<Listed[]>('tray');
const trayPath = (test: CliTest, ...names: string[]) =>
  join(test.folder, '.local', 'state', 'steelyard', 'tray', ...names);

/** A server that nobody runs: the port was closed a moment ago. */
async function nobody(): Promise<{ url: string }> {
  const server = await PushServer.start();
  server.stop();
  return server;
}

describe('run --push', () => {
  it('sends every state with its inputs, each input once and as it was hashed, gzipped', async () => {
    const server = await PushServer.start();
    const test = pusher(server);
    const { stdout, stderr, status } = await test.steelyard('run', 'buoy.yaml', '--push');
    expect([status, stderr]).toEqual([0, expect.stringContaining('pushed buoy, afloat')]);
    const records = JSON.parse(stdout) as { stamp: string; inputs: { text: string }[] }[];
    expect([...server.runs.values()].map((r) => r.stamp)).toEqual(records.map((r) => r.stamp));
    expect([...server.runs.values()].flatMap((r) => r.inputs.map((i) => i.text))).toEqual(
      Array(4).fill(undefined),
    );
    expect([...server.inputs.values()].map(String).sort()).toEqual(
      records[0]!.inputs.map(({ text }) => text).sort(),
    );
    expect(
      server.asked.map(({ method, path }) => `${method} ${path.replace(/[0-9a-f]{64}/, 'HASH')}`),
    ).toEqual(['POST /inputs/missing', 'PUT /inputs/HASH', 'PUT /inputs/HASH', 'POST /runs']);
    for (const { headers } of server.asked) expect(headers['content-encoding']).toBe('gzip');
    expect(await tray(test)).toEqual([]);
    expect(readdirSync(trayPath(test, 'waiting'))).toEqual([]);
  });

  it('sends no input that the server has', async () => {
    const server = await PushServer.start();
    const test = pusher(server);
    await test.steelyard('run', 'buoy.yaml', '--push');
    await test.steelyard('run', 'buoy.yaml', '--push', '--state', 'afloat');
    expect(server.asked.filter(({ method }) => method === 'PUT')).toHaveLength(2);
    expect(server.runs.size).toBe(3);
  });

  it('sends a mesh as its bytes', async () => {
    const server = await PushServer.start();
    const test = pusher(server).file('wedge.yaml', WITH_MESH).file('wedge.stl', CUBE);
    expect((await test.steelyard('run', 'wedge.yaml', '--push')).status).toBe(0);
    const [mesh] = server.asked.filter(({ method, body }) => method === 'PUT' && body.includes('facet'));
    expect(mesh!.body.toString()).toBe(test.read('wedge.stl'));
    expect(mesh!.headers['content-type']).toBe('application/octet-stream');
    expect(mesh!.headers['content-encoding']).toBeUndefined();
  });

  it('keeps the records where nobody answers, tells of the tray, and `push` sends them later', async () => {
    const test = pusher(await nobody());
    const { stdout, stderr, status } = await test.steelyard('run', 'buoy.yaml', '--push', '--retries', '2');
    expect(status).toBe(3);
    expect(JSON.parse(stdout)).toHaveLength(2);
    expect(stderr).toContain('PUSH_UNREACHABLE');
    expect(stderr).toContain('at all 3 attempts');
    expect(stderr).toMatch(/2 records waiting in the tray .*`steelyard push` sends/s);
    const waiting = await tray(test);
    expect(waiting.map((r) => [r.where, r.assembly, r.state, r.why?.code])).toEqual([
      ['waiting', 'buoy', 'afloat', 'PUSH_UNREACHABLE'],
      ['waiting', 'buoy', 'on deck', 'PUSH_UNREACHABLE'],
    ]);

    const server = await PushServer.start();
    const later = await test.withEnv({ STEELYARD_SERVER: server.url }).steelyard('push', '--redirect');
    expect(later.status).toBe(0);
    expect([...server.runs.keys()]).toEqual(waiting.map((r) => r.id));
    expect(server.inputs.size).toBe(2);
    expect(await tray(test)).toEqual([]);
  });

  it('keeps an input once on the disk however many records need it', async () => {
    const test = pusher(await nobody());
    await test.steelyard('run', 'buoy.yaml', '--push', '--retries', '0');
    await test.steelyard('run', 'buoy.yaml', '--push', '--retries', '0');
    const entries = readdirSync(trayPath(test, 'waiting'));
    expect(entries).toHaveLength(4);
    const files = entries.flatMap((entry) =>
      readdirSync(trayPath(test, 'waiting', entry, 'inputs')).map(
        (name) => statSync(trayPath(test, 'waiting', entry, 'inputs', name)).ino,
      ),
    );
    expect(files).toHaveLength(8);
    expect(new Set(files).size).toBe(2);
    expect(statSync(trayPath(test)).mode & 0o777).toBe(0o700);
  });

  it.each([
    ['500, then takes them', { status: 500 } as const],
    ['an overloaded proxy, then takes them', { status: 503 } as const],
    ['cuts the connection in its answer, then takes them', 'cut' as const],
  ])('tries again where the server answers %s', async (_, answer) => {
    const server = await PushServer.start();
    server.next('/runs', answer, answer);
    const test = pusher(server);
    const { status } = await test.steelyard('run', 'buoy.yaml', '--push');
    expect([status, server.runs.size, server.to('/runs').length]).toEqual([0, 2, 3]);
    expect(await tray(test)).toEqual([]);
  });

  it('sends a record under the same key whenever it sends it again', async () => {
    const server = await PushServer.start();
    // Taken, but the answer never arrives: the client cannot know.
    server.always(({ path, body }) => {
      if (path !== '/runs') return undefined;
      for (const { key, record } of JSON.parse(body.toString()).runs) server.runs.set(key, record);
      return 'cut';
    });
    const test = pusher(server);
    expect((await test.steelyard('run', 'buoy.yaml', '--push', '--retries', '1')).status).toBe(3);
    server.healed();
    const { status, stderr } = await test.steelyard('push');
    expect([status, server.runs.size, server.to('/runs').length]).toEqual([0, 2, 3]);
    expect(stderr).toContain('it was there already');
  });

  it('waits as long as Retry-After asks', async () => {
    const server = await PushServer.start();
    server.next('/runs', { status: 429, headers: { 'retry-after': '1' } });
    const { status } = await pusher(server).steelyard('run', 'buoy.yaml', '--push');
    const [first, second] = server.to('/runs');
    expect(status).toBe(0);
    expect(second!.at - first!.at).toBeGreaterThanOrEqual(990);
  });

  it('gives up at once where the server asks for a longer wait than anyone has, and says how long', async () => {
    const server = await PushServer.start();
    server.always(({ path }) =>
      path === '/runs' ? { status: 429, headers: { 'retry-after': '900' } } : undefined,
    );
    const { status, stderr } = await pusher(server).steelyard('run', 'buoy.yaml', '--push');
    expect([status, server.to('/runs').length]).toEqual([3, 1]);
    expect(stderr).toContain('PUSH_THROTTLED');
    expect(stderr).toContain('900 s');
  });

  it('gives up on a server that takes the connection and says nothing', async () => {
    const server = await PushServer.start();
    server.always(() => 'silent');
    const test = pusher(server, { STEELYARD_PUSH_TIMEOUT_MS: '80' });
    const { status, stderr } = await test.steelyard('run', 'buoy.yaml', '--push', '--retries', '1');
    expect([status, server.asked.length]).toEqual([3, 2]);
    expect(stderr).toContain('none came in time');
    expect(await tray(test)).toHaveLength(2);
  });

  it('sets a refused record apart with its reason, sends the others, and never retries it', async () => {
    const server = await PushServer.start();
    server.next('/runs', {
      status: 201,
      json: {
        runs: [
          { status: 'created', id: '1', address: '/projects/heron/runs/1', fault: null },
          {
            status: 'refused',
            id: null,
            address: null,
            fault: { code: 'RUN_ODD', message: 'no body is so' },
          },
        ],
      },
    });
    const test = pusher(server);
    const { status, stderr } = await test.steelyard('run', 'buoy.yaml', '--push');
    expect(status).toBe(3);
    expect(stderr).toContain('PUSH_REFUSED');
    expect(stderr).toContain('RUN_ODD');
    expect(stderr).toContain('1 record set apart');
    const [refused, ...rest] = await tray(test);
    expect(rest).toEqual([]);
    expect(refused).toMatchObject({ where: 'refused', state: 'on deck', why: { code: 'RUN_ODD' } });

    expect((await test.steelyard('push')).stderr).toContain('nothing waits');
    expect(server.to('/runs')).toHaveLength(1);
    const shown = await test.steelyard('tray', '--format', 'table');
    expect(shown.stdout).toMatch(/refused\s+buoy, on deck/);
    expect(shown.stdout).toContain('no body is so');
    expect((await test.steelyard('tray', '--again', refused!.id.slice(0, 8))).status).toBe(0);
    expect((await test.steelyard('push')).status).toBe(0);
    expect([...server.runs.keys()]).toEqual([refused!.id]);
  });

  it('finds the one record that makes the server refuse a whole batch', async () => {
    const server = await PushServer.start();
    server.always(({ path, body }) =>
      path === '/runs' && body.includes('"state":"afloat"')
        ? problem(422, 'PUSH_SHAPE', 'expected a body')
        : undefined,
    );
    const test = pusher(server);
    expect((await test.steelyard('run', 'buoy.yaml', '--push')).status).toBe(3);
    expect([...server.runs.values()].map((r) => r.state)).toEqual(['on deck']);
    expect((await tray(test)).map((r) => [r.where, r.state, r.why?.code])).toEqual([
      ['refused', 'afloat', 'PUSH_SHAPE'],
    ]);
  });

  it.each([
    [401, 'PUSH_TOKEN', /STEELYARD_TOKEN/],
    [403, 'PUSH_FORBIDDEN', /scope push/],
    [404, 'PUSH_PROJECT', /heron/],
    [307, 'PUSH_ANSWER', /elsewhere\.example\.org/],
    // A proxy's page is not the server's word: nothing is set apart for it.
    [413, 'PUSH_ANSWER', /status 413/],
  ])('loses nothing where the whole request gets %i, and says what to mend', async (code, fault, says) => {
    const server = await PushServer.start();
    server.always(() => ({ status: code, headers: { location: 'https://elsewhere.example.org/' } }));
    const test = pusher(server);
    const { status, stderr } = await test.steelyard('run', 'buoy.yaml', '--push');
    expect([status, server.asked.length]).toEqual([3, 1]);
    expect(stderr).toContain(fault);
    expect(stderr).toMatch(says);
    expect((await tray(test)).map((r) => r.where)).toEqual(['waiting', 'waiting']);
    server.healed();
    expect((await test.steelyard('push')).status).toBe(0);
    expect(server.runs.size).toBe(2);
  });

  it('takes an answer that is not of the contract for no acknowledgement', async () => {
    const server = await PushServer.start();
    server.next('/runs', { status: 200, json: { hello: 'from the proxy' } });
    const test = pusher(server);
    const { status, stderr } = await test.steelyard('run', 'buoy.yaml', '--push');
    expect([status, stderr]).toEqual([3, expect.stringContaining('PUSH_ANSWER')]);
    expect(await tray(test)).toHaveLength(2);
  });

  it('says 1 for a broken limit even where the push failed, and tells of the tray', async () => {
    const test = pusher(await nobody()).file('buoy.yaml', HEAVY);
    const { status, stderr } = await test.steelyard('check', 'buoy.yaml', '--push', '--retries', '0');
    expect([status, stderr]).toEqual([1, expect.stringContaining('waiting in the tray')]);
    expect(await tray(test)).toHaveLength(2);
  });

  it.each(['buoy.yaml/tray', '/proc/no-tray'])(
    'sends from memory where the tray cannot be made, and says that nothing is kept: %s',
    async (folder) => {
      const server = await PushServer.start();
      const test = pusher(server, { STEELYARD_TRAY: folder });
      const sent = await test.steelyard('run', 'buoy.yaml', '--push');
      expect([sent.status, server.runs.size]).toEqual([0, 2]);
      expect(sent.stderr).toContain('TRAY_NOT_KEPT');
      server.stop();
      const lost = await test.steelyard('run', 'buoy.yaml', '--push', '--retries', '0');
      expect(lost.status).toBe(3);
      expect(lost.stderr).toContain('2 records neither sent nor kept');
    },
  );

  it('says that the disk is full, keeps no half of a record, and sends all the same', async (context) => {
    const server = await PushServer.start();
    const test = pusher(server).file('tray/.keep', '');
    const folder = join(test.folder, 'tray');
    const mounted = await execa('mount', ['-t', 'tmpfs', '-o', 'size=16k', 'tmpfs', folder], {
      reject: false,
    });
    if (mounted.failed) context.skip('a disk of 16 kB takes the right to mount one');
    onTestFinished(async () => void (await execa('umount', [folder])));
    const { status, stderr } = await test
      .withEnv({ STEELYARD_TRAY: folder })
      .steelyard('run', 'buoy.yaml', '--push');
    expect([status, server.runs.size]).toEqual([0, 2]);
    expect(stderr).toMatch(/TRAY_NOT_KEPT.*the disk\s+is full/s);
    expect(readdirSync(join(folder, 'waiting'))).toEqual([]);
  });

  it('shows the token nowhere, not even where the server repeats it', async () => {
    const server = await PushServer.start();
    server.always(() => problem(403, 'NO', `the token ${TOKEN} may not`));
    const test = pusher(server);
    const run = await test.steelyard('run', 'buoy.yaml', '--push');
    const list = await test.steelyard('tray');
    expect(run.stderr).toContain('may not');
    expect(run.stdout + run.stderr + list.stdout + list.stderr).not.toContain(TOKEN);
    const kept = readdirSync(trayPath(test), { recursive: true, encoding: 'utf8' })
      .map((name) => trayPath(test, name))
      .filter((path) => statSync(path).isFile());
    for (const path of kept) expect(readFileSync(path, 'utf8')).not.toContain(TOKEN);
  });

  it.each([
    [{ STEELYARD_SERVER: '' }, 'CALL_SERVER'],
    [{ STEELYARD_SERVER: 'http://steelyard.example.org' }, 'CALL_SERVER'],
    [{ STEELYARD_SERVER: 'steelyard.example.org' }, 'CALL_SERVER'],
    [{ STEELYARD_PROJECT: '' }, 'CALL_PROJECT'],
    [{ STEELYARD_PROJECT: '../heron' }, 'CALL_PROJECT'],
    [{ STEELYARD_TOKEN: '' }, 'CALL_TOKEN'],
    [{ STEELYARD_TOKEN: 'two words, no token' }, 'CALL_TOKEN'],
  ])('says before it computes what is missing of where to push: %j', async (env, code) => {
    const test = pusher({ url: 'https://steelyard.example.org' }, env);
    const { status, stdout, stderr } = await test.steelyard('run', 'buoy.yaml', '--push');
    expect([status, stdout, stderr]).toEqual([2, '', expect.stringContaining(code)]);
    expect(stderr).not.toContain('no token');
  });

  it('says the reason for refusing http:// to another machine, and takes --insecure for an answer', async () => {
    const test = pusher({ url: 'http://no-such-machine.invalid' });
    const refused = await test.steelyard('run', 'buoy.yaml', '--push', '--retries', '0');
    expect([refused.status, refused.stderr]).toEqual([2, expect.stringContaining('read the token')]);
    const tried = await test.steelyard('run', 'buoy.yaml', '--push', '--retries', '0', '--insecure');
    expect([tried.status, tried.stderr]).toEqual([3, expect.stringContaining('PUSH_UNREACHABLE')]);
  });

  it('does not let --server pass without --push', async () => {
    const { status, stderr } = await pusher({ url: '' }).steelyard(
      'run',
      'buoy.yaml',
      '--server',
      'https://x',
    );
    expect([status, stderr]).toEqual([2, expect.stringContaining('CALL_PUSH')]);
  });
});

describe('steelyard push RECORD', () => {
  it('sends records of JSON and NDJSON files, with the mesh from beside them', async () => {
    const server = await PushServer.start();
    const test = pusher(server).file('wedge.yaml', WITH_MESH).file('wedge.stl', CUBE);
    await test.steelyard('run', 'wedge.yaml', '-o', 'wedge.json');
    await test.steelyard('run', 'buoy.yaml', '-o', 'buoy.ndjson');
    const { status, stderr } = await test.steelyard('push', 'wedge.json', 'buoy.ndjson');
    expect([status, server.runs.size, server.inputs.size]).toEqual([0, 3, 4]);
    expect(stderr).not.toContain('warning');
  });

  it('sends a record without a mesh that has changed since, and says which', async () => {
    const server = await PushServer.start();
    const test = pusher(server).file('wedge.yaml', WITH_MESH).file('wedge.stl', CUBE);
    await test.steelyard('run', 'wedge.yaml', '-o', 'wedge.json');
    test.file('wedge.stl', CUBE.replaceAll('10', '11'));
    const { status, stderr } = await test.steelyard('push', 'wedge.json');
    expect([status, server.runs.size, server.inputs.size]).toEqual([0, 1, 1]);
    expect(stderr).toContain('PUSH_INPUT_MISSING: wedge.stl');
  });

  it('reads no file outside the project, whatever a record says', async () => {
    const server = await PushServer.start();
    const outside = new CliTest().file('secret.stl', CUBE);
    const test = pusher(server).file('wedge.yaml', WITH_MESH).file('wedge.stl', CUBE);
    await test.steelyard('run', 'wedge.yaml', '-o', 'wedge.json');
    const path = join(outside.folder, 'secret.stl');
    test
      .file('wedge.json', test.read('wedge.json').replaceAll('"wedge.stl"', JSON.stringify(path)))
      .file('wedge.stl', '');
    const { stderr } = await test.steelyard('push', 'wedge.json');
    expect(stderr).toContain('PUSH_INPUT_MISSING');
    expect(server.inputs.size).toBe(1);
  });

  it('refuses a record whose text was changed by hand, and keeps nothing of it', async () => {
    const server = await PushServer.start();
    const test = pusher(server);
    await test.steelyard('run', 'buoy.yaml', '-o', 'buoy.json');
    test.file('buoy.json', test.read('buoy.json').replace('diameter: 90', 'diameter: 91'));
    const { status, stderr } = await test.steelyard('push', 'buoy.json');
    expect([status, stderr]).toEqual([2, expect.stringContaining('RECORD_INPUT')]);
    expect([server.asked, await tray(test)]).toEqual([[], []]);
  });

  it('adds no second entry for a record that waits already', async () => {
    const server = await PushServer.start();
    server.always(() => ({ status: 503 }));
    const test = pusher(server);
    await test.steelyard('run', 'buoy.yaml', '-o', 'buoy.json');
    for (let i = 0; i < 2; i++) {
      const { status } = await test.steelyard('push', 'buoy.json', '--retries', '0');
      expect(status).toBe(3);
    }
    const waiting = await tray(test);
    expect(waiting).toHaveLength(2);
    server.healed();
    expect((await test.steelyard('push', 'buoy.json')).status).toBe(0);
    expect([...server.runs.keys()]).toEqual(waiting.map((r) => r.id));
  });

  it('sends many records in batches of the size that the contract bounds', async () => {
    const server = await PushServer.start();
    const test = pusher(server);
    const count = 2 * BATCH_AT_MOST + 5;
    test.file('many.ndjson', await manyRecords(test, count));
    expect((await test.steelyard('push', 'many.ndjson')).status).toBe(0);
    expect(server.to('/runs').map(({ body }) => JSON.parse(body.toString()).runs.length)).toEqual([
      50, 50, 5,
    ]);
    expect(server.runs.size).toBe(count);
  });

  it('answers a wrong call with status 2', async () => {
    const test = pusher({ url: 'https://steelyard.example.org' }).file('other.json', '{}');
    expect((await test.steelyard('push', 'none.json')).stderr).toContain('FILE_MISSING');
    expect((await test.steelyard('push', 'other.json')).stderr).toContain('RECORD_SHAPE');
    const tries = await test.steelyard('push', '--retries', 'many');
    expect([tries.status, tries.stderr]).toEqual([2, expect.stringContaining('whole number')]);
  });
});

describe('the tray', () => {
  it('says that it is empty, without knowing any server', async () => {
    const test = new CliTest();
    expect(await test.steelyard('push')).toMatchObject({ status: 0, stderr: 'nothing waits in the tray\n' });
    expect(await test.steelyard('tray')).toMatchObject({ status: 0, stdout: '[]\n' });
  });

  it('sends nothing to another server or project than it was pushed to, unless told so', async () => {
    const test = pusher(await nobody());
    await test.steelyard('run', 'buoy.yaml', '--push', '--retries', '0');
    const server = await PushServer.start();
    test.withEnv({ STEELYARD_SERVER: server.url });
    const { status, stderr } = await test.steelyard('push');
    expect([status, server.asked]).toEqual([3, []]);
    expect(stderr).toContain('2 records waiting for project heron');
  });

  it('loses and doubles nothing where several processes send it at once', async () => {
    const test = pusher(await nobody());
    await test.steelyard('run', 'buoy.yaml', '--push', '--retries', '0');
    const server = await PushServer.start();
    test.withEnv({ STEELYARD_SERVER: server.url });
    test.file('many.ndjson', await manyRecords(test, 120));
    server.always(() => ({ status: 503 }));
    await test.steelyard('push', 'many.ndjson', '--retries', '0');
    server.healed();
    const both = await Promise.all([0, 1, 2].map(() => test.steelyard('push', '--redirect')));
    expect(both.map((one) => one.status)).toEqual([0, 0, 0]);
    expect(server.runs.size).toBe(122);
    expect(new Set(server.pushes.values())).toEqual(new Set([1]));
    expect(await tray(test)).toEqual([]);
  });

  it('takes over what a process that died was sending', async () => {
    const server = await PushServer.start();
    server.always(() => 'silent');
    const test = pusher(server);
    const child = test.start('run', 'buoy.yaml', '--push');
    await until(() => server.asked.length > 0);
    expect((await tray(test)).map((r) => r.where)).toEqual(['sending', 'sending']);
    child.kill('SIGKILL');
    await child;
    expect((await tray(test)).map((r) => r.where)).toEqual(['waiting', 'waiting']);
    server.healed();
    expect((await test.steelyard('push')).status).toBe(0);
    expect(server.runs.size).toBe(2);
  });

  it('is whole after Ctrl-C, which exits with 130 and says where the records are', async () => {
    const server = await PushServer.start();
    server.always(() => 'silent');
    const test = pusher(server);
    const child = test.start('run', 'buoy.yaml', '--push');
    await until(() => server.asked.length > 0);
    child.kill('SIGINT');
    const { exitCode, stderr } = await child;
    expect([exitCode, stderr]).toEqual([130, expect.stringContaining('waits in the tray')]);
    server.healed();
    expect((await test.steelyard('push')).status).toBe(0);
    expect(server.runs.size).toBe(2);
  });

  it('drops a refused record, and a waiting one only when told twice', async () => {
    const test = pusher(await nobody());
    await test.steelyard('run', 'buoy.yaml', '--push', '--retries', '0');
    const [one] = await tray(test);
    const refused = await test.steelyard('tray', '--drop', one!.id);
    expect([refused.status, refused.stderr]).toEqual([2, expect.stringContaining('CALL_TRAY_ID')]);
    expect((await test.steelyard('tray', '--drop', 'ffffffff-no')).status).toBe(2);
    expect(await tray(test)).toHaveLength(2);
    expect((await test.steelyard('tray', '--drop', one!.id, '--even-waiting')).status).toBe(0);
    expect(await tray(test)).toHaveLength(1);
  });

  it('passes over what a crash left half made, and what it does not know', async () => {
    const server = await PushServer.start();
    const test = pusher(await nobody());
    await test.steelyard('run', 'buoy.yaml', '--push', '--retries', '0');
    const [one, two] = readdirSync(trayPath(test, 'waiting'));
    writeFileSync(trayPath(test, 'waiting', one!, 'about.json'), '{"schema":"steelyard-tr');
    writeFileSync(trayPath(test, 'waiting', 'notes.txt'), 'mine');
    test.withEnv({ STEELYARD_SERVER: server.url });
    expect((await test.steelyard('push', '--redirect')).status).toBe(0);
    expect([...server.runs.keys()]).toEqual([two]);
    expect(readdirSync(trayPath(test, 'waiting')).sort()).toEqual([one, 'notes.txt'].sort());
  });
});

async function until(holds: () => boolean): Promise<void> {
  while (!holds()) await new Promise((resolve) => setTimeout(resolve, 20));
}

/** NDJSON of one record as if it had been computed many times. */
async function manyRecords(test: CliTest, count: number): Promise<string> {
  const { stdout } = await test.steelyard('run', 'buoy.yaml', '--state', 'afloat');
  const [record] = JSON.parse(stdout);
  return Array.from({ length: count }, (_, i) => {
    const at = new Date(Date.UTC(2030, 0, 1, 0, i)).toISOString();
    return JSON.stringify({ ...record, provenance: { ...record.provenance, at } });
  }).join('\n');
}
