import { chmodSync, cpSync, mkdirSync, readdirSync, symlinkSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { execa, execaNode } from 'execa';
import { describe, expect, it } from 'vitest';
import { CliTest } from '../helpers/cli-test.ts';

const COMMAND = join(import.meta.dirname, '..', '..', 'dist', 'cli', 'steelyard.js');
const ONE = 'assembly: one\nparts: [ { name: p, solid: particle, mass: 1 } ]\n';

/** Nothing that a user sees may look like a crash. */
function expectNoStack(text: string): void {
  expect(text).not.toMatch(/^\s+at .+\(.+:\d+:\d+\)|node:internal|\.js:\d+:\d+/m);
}

describe('the command line', () => {
  it('prints the version of package.json', async () => {
    const { version } = (await import('../../package.json', { with: { type: 'json' } })).default;
    const { stdout, status } = await new CliTest().steelyard('--version');
    expect([stdout, status]).toEqual([`${version}\n`, 0]);
  });

  it.each([
    ['--help'],
    ['run', '--help'],
    ['check', '--help'],
    ['diff', '--help'],
    ['why', '--help'],
    ['push', '--help'],
    ['tray', '--help'],
    ['sign-in', '--help'],
    [],
  ])('says what it takes: %s %s', async (...args) => {
    const { stdout, stderr } = await new CliTest().steelyard(...args);
    expect(stdout + stderr).toContain('Usage: steelyard');
    for (const line of (stdout + stderr).split('\n')) expect([...line].length, line).toBeLessThanOrEqual(80);
  });

  it.each([
    [['rnu', 'x.yaml'], /did you mean/i],
    [['run'], /missing required argument/],
    [['run', 'no-such.yaml'], /FILE_MISSING/],
    [['run', 'one.yaml', '--format', 'pdf'], /allowed choices/i],
    [['run', 'one.yaml', '--units', 'parsec'], /UNITS_UNKNOWN/],
    [['run', 'one.yaml', '--frame', 'nose'], /CALL_FRAME/],
    [['run', 'one.yaml', '--about', '1,2', '--format', 'table'], /CALL_ABOUT/],
    [['run', 'one.yaml', '--parts', 'some', '--format', 'table'], /CALL_PARTS/],
    [['run', 'one.yaml', '--about', 'foo'], /CALL_ABOUT/],
    [['run', 'one.yaml', '--about', '1e300,0,0'], /CALL_ABOUT/],
    [['check', 'one.yaml', '--parts', 'x', '--format', 'csv'], /CALL_PARTS/],
    [['check', 'one.yaml', '--as-of', '2026-02-30'], /CALL_DAY/],
    [['run', 'one.yaml', '--of', 'p', '--format', 'junit'], /CALL_OF.*junit/s],
    [['run', 'one.yaml', '--of', 'p', '-o', 'x.md', '-o', 'x.xml'], /CALL_OF.*junit/s],
    [['diff', 'one.yaml', 'one.yaml', '--units', 'furlong'], /UNITS_UNKNOWN/],
    [['diff', 'one.yaml', 'one.yaml', '--units', 'furlong', '-f', 'table'], /UNITS_UNKNOWN/],
    [['diff', 'one.yaml', 'one.yaml', '--parts', 'x'], /CALL_PARTS/],
    [['diff', 'one.yaml', 'one.yaml', '--quantity', 'foo'], /CALL_QUANTITY.*known: all, mass, centre.x/s],
    [['diff', 'one.yaml', 'one.yaml', '--quantity', 'tilt.x'], /CALL_QUANTITY/],
    [['run', 'one.yaml', '-o', 'x.bin'], /CALL_OUTPUT_FORMAT/],
    [['run', 'one.yaml', '-o', 'no/such/folder/x.json'], /FILE_NOT_WRITTEN/],
    [['run', '.'], /FILE_UNREADABLE/],
  ])('answers a wrong call with exit status 2 and how to mend it: %j', async (args, says) => {
    const { stderr, stdout, status } = await new CliTest().file('one.yaml', ONE).steelyard(...args);
    expect(status).toBe(2);
    expect(stderr).toMatch(says);
    expect(stdout).toBe('');
    expectNoStack(stderr);
  });

  it('points at every fault of the file in one go, each with file:line:column, and prints no data', async () => {
    const { stderr, stdout, status } = await new CliTest()
      .file(
        'bad.yaml',
        `
        assembly: bad
        units: { length: mm, mass: g }
        parts:
          - { name: a, solid: { box: { size: [ 1, 2, 3 g ] } }, mass: 1 }
          - { name: b, solid: { tube: { diameter: 10, wall: 1, length: 5 parsec } }, mass: 1 }
          - { name: c, solid: particle, mass: 2 mm }
      `,
      )
      .steelyard('run', 'bad.yaml');
    expect([stdout, status]).toEqual(['', 2]);
    expect(stderr).toContain('bad.yaml:4:46');
    expect(stderr).toContain('bad.yaml:5:');
    expect(stderr).toContain('bad.yaml:6:');
    expectNoStack(stderr);
  });

  it('escapes control characters of the input on the terminal', async () => {
    const { stderr, stdout } = await new CliTest()
      .file('e.yaml', 'assembly: "x\\e[31mred"\nparts: [ { name: "p\\a", solid: particle, mass: 1 } ]\n')
      .steelyard('run', 'e.yaml', '--format', 'table');
    // biome-ignore lint/suspicious/noControlCharactersInRegex: the very thing that must not be there
    expect(stdout + stderr).not.toMatch(/[\u0007\u001b]/);
  });

  it('is silent on stderr when quiet, and colours nothing under NO_COLOR', async () => {
    const yaml = `${ONE}growth: { estimated: 10 % }\n`;
    const test = new CliTest().file('one.yaml', yaml).withEnv({ NO_COLOR: '1', FORCE_COLOR: '' });
    expect((await test.steelyard('run', 'one.yaml')).stderr).toContain('GROWTH_NO_MATURITY');
    expect((await test.steelyard('--quiet', 'run', 'one.yaml')).stderr).toBe('');
    expect((await test.steelyard('run', 'one.yaml', '-f', 'table')).stdout).not.toContain('\u001b[');
  });

  it('ends quietly when the reader of its pipe goes away', async () => {
    const test = new CliTest().file('one.yaml', ONE);
    const { stdout, stderr } = await execa(
      'sh',
      ['-c', `"${process.execPath}" "${COMMAND}" run one.yaml | head -c 5`],
      { cwd: test.folder, reject: false },
    );
    expect([stdout.slice(0, 1), stderr]).toEqual(['[', '']);
  });

  it.each([['run one.yaml'], ['solids'], ['--version'], ['--help']])(
    'says so when standard output is on a full disk: %s',
    async (call) => {
      const { stderr, exitCode } = await execa(
        'sh',
        ['-c', `"${process.execPath}" "${COMMAND}" ${call} > /dev/full`],
        { cwd: new CliTest().file('one.yaml', ONE).folder, reject: false },
      );
      expect([exitCode, stderr]).toEqual([
        2,
        expect.stringMatching(/^error FILE_NOT_WRITTEN: .*standard output.*the disk is full\nhint: .*$/),
      ]);
    },
  );

  it('keeps an include inside the project, symbolic links resolved', async () => {
    const outside = new CliTest().file('secret.yaml', ONE);
    const test = new CliTest()
      .file('top.yaml', 'assembly: t\nparts: [ { name: p, include: link.yaml } ]\n')
      .file('up.yaml', 'assembly: t\nparts: [ { name: p, include: ../up.yaml } ]\n')
      .file('gone.yaml', 'assembly: t\nparts: [ { name: p, include: none.yaml } ]\n');
    symlinkSync(join(outside.folder, 'secret.yaml'), join(test.folder, 'link.yaml'));
    const link = await test.steelyard('run', 'top.yaml');
    expect([link.status, link.stderr]).toEqual([2, expect.stringContaining('FILE_OUTSIDE_PROJECT')]);
    expect(link.stderr).toContain('top.yaml:2:');
    const gone = await test.steelyard('run', 'gone.yaml');
    expect(gone.stderr).toContain('FILE_MISSING');
    expect(gone.stderr).toContain('gone.yaml:2:');
    mkdirSync(join(test.folder, 'folder.yaml'));
    const folder = await test
      .file('down.yaml', 'assembly: t\nparts: [ { name: p, include: folder.yaml } ]\n')
      .steelyard('run', 'down.yaml');
    expect(folder.stderr).toContain('FILE_UNREADABLE');
    expect(folder.stderr).toContain('down.yaml:2:30');
    const up = await test.steelyard('run', 'up.yaml');
    expect(up.status).toBe(2);
    expect(up.stderr).toMatch(/FILE_MISSING|FILE_OUTSIDE_PROJECT/);
  });

  it('refuses a text that is too large, not UTF-8 or a mesh, at once', async () => {
    const test = new CliTest()
      .file('huge.yaml', new Uint8Array(100 * 2 ** 20).fill(32))
      .file('latin.yaml', new Uint8Array([0x61, 0xe9, 0x0a]))
      .file('zip.yaml', new Uint8Array([0x50, 0x4b, 3, 4, 0, 0]));
    const huge = await test.steelyard('run', 'huge.yaml');
    expect([huge.status, huge.stderr]).toEqual([2, expect.stringContaining('TEXT_TOO_LARGE')]);
    expect((await test.steelyard('run', 'latin.yaml')).stderr).toContain('TEXT_NOT_UTF8');
    expect((await test.steelyard('run', 'zip.yaml')).status).toBe(2);
  });

  it('says so when a file may not be read', async () => {
    const test = new CliTest().file('one.yaml', ONE);
    // Root may read everything: the command then runs as nobody, from a copy that nobody can reach.
    cpSync(dirname(COMMAND), join(test.folder, 'cli'), { recursive: true });
    chmodSync(test.folder, 0o755);
    chmodSync(join(test.folder, 'one.yaml'), 0);
    const { stderr, exitCode } = await execaNode(
      join(test.folder, 'cli', 'steelyard.js'),
      ['run', 'one.yaml'],
      { cwd: test.folder, reject: false, ...(process.getuid?.() === 0 && { uid: 65_534, gid: 65_534 }) },
    );
    expect([exitCode, stderr]).toEqual([2, expect.stringContaining('permission is denied')]);
  });

  it('leaves no half-written file behind when it is interrupted', async () => {
    const parts = Array.from(
      { length: 20_000 },
      (_, i) => `  - { name: p${i}, solid: particle, mass: 1, at: [ ${i}, 0, 0 ] }`,
    );
    const test = new CliTest().file('many.yaml', `assembly: many\nparts:\n${parts.join('\n')}\n`);
    const child = execaNode(COMMAND, ['run', 'many.yaml', '-o', 'out.json'], {
      cwd: test.folder,
      reject: false,
    });
    setTimeout(() => child.kill('SIGINT'), 350);
    const { signal, exitCode } = await child;
    expect(signal === 'SIGINT' || exitCode === 130 || exitCode === 0).toBe(true);
    const left = readdirSync(test.folder).filter((name) => name !== 'many.yaml');
    // Either nothing, or the whole file.
    if (left.length > 0) {
      expect(left).toEqual(['out.json']);
      expect(() => JSON.parse(test.read('out.json'))).not.toThrow();
    }
  });
});

describe('steelyard new, schema, solids, completion', () => {
  it('writes a starter that runs and passes its check, and never over a file', async () => {
    const test = new CliTest();
    expect((await test.steelyard('new', 'machine.yaml')).status).toBe(0);
    const check = await test.steelyard('check', 'machine.yaml');
    expect([check.status, check.stderr]).toEqual([0, '']);
    const again = await test.steelyard('new', 'machine.yaml');
    expect([again.status, again.stderr]).toEqual([2, expect.stringContaining('FILE_EXISTS')]);
  });

  it('prints a JSON Schema that names every solid', async () => {
    const schema = await new CliTest().json<object>('schema');
    const text = JSON.stringify(schema);
    for (const name of ['half_cylinder', 'spherical_cap', 'polyhedron', 'conical_shell', 'mesh'])
      expect(text).toContain(`"${name}"`);
  });

  it('lists the solids with keys and origin, and one in full', async () => {
    const test = new CliTest();
    const list = await test.steelyard('solids');
    expect(list.stdout).toContain('spherical_cap');
    for (const name of [[], ['mesh'], ['revolve'], ['polyhedron']])
      for (const line of (await test.steelyard('solids', ...name)).stdout.split('\n'))
        expect([...line].length, line).toBeLessThanOrEqual(80);
    const one = await test.steelyard('solids', 'tube');
    expect(one.stdout).toContain('bore');
    expect((await test.steelyard('solids', 'tueb')).stderr).toContain("did you mean 'tube'?");
  });

  it.each(['bash', 'zsh', 'fish'])('prints completion that %s can read', async (shell) => {
    const test = new CliTest();
    const { stdout, status } = await test.steelyard('completion', shell);
    expect(status).toBe(0);
    for (const name of ['run', 'check', 'diff', 'why', '--three-view'.replace(/^--/, '')])
      expect(stdout).toContain(name);
    test.file('script', stdout);
    const { exitCode } = await execa(shell, ['-n', 'script'], { cwd: test.folder, reject: false });
    // Where the shell is not installed there is nothing to ask.
    expect([0, undefined]).toContain(exitCode);
  });

  it('completes commands and options in bash', async () => {
    const test = new CliTest();
    test.file('script', (await test.steelyard('completion', 'bash')).stdout);
    const { stdout } = await execa(
      'bash',
      [
        '-c',
        // biome-ignore lint/suspicious/noTemplateCurlyInString: the shell's own braces
        'source ./script; COMP_WORDS=(steelyard ch); COMP_CWORD=1; _steelyard; echo "${COMPREPLY[@]}"; COMP_WORDS=(steelyard run --thr); COMP_CWORD=2; _steelyard; echo "${COMPREPLY[@]}"',
      ],
      { cwd: test.folder },
    );
    expect(stdout).toBe('check\n--three-view');
  });

  it('works from any folder, by a link to it, as npx and a global install do', async () => {
    const test = new CliTest().file('one.yaml', ONE);
    const link = join(test.folder, 'steelyard-link');
    symlinkSync(COMMAND, link);
    const { stdout } = await execa(process.execPath, [link, '--version'], { cwd: tmpdir() });
    expect(stdout).toMatch(/^\d+\.\d+\.\d+$/);
  });
});
