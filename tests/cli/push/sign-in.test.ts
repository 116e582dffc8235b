import { chmodSync, existsSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { execa } from 'execa';
import { describe, expect, it } from 'vitest';
import { CliTest } from '../../helpers/cli-test.ts';
import { PushServer, TOKEN } from '../../helpers/push-server.ts';

const ONE = 'assembly: one\nparts: [ { name: p, solid: particle, mass: 1 } ]\n';
const FILE = '.config/steelyard/server.json';
const COMMAND = join(import.meta.dirname, '..', '..', '..', 'dist', 'cli', 'steelyard.js');

const mode = (test: CliTest, name: string) => statSync(join(test.folder, name)).mode & 0o777;
const place = (server: PushServer) => ['--server', `${server.url}/`, '--project', 'heron'];

async function signedIn(server: PushServer): Promise<CliTest> {
  const test = new CliTest().file('one.yaml', ONE).withEnv({ STEELYARD_PUSH_WAIT_MS: '5' });
  const { status, stderr } = await test.withInput(`${TOKEN}\n`).steelyard('sign-in', ...place(server));
  expect([status, stderr]).toEqual([0, expect.stringContaining('project Heron, as engineer')]);
  return test;
}

describe('steelyard sign-in', () => {
  it('keeps a token that the server knows for its owner alone, and a push then needs nothing else', async () => {
    const server = await PushServer.start();
    const test = await signedIn(server);
    expect(server.asked.map(({ method, path }) => [method, path])).toEqual([['GET', '']]);
    expect(JSON.parse(test.read(FILE))).toEqual({ server: server.url, project: 'heron', token: TOKEN });
    expect([mode(test, FILE), mode(test, '.config/steelyard')]).toEqual([0o600, 0o700]);
    expect((await test.steelyard('run', 'one.yaml', '--push')).status).toBe(0);
    expect(server.runs.size).toBe(1);
  });

  it('never prints the token', async () => {
    const server = await PushServer.start();
    const test = await signedIn(server);
    const again = await test.steelyard('sign-in');
    const wrong = await test.withInput('another-token-that-is-wrong').steelyard('sign-in');
    expect(again.status).toBe(0);
    expect(wrong.stderr).toContain('PUSH_TOKEN');
    expect(again.stdout + again.stderr + wrong.stdout).not.toContain(TOKEN);
    expect(wrong.stdout + wrong.stderr).not.toContain('another-token');
  });

  it('keeps nothing where the server does not know the token or does not answer', async () => {
    const server = await PushServer.start();
    const test = new CliTest()
      .withInput('another-token-that-is-wrong')
      .withEnv({ STEELYARD_PUSH_WAIT_MS: '5' });
    const wrong = await test.steelyard('sign-in', ...place(server));
    expect([wrong.status, wrong.stderr]).toEqual([3, expect.stringContaining('nothing was kept')]);
    server.stop();
    expect((await test.steelyard('sign-in', ...place(server), '--retries', '1')).status).toBe(3);
    expect(existsSync(join(test.folder, FILE))).toBe(false);
  });

  it.each(['', 'two words', 'short'])('refuses what is no token: %j', async (input) => {
    const server = await PushServer.start();
    const { status, stderr } = await new CliTest().withInput(input).steelyard('sign-in', ...place(server));
    expect([status, stderr, server.asked]).toEqual([2, expect.stringContaining('CALL_TOKEN'), []]);
  });

  it('refuses a file that others may read, for a push and for signing in, and forgets it when told', async () => {
    const server = await PushServer.start();
    const test = await signedIn(server);
    chmodSync(join(test.folder, FILE), 0o640);
    for (const args of [['run', 'one.yaml', '--push'], ['sign-in']]) {
      const { status, stderr } = await test.steelyard(...args);
      expect([status, stderr]).toEqual([2, expect.stringContaining('FILE_OPEN_TO_OTHERS')]);
    }
    expect((await test.steelyard('sign-in', '--forget')).status).toBe(0);
    expect(existsSync(join(test.folder, FILE))).toBe(false);
  });

  it('says so where the file is damaged, without what is in it', async () => {
    const server = await PushServer.start();
    const test = await signedIn(server);
    test.file(FILE, `{ "token": "${TOKEN}"`);
    const { status, stderr } = await test.steelyard('run', 'one.yaml', '--push');
    expect([status, stderr]).toEqual([2, expect.stringContaining('FILE_SIGN_IN_DAMAGED')]);
    expect(stderr).not.toContain(TOKEN);
  });

  it('lets the environment go before the file', async () => {
    const server = await PushServer.start();
    const test = await signedIn(server);
    test.withEnv({ STEELYARD_TOKEN: 'a-token-from-the-environment' });
    const { status, stderr } = await test.steelyard('run', 'one.yaml', '--push');
    expect([status, stderr]).toEqual([3, expect.stringMatching(/PUSH_TOKEN.*STEELYARD_TOKEN/s)]);
    expect(server.asked.at(-1)!.headers.authorization).toBe('Bearer a-token-from-the-environment');
  });

  it('gives the kept token to no other server', async () => {
    const server = await PushServer.start();
    const other = await PushServer.start();
    const test = await signedIn(server);
    const { status, stderr } = await test.steelyard('run', 'one.yaml', '--push', '--server', other.url);
    expect([status, stderr, other.asked]).toEqual([2, expect.stringContaining('CALL_TOKEN'), []]);
  });

  it('asks at a terminal without showing what is typed', async () => {
    const server = await PushServer.start();
    const test = new CliTest();
    const typed = `sleep 1; printf '%s\\r' '${TOKEN}'; sleep 1`;
    const { stdout, failed } = await execa(
      'sh',
      [
        '-c',
        `{ ${typed}; } | script -qec '"${process.execPath}" "${COMMAND}" sign-in ${place(server).join(' ')}' /dev/null`,
      ],
      { cwd: test.folder, reject: false, env: { HOME: test.folder, STEELYARD_TOKEN: '' } },
    );
    // script(1) is of an essential package of Debian: a failure is the sign-in's own.
    expect(failed, stdout).toBe(false);
    expect(stdout).toContain('token for project heron');
    expect(stdout).toContain('signed in to');
    expect(stdout).not.toContain(TOKEN);
    expect(JSON.parse(test.read(FILE)).token).toBe(TOKEN);
  });
});
