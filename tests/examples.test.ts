import { execFileSync, spawnSync } from 'node:child_process';
import { cpSync, existsSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { load } from 'js-yaml';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

const root = join(dirname(fileURLToPath(import.meta.url)), '..');
const command = join(root, 'dist', 'cli', 'steelyard.js');

/** A project of its own in git, with the examples as a user would have them. */
let project: string;

beforeAll(() => {
  project = mkdtempSync(join(tmpdir(), 'steelyard-examples-'));
  cpSync(join(root, 'examples'), join(project, 'examples'), { recursive: true });
  const git = (...args: string[]) =>
    execFileSync('git', ['-c', 'user.name=test', '-c', 'user.email=test@example.org', ...args], {
      cwd: project,
      stdio: 'pipe',
    });
  git('init', '-q', '-b', 'main');
  git('add', '.');
  git('commit', '-q', '-m', 'examples');
});

afterAll(() => rmSync(project, { recursive: true, force: true }));

/** The environment without what a CI or a terminal would add to the output. */
const PLAIN = { PATH: process.env.PATH, HOME: process.env.HOME, NO_COLOR: '1', LC_ALL: 'C.UTF-8' };

function steelyard(args: readonly string[], cwd = project) {
  const { status, stdout, stderr } = spawnSync(process.execPath, [command, ...args], {
    cwd,
    env: PLAIN,
    encoding: 'utf8',
  });
  return { status, stdout, stderr };
}

function shell(script: string) {
  const { status, stdout, stderr } = spawnSync(
    'sh',
    ['-c', `steelyard() { "${process.execPath}" "${command}" "$@"; }\n${script}`],
    { cwd: project, env: PLAIN, encoding: 'utf8' },
  );
  return { status, stdout, stderr };
}

const assemblies = ['survey-drone', 'spinner', 'two-link-arm'].flatMap((folder) =>
  readdirSync(join(root, 'examples', folder))
    .filter((name) => name.endsWith('.yaml'))
    .map((name) => `examples/${folder}/${name}`),
);

/** Variants that break a limit on purpose, and the limits they break. */
const BROKEN: Readonly<Record<string, readonly string[]>> = {
  'examples/survey-drone/drone-heavy-payload.yaml': ['take-off mass'],
  'examples/spinner/sounder-shifted-battery.yaml': ['principal tilt', 'centre off axis'],
  'examples/two-link-arm/arm-long-reach.yaml': ['wall static moment'],
};

interface JudgedRecord {
  state: string;
  basic: {
    mass: number;
    centre: [number, number, number];
    inertia: { aboutCentre: number[][]; aboutOrigin: number[][] };
  };
  limits: { name: string; verdict: string; marginOfLimit: number | null; waiver: object | null }[];
  parts: { path: string }[];
  warnings: object[];
}

const roll = (...args: string[]): JudgedRecord[] =>
  JSON.parse(steelyard(['run', ...args, '--format', 'json']).stdout);

describe('the example assemblies', () => {
  it('are all here', () => {
    expect(assemblies).toEqual(expect.arrayContaining(Object.keys(BROKEN)));
    expect(assemblies.length).toBeGreaterThanOrEqual(9);
  });

  it.each(assemblies)('%s is judged as its heading says, without a warning', (file) => {
    const { status, stdout, stderr } = steelyard(['check', file, '--format', 'json']);
    const records: JudgedRecord[] = JSON.parse(stdout);
    const broken = records.flatMap((r) =>
      r.limits.filter((l) => l.verdict === 'outside' && !l.waiver).map((l) => l.name),
    );
    expect(broken).toEqual(BROKEN[file] ?? []);
    expect(status).toBe(file in BROKEN ? 1 : 0);
    expect(records.flatMap((r) => r.warnings)).toEqual([]);
    expect(stderr).toBe('');
  });

  it.each(['survey-drone/drone.yaml', 'spinner/sounder.yaml', 'two-link-arm/arm.yaml'])(
    '%s has a limit within a twentieth of its stop',
    (file) => {
      const margins = roll(`examples/${file}`).flatMap((r) => r.limits.map((l) => l.marginOfLimit ?? 1));
      expect(margins.some((m) => m >= 0 && m < 0.05)).toBe(true);
    },
  );

  it('the drone has about forty parts, a waiver and different tensors in its two states', () => {
    const [flight, stowed] = roll('examples/survey-drone/drone.yaml') as [JudgedRecord, JudgedRecord];
    const bodies = flight.parts.filter((p) => !/hole$|opening$/.test(p.path));
    expect(bodies.length).toBeGreaterThan(38);
    expect(bodies.length).toBeLessThan(48);
    expect(flight.limits.filter((l) => l.waiver).map((l) => l.name)).toEqual(['tail mass']);
    expect(stowed.basic.inertia.aboutCentre[0]![0]).toBeLessThan(
      0.5 * flight.basic.inertia.aboutCentre[0]![0]!,
    );
  });

  it('the mesh of the arm is what its script writes', async () => {
    const folder = join(root, 'examples/two-link-arm');
    const { bracketStl } = await import(join(folder, 'make-bracket.js'));
    expect(readFileSync(join(folder, 'bracket.stl'), 'utf8')).toBe(bracketStl());
  });
});

describe('hand checks, with lines of their own', () => {
  /** Mass, centre and moment about y through the elbow joint, of pieces along the forearm; mm, g, g·mm². */
  it("the forearm's mass, centre and inertia at the elbow add up from its drawing", () => {
    const aluminium = 2.7e-3; // g/mm³
    const laminate = 1.55e-3;
    const fore = 320;
    const disc = (d: number, l: number) => (Math.PI / 4) * d * d * l;

    const hub = aluminium * (disc(52, 44) - disc(34, 44));
    const hubYy = (hub * (26 ** 2 + 17 ** 2)) / 2;

    const span = fore - 46;
    const tube = laminate * (disc(50, span) - disc(46, span));
    const tubeX = 26 + span / 2;
    const tubeYy = (tube * (3 * (25 ** 2 + 23 ** 2) + span ** 2)) / 12 + tube * tubeX ** 2;

    const flangeX = fore - 10;
    const disk = aluminium * disc(62, 20);
    const hole = aluminium * disc(5.5, 20);
    const flange = disk - 6 * hole;
    const diskYy = (disk * (3 * 31 ** 2 + 20 ** 2)) / 12;
    // Six holes at 25 mm about x: half of their distances squared falls to y, in the mean.
    const holesYy = (6 * hole * (3 * 2.75 ** 2 + 20 ** 2)) / 12 + 6 * hole * (25 ** 2 / 2);
    const flangeYy = diskYy - holesYy + flange * flangeX ** 2;

    const gripper = 740;
    const gripperX = fore + 58;
    const gripperYy = 1180e3 + gripper * (gripperX ** 2 + 4 ** 2);

    const load = 2000;
    const loadX = fore + 150;
    const loadYy = (load * (80 ** 2 + 60 ** 2)) / 12 + load * loadX ** 2;

    const mass = hub + tube + flange + gripper + load;
    const x = (tube * tubeX + flange * flangeX + gripper * gripperX + load * loadX) / mass;
    const yy = hubYy + tubeYy + flangeYy + gripperYy + loadYy;

    const { stdout } = steelyard([
      ...['run', 'examples/two-link-arm/arm.yaml', '--of', 'forearm'],
      ...['--state', 'stretched', '--format', 'json'],
    ]);
    const [part] = JSON.parse(stdout);
    const body = part.basic;
    expect(body.mass * 1e3).toBeCloseTo(mass, 6);
    expect(body.centre[0] * 1e3).toBeCloseTo(380 + x, 6);
    const limits = roll('examples/two-link-arm/arm.yaml', '--state', 'stretched')[0]!.limits as unknown as {
      name: string;
      value: number;
    }[];
    const value = (name: string) => limits.find((l) => l.name === name)!.value;
    expect(value('elbow drive inertia') * 1e9).toBeCloseTo(yy, 2);
    expect(value('forearm static moment') * 1e6).toBeCloseTo(mass * x, 4);
  });

  it("the bracket's mass and centre follow from the outline that its mesh extrudes", async () => {
    const { OUTLINE, WIDTH } = await import(join(root, 'examples/two-link-arm/make-bracket.js'));
    const corners = OUTLINE as [number, number][];
    let area = 0;
    let first = [0, 0];
    corners.forEach(([x, z], i) => {
      const [x2, z2] = corners[(i + 1) % corners.length]!;
      const cross = x * z2 - x2 * z;
      area += cross / 2;
      first = [first[0]! + (cross * (x + x2)) / 6, first[1]! + (cross * (z + z2)) / 6];
    });
    const path = ['--of', 'wall bracket', '--state', 'stretched', '--format', 'json'];
    const [{ basic }] = JSON.parse(steelyard(['run', 'examples/two-link-arm/arm.yaml', ...path]).stdout);
    expect(basic.mass).toBeCloseTo(7.85e-6 * area * WIDTH, 12);
    expect(basic.centre[0] * 1e3).toBeCloseTo(-90 + first[0]! / area, 9);
    expect(basic.centre[1] * 1e3).toBeCloseTo(-30 + WIDTH / 2, 9);
    expect(basic.centre[2] * 1e3).toBeCloseTo(-70 + first[1]! / area, 9);
  });

  it("the spinning payload's mass and centre add up part by part", () => {
    const aluminium = 2.7e-6; // kg/mm³
    const cylinder = (d: number, l: number) => (Math.PI / 4) * d * d * l;
    /** Mass and height of the centre, kg and mm; what stands evenly about the axis has x = y = 0. */
    const evenly: [number, number][] = [
      [aluminium * cylinder(430, 14), 7],
      [-6 * aluminium * cylinder(96, 9), 9.5],
      [aluminium * (cylinder(430, 40) - cylinder(406, 40)), 34],
      [1.9e-6 * 2 * Math.PI * 55 ** 2 * 1.6, 14 + 27.5],
      [12 * 0.0042, 54],
      [aluminium * 2 * Math.PI ** 2 * 150 * 8 ** 2, -8],
      [4 * 4.43e-6 * (cylinder(16, 620) - cylinder(14, 620)), 64],
      [4 * 0.096, 64],
    ];
    const aside: [number, number, number][] = [
      [1.86, 66 + 70, 14 + 31],
      [1.62, -118, 45],
      [0.33, -188, 24],
    ];
    const mass = [...evenly, ...aside].reduce((sum, [m]) => sum + m, 0);
    const x = aside.reduce((sum, [m, at]) => sum + m * at, 0) / mass;
    const z =
      (evenly.reduce((sum, [m, at]) => sum + m * at, 0) + aside.reduce((sum, [m, , at]) => sum + m * at, 0)) /
      mass;
    const [{ basic }] = roll('examples/spinner/sounder.yaml', '--state', 'deployed') as [JudgedRecord];
    expect(basic.mass).toBeCloseTo(mass, 9);
    expect(basic.centre[0] * 1e3).toBeCloseTo(x, 7);
    expect(basic.centre[1] * 1e3).toBeCloseTo(0, 9);
    expect(basic.centre[2] * 1e3).toBeCloseTo(z, 7);
  });
});

/** An sh block that a text block follows: what is typed and what is seen. */
interface Shown {
  readonly name: string;
  readonly script: string;
  readonly expected: string;
  readonly status: number;
}

function shownIn(page: string): Shown[] {
  const text = readFileSync(join(root, page), 'utf8');
  return [...text.matchAll(/^```sh\n([\s\S]*?)^```\n+```text\n([\s\S]*?)^```$/gm)].map(
    ([, script, expected]) => ({
      name: `${page}: ${script!.trim().split('\n')[0]}`,
      script: script!,
      expected: expected!,
      status: Number(/# exit status (\d+)/.exec(script!)?.[1] ?? 0),
    }),
  );
}

/** Expected text as a pattern: a line of `…` stands for lines, `…` in a line for any characters. */
function pattern(expected: string): RegExp {
  const lines = expected.trimEnd().split('\n');
  const exactly = (line: string) =>
    line
      .trimEnd()
      .split('…')
      .map((piece) => piece.replace(/[.*+?^${}()|[\]\\]/g, '\\$&'))
      .join('[^\\n]*');
  const source = lines.map((line) => (line.trim() === '…' ? '(?:[^\\n]*\\n)*?' : `${exactly(line)}[ ]*\\n`));
  return new RegExp(`^${source.join('')}$`);
}

describe.each(['README.md', 'examples/README.md'])('%s', (page) => {
  const shown = shownIn(page);

  it('shows commands with their output', () => expect(shown.length).toBeGreaterThan(0));

  it.each(shown)('$name', ({ script, expected, status }) => {
    const run = shell(script);
    expect({ status: run.status, stderr: run.stderr }).toEqual({ status, stderr: '' });
    if (!pattern(expected).test(run.stdout)) expect(run.stdout).toBe(expected);
  });
});

/** A block that begins with an item goes on with the list of parts. */
const inParts = (block: string) => (block.startsWith('- ') ? block.replace(/^(?=.)/gm, '  ') : block);

describe('README.md', () => {
  const text = readFileSync(join(root, 'README.md'), 'utf8');
  const blocks = [...text.matchAll(/^```yaml\n([\s\S]*?)^```$/gm)].map((m) => m[1]!);
  const included = blocks.filter((b) => b.startsWith('# file '));

  it('explains the format by blocks that, one after another, are one file that rolls up', () => {
    for (const block of included) writeFileSync(join(project, /^# file (\S+)/.exec(block)![1]!), block);
    writeFileSync(
      join(project, 'buoy.yaml'),
      blocks
        .filter((b) => !included.includes(b))
        .map(inParts)
        .join(''),
    );
    const { status, stderr } = steelyard(['check', 'buoy.yaml', '--format', 'json']);
    expect(stderr).toBe('');
    expect(status).toBe(0);
  });

  it('links to files that exist', () => {
    for (const page of ['README.md', 'examples/README.md']) {
      const body = readFileSync(join(root, page), 'utf8');
      for (const [, target] of body.matchAll(/\]\(((?!https?:|#)[^)#]+)/g))
        expect(existsSync(join(dirname(join(root, page)), target!)), `${page} → ${target}`).toBe(true);
    }
  });
});

/** Every text in a YAML document, however deep. */
const textsIn = (data: unknown): string[] => {
  if (typeof data === 'string') return [data];
  return data && typeof data === 'object' ? Object.values(data).flatMap(textsIn) : [];
};

describe('recipes for CI', () => {
  const read = (file: string) => readFileSync(join(root, 'examples/ci', file), 'utf8');
  const names = ['github-actions.yml', 'gitlab-ci.yml'];

  it.each(names)('%s is YAML and does the whole job', (file) => {
    const text = read(file);
    expect(load(text)).toBeTypeOf('object');
    for (const piece of ['steelyard check', '.xml', '.md', '.json', 'steelyard diff', '--fail-over'])
      expect(text).toContain(piece);
  });

  it.each(names)('%s runs what sh can read', (file) => {
    const scripts = textsIn(load(read(file))).filter((text) => text.includes('steelyard '));
    expect(scripts.length).toBeGreaterThan(1);
    for (const input of scripts)
      expect(spawnSync('sh', ['-n'], { input, encoding: 'utf8' }).stderr, input).toBe('');
  });

  it.each(['nightly-check.sh'])('%s is a script that sh can read', (file) => {
    const { status, stderr } = spawnSync('sh', ['-n'], { input: read(file), encoding: 'utf8' });
    expect({ status, stderr }).toEqual({ status: 0, stderr: '' });
  });
});
