import fc from 'fast-check';
import { type Body, inertiaAboutCentre, inertiaAboutPoint } from '../../core/inertia/body.ts';
import { merge } from '../../core/inertia/merge.ts';
import { principalAxes } from '../../core/inertia/principal-axes.ts';
import { toRows } from '../../core/linalg/symmetric3.ts';
import type { Vector3 } from '../../core/linalg/vector3.ts';
import type {
  BodyRecord,
  GroupTotals,
  LimitResult,
  PartBody,
  PartRecord,
  RollUpRecord,
  Totals,
} from '../../core/record/record.ts';

/** A mass at a place: the stuff of which every built body is made, so that its tensor is possible. */
export interface Particle {
  mass: number;
  at: Vector3;
}

export interface BuiltPart {
  path: string;
  particles: Particle[];
  growth?: number;
  maturity?: string | null;
  category?: string | null;
  basis?: string | null;
  file?: string;
  line?: number;
}

export interface RecordOverrides extends Partial<Omit<RollUpRecord, 'parts' | 'limits'>> {
  parts?: BuiltPart[];
  limits?: (Partial<LimitResult> & { value: number | null })[];
}

export const bodyOf = (particles: readonly Particle[], k = 1): Body =>
  particles
    .map((p): Body => ({ mass: k * p.mass, centre: p.at, secondMoments: [0, 0, 0, 0, 0, 0] }))
    .reduce(merge);

const partBody = (body: Body): PartBody => ({
  mass: body.mass,
  centre: [...body.centre],
  inertia: toRows(inertiaAboutCentre(body)),
});

const bodyRecord = (body: Body): BodyRecord => ({
  mass: body.mass,
  centre: [...body.centre],
  inertia: {
    aboutCentre: toRows(inertiaAboutCentre(body)),
    aboutOrigin: toRows(inertiaAboutPoint(body, [0, 0, 0])),
  },
});

export function totalsOf(body: Body): Totals {
  const principal = principalAxes(body);
  const j = inertiaAboutCentre(body);
  return {
    ...bodyRecord(body),
    principal: {
      moments: [...principal.moments],
      axes: principal.axes.map((a) => [...a]) as [number[], number[], number[]],
      nearest: [...principal.nearest],
      free: [...principal.free],
      tilt: [...principal.tilt],
      quaternion: [1, 0, 0, 0],
    },
    gyration: [0, 1, 2].map((k) => Math.sqrt(Math.max(0, j[k]!) / body.mass)),
  };
}

const PARTS: BuiltPart[] = [
  {
    path: 'boom',
    maturity: 'released',
    basis: 'calculated',
    growth: 0.03,
    line: 26,
    particles: rod(0.0363, -0.42, 0),
  },
  {
    path: 'battery',
    maturity: 'measured',
    basis: 'measured',
    category: 'power',
    growth: 0,
    line: 58,
    particles: rod(0.086, -0.02, 0.05),
  },
  {
    path: 'receiver',
    maturity: 'measured',
    basis: 'measured',
    category: 'avionics',
    growth: 0,
    line: 42,
    particles: rod(0.0385, 0.01, 0.05),
  },
  {
    path: 'tailplane',
    maturity: 'estimated',
    basis: 'estimated',
    category: 'structure',
    growth: 0.2,
    file: 'tailplane.yaml',
    line: 12,
    particles: [
      { mass: 0.0086, at: [-0.41, 0.14, 0.03] },
      { mass: 0.0086, at: [-0.41, -0.14, 0.03] },
    ],
  },
  {
    path: 'fin',
    maturity: 'estimated',
    basis: 'estimated',
    category: 'structure',
    growth: 0.2,
    file: 'tailplane.yaml',
    line: 20,
    particles: [
      { mass: 0.0036, at: [-0.4, 0, 0.03] },
      { mass: 0.0036, at: [-0.42, 0, 0.11] },
    ],
  },
];

function rod(mass: number, from: number, to: number): Particle[] {
  const third = mass / 4;
  const middle = (from + to) / 2;
  return [
    { mass: third, at: [from, 0.004, 0.012] },
    { mass: third, at: [to, -0.004, 0.012] },
    { mass: third, at: [middle, 0.003, 0.02] },
    { mass: third, at: [middle, 0, 0.004] },
  ];
}

/** A valid record with the figures of its parts' particles; any field may be overridden. */
export function buildRecord(overrides: RecordOverrides = {}): RollUpRecord {
  const { parts: built = PARTS, limits = [], ...rest } = overrides;
  const basic = bodyOf(built.flatMap((p) => p.particles));
  const predicted = bodyOf(
    built.flatMap((p) => p.particles.map((q) => ({ ...q, mass: q.mass * (1 + (p.growth ?? 0)) }))),
  );
  const parts = built.map((p) => partRecord(p, predicted));
  return {
    schema: 'steelyard-record/1',
    stamp: '9f2c81aa03d14be07c55d2a9e6b1f30478aa1c2d',
    assembly: 'Heron tail boom',
    state: 'flight',
    conventions: {
      frame: { origin: 'wing spar at centreline', x: 'forward', y: 'left', z: 'up' },
      products: 'negative',
      units: 'SI',
      coreVersion: '0.1.0',
      fileUnits: { length: 'mm', mass: 'g', angle: 'deg', density: 'g/mm^3', inertia: 'g*mm^2' },
      growth: built.some((p) => p.growth !== undefined && p.growth !== 0),
    },
    basic: totalsOf(basic),
    predicted: totalsOf(predicted),
    frames: {},
    byCategory: groups(built, (p) => p.category ?? null, basic.mass, predicted.mass),
    byBasis: groups(built, (p) => p.basis ?? null, basic.mass, predicted.mass),
    uncertainty: null,
    limits: limits.map(buildLimit),
    parts,
    overrides: [],
    warnings: [],
    parameters: {},
    inputs: [],
    provenance: {
      tool: 'steelyard 0.1.0',
      commit: '4e1c09b2d7f8a6b5c4d3e2f1a0b9c8d7e6f5a4b3',
      branch: 'main',
      dirty: false,
      at: '2026-11-14T09:12:00Z',
    },
    ...rest,
  };
}

function partRecord(p: BuiltPart, total: Body): PartRecord {
  const basic = bodyOf(p.particles);
  const predicted = bodyOf(p.particles, 1 + (p.growth ?? 0));
  const about = inertiaAboutPoint(predicted, total.centre);
  const whole = inertiaAboutCentre(total);
  const share = (k: number) => (whole[k] === 0 ? 0 : about[k]! / whole[k]!);
  return {
    path: p.path,
    at: { file: p.file ?? 'heron.yaml', line: p.line ?? 1 },
    kind: 'body',
    cut: false,
    own: false,
    maturity: p.maturity ?? null,
    category: p.category ?? null,
    basis: p.basis ?? null,
    growth: p.growth ?? 0,
    basic: partBody(basic),
    predicted: partBody(predicted),
    share: { mass: predicted.mass / total.mass, xx: share(0), yy: share(1), zz: share(2) },
    note: null,
    source: null,
  };
}

function groups(
  parts: BuiltPart[],
  of: (p: BuiltPart) => string | null,
  basicMass: number,
  predictedMass: number,
): GroupTotals[] {
  const names = [...new Set(parts.map(of))];
  return names.map((name) => {
    const mine = parts.filter((p) => of(p) === name);
    const basic = bodyOf(mine.flatMap((p) => p.particles));
    const predicted = bodyOf(
      mine.flatMap((p) => p.particles.map((q) => ({ ...q, mass: q.mass * (1 + (p.growth ?? 0)) }))),
    );
    return {
      name,
      basic: bodyRecord(basic),
      predicted: bodyRecord(predicted),
      share: { basic: basic.mass / basicMass, predicted: predicted.mass / predictedMass },
    };
  });
}

/** A limit judged as the roll-up judges it; by default on a mass in grams. */
export function buildLimit(limit: Partial<LimitResult> & { value: number | null }): LimitResult {
  const min = limit.min ?? null;
  const max = limit.max ?? null;
  const { value } = limit;
  const toMin = value === null || min === null ? Number.POSITIVE_INFINITY : value - min;
  const toMax = value === null || max === null ? Number.POSITIVE_INFINITY : max - value;
  const nearest = toMin < toMax ? 'min' : 'max';
  const margin = value === null ? null : Math.min(toMin, toMax);
  const stop = nearest === 'min' ? min : max;
  return {
    name: 'take-off mass',
    id: null,
    quantity: 'mass',
    of: null,
    frame: null,
    on: 'predicted',
    unit: 'kg',
    shown: { unit: 'g', factor: 0.001 },
    values: { basic: value, predicted: value },
    min,
    max,
    nearest,
    margin,
    marginOfLimit: margin === null || stop === null || stop === 0 ? null : margin / Math.abs(stop),
    verdict: margin !== null && margin >= 0 ? 'within' : 'outside',
    waiver: null,
    source: null,
    owner: null,
    note: null,
    at: { file: 'heron.yaml', line: 88 },
    heaviest: [],
    ...limit,
  };
}

// Generators ---------------------------------------------------------------------------------------------------------

const odd = fc.constantFrom(
  '\x1b[31m',
  '\t',
  '\n',
  '\u202e',
  '|',
  '<b>',
  '"',
  ',',
  '%',
  '=',
  'é',
  '船体',
  'e\u0301',
  '🚀',
  '\u0000',
  '\u009b',
  ']]>',
  '&',
  '\r',
);

/** Names as people and enemies write them: long, in any writing, with control characters. */
export const anyName = fc
  .array(
    fc.oneof(
      fc.string({ minLength: 1, maxLength: 12 }),
      odd,
      fc.string({ unit: 'binary', minLength: 1, maxLength: 6 }),
    ),
    { minLength: 1, maxLength: 10 },
  )
  .map((pieces) => pieces.join(''));

const coordinate = (size: number) => fc.double({ min: -size, max: size, noNaN: true }).map((x) => x + 0);

/** Two to five particles of one size of body. */
export const anyParticles = (size = 1, mass = 1) =>
  fc.array(
    fc.record({
      mass: fc.double({ min: mass / 1000, max: mass, noNaN: true }),
      at: fc.tuple(coordinate(size), coordinate(size), coordinate(size)),
    }),
    { minLength: 2, maxLength: 5 },
  );

const sized = fc.record({
  size: fc.constantFrom(1e-5, 0.3, 20, 1e7),
  mass: fc.constantFrom(1e-9, 0.2, 1500, 1e9),
});

const anyLimit = fc
  .record({
    name: anyName,
    value: fc.oneof(coordinate(1e9), fc.constant(null), fc.double({ min: 0.1, max: 0.4, noNaN: true })),
    min: fc.option(fc.double({ min: -1e9, max: 0.25, noNaN: true }).map((x) => x + 0)),
    max: fc.option(fc.double({ min: 0.25, max: 1e9, noNaN: true })),
    waiver: fc.option(
      fc.record({ until: fc.constantFrom('2026-11-30', '2027-01-31'), reason: anyName, by: anyName }),
    ),
    heaviest: fc.array(
      fc.record({
        path: anyName,
        at: fc.record({ file: anyName, line: fc.nat() }),
        value: fc.double({ noNaN: true, noDefaultInfinity: true }).map((x) => x + 0),
      }),
      { maxLength: 3 },
    ),
    at: fc.record({ file: anyName, line: fc.nat() }),
  })
  .filter((l) => l.min !== null || l.max !== null);

/** Whole records of possible bodies, gram-size to planet-size, with any names. */
export const anyRecord = sized.chain(({ size, mass }) =>
  fc
    .record({
      assembly: anyName,
      state: anyName,
      parts: fc.array(
        fc.record({
          path: anyName,
          particles: anyParticles(size, mass),
          growth: fc.constantFrom(0, 0.03, 0.2),
          maturity: fc.option(anyName),
          category: fc.option(anyName),
          basis: fc.option(fc.constantFrom('estimated', 'calculated', 'measured')),
          file: anyName,
          line: fc.nat({ max: 99999 }),
        }),
        { minLength: 1, maxLength: 14 },
      ),
      limits: fc.array(anyLimit, { maxLength: 4 }),
      frame: fc.option(fc.record({ origin: anyName, x: anyName, y: anyName, z: anyName })),
      overrides: fc.array(
        fc.record({
          path: anyName,
          reason: anyName,
          at: fc.record({ file: anyName, line: fc.nat() }),
          from: fc.double({ min: 0, max: 1e9, noNaN: true }),
          to: fc.double({ min: 0, max: 1e9, noNaN: true }),
        }),
        { maxLength: 2 },
      ),
      warnings: fc.array(
        fc.record({
          code: fc.constant('ROLLUP_MATURITY_MISSING'),
          message: anyName,
          at: fc.option(fc.record({ file: anyName, line: fc.nat() })),
        }),
        { maxLength: 2 },
      ),
    })
    .map(({ frame, ...rest }) => {
      const record = buildRecord(rest);
      record.conventions.frame = frame;
      const frames = fc.sample(anyName, { numRuns: 1, seed: 1 });
      record.frames = {
        [frames[0]!]: {
          note: null,
          at: [0.1, 0, -0.03],
          axes: [
            [1, 0, 0],
            [0, 1, 0],
            [0, 0, 1],
          ],
          basic: { mass: record.basic.mass, centre: record.basic.centre, inertia: record.basic.inertia },
          predicted: {
            mass: record.predicted.mass,
            centre: record.predicted.centre,
            inertia: record.predicted.inertia,
          },
        },
      };
      return record;
    }),
);
