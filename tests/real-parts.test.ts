// Real parts: the STL files of Debian's occt-misc package (Open CASCADE's sample data), rolled up as parts of an assembly
// and held against an independent computation: the divergence theorem by quadrature over the triangles.
import { readFileSync } from 'node:fs';
import { basename } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import type { Body } from '#core/inertia/body.ts';
import { merge } from '#core/inertia/merge.ts';
import { filesOfPackage } from './helpers/debian-package.ts';
import { expectBody } from './helpers/expect-body.ts';
import { faultsOf, recordOfText, rollUpText } from './helpers/roll-up-text.ts';

type Point = readonly [number, number, number];
type Triangle = readonly [Point, Point, Point];

const CLOSED = ['TR12J_OCC', 'sh1', 'sh2', 'shape'];
const OPEN = ['TR12J_OCC64K', 'bearing', 'head', 'motor', 'video_part'];

/** A reader of its own: binary by the length that its count promises, else the numbers after `vertex`. */
function readTriangles(bytes: Buffer): Triangle[] {
  const count = bytes.readUInt32LE(80);
  const triangles: Triangle[] = [];
  if (bytes.length === 84 + 50 * count) {
    for (let i = 0; i < count; i++) {
      const at = (corner: number): Point => {
        const o = 84 + 50 * i + 12 + 12 * corner;
        return [bytes.readFloatLE(o), bytes.readFloatLE(o + 4), bytes.readFloatLE(o + 8)];
      };
      triangles.push([at(0), at(1), at(2)]);
    }
    return triangles;
  }
  const points = [...bytes.toString('latin1').matchAll(/vertex\s+(\S+)\s+(\S+)\s+(\S+)/g)].map(
    ([, x, y, z]): Point => [Number(x), Number(y), Number(z)],
  );
  for (let i = 0; i + 2 < points.length; i += 3) triangles.push([points[i]!, points[i + 1]!, points[i + 2]!]);
  return triangles;
}

/** Seven points and weights of a triangle, exact to degree 5 (Radon 1948; Strang & Fix, degree 5). */
const A = (6 + Math.sqrt(15)) / 21;
const B = (6 - Math.sqrt(15)) / 21;
const WA = (155 + Math.sqrt(15)) / 1200;
const WB = (155 - Math.sqrt(15)) / 1200;
const RULE: readonly (readonly [number, number, number, number])[] = [
  [1 / 3, 1 / 3, 1 / 3, 9 / 40],
  [A, A, 1 - 2 * A, WA],
  [A, 1 - 2 * A, A, WA],
  [1 - 2 * A, A, A, WA],
  [B, B, 1 - 2 * B, WB],
  [B, 1 - 2 * B, B, WB],
  [1 - 2 * B, B, B, WB],
];

/**
 * Volume integrals as surface integrals: ∫ f dV = ∮ F n dS with F a primitive of f along one axis. Unit density; in the
 * file's unit scaled to metres.
 */
function integrate(triangles: readonly Triangle[], unit: number): Body {
  const middle = [0, 1, 2].map((k) => {
    const all = triangles.flatMap((t) => t.map((p) => p[k]!));
    return (
      (all.reduce((m, v) => Math.min(m, v), Infinity) + all.reduce((m, v) => Math.max(m, v), -Infinity)) / 2
    );
  });
  // volume; first moments; xx, yy, zz, xy, xz, yz
  const sums = new Float64Array(10);
  for (const corners of triangles) {
    const [p, q, r] = corners.map((c) => c.map((v, k) => (v - middle[k]!) * unit)) as [
      number[],
      number[],
      number[],
    ];
    const e = [0, 1, 2].map((k) => q[k]! - p[k]!);
    const f = [0, 1, 2].map((k) => r[k]! - p[k]!);
    // Twice the area vector, halved: n dS over the triangle.
    const n = [
      e[1]! * f[2]! - e[2]! * f[1]!,
      e[2]! * f[0]! - e[0]! * f[2]!,
      e[0]! * f[1]! - e[1]! * f[0]!,
    ].map((v) => v / 2);
    for (const [a, b, c, w] of RULE) {
      const [x, y, z] = [0, 1, 2].map((k) => a * p[k]! + b * q[k]! + c * r[k]!) as [number, number, number];
      const [nx, ny, nz] = n.map((v) => v * w) as [number, number, number];
      sums[0]! += z * nz;
      sums[1]! += (x * x * nx) / 2;
      sums[2]! += (y * y * ny) / 2;
      sums[3]! += (z * z * nz) / 2;
      sums[4]! += (x ** 3 * nx) / 3;
      sums[5]! += (y ** 3 * ny) / 3;
      sums[6]! += (z ** 3 * nz) / 3;
      sums[7]! += (x * x * y * nx) / 2;
      sums[8]! += (z * z * x * nz) / 2;
      sums[9]! += (y * y * z * ny) / 2;
    }
  }
  const [v, sx, sy, sz, xx, yy, zz, xy, xz, yz] = sums as unknown as number[];
  const c = [sx! / v!, sy! / v!, sz! / v!];
  return {
    mass: v!,
    centre: c.map((x, k) => x + middle[k]! * unit) as unknown as Body['centre'],
    secondMoments: [
      xx! - v! * c[0]! * c[0]!,
      yy! - v! * c[1]! * c[1]!,
      zz! - v! * c[2]! * c[2]!,
      xy! - v! * c[0]! * c[1]!,
      xz! - v! * c[0]! * c[2]!,
      yz! - v! * c[1]! * c[2]!,
    ],
  };
}

/**
 * Edges that do not run as often one way as the other, by the text of their ends: a side is missing where they differ by
 * an odd number, neighbours disagree where by an even one. Collapsed triangles do not count.
 */
function unbalancedEdges(triangles: readonly Triangle[]): { open: number; flipped: number } {
  const balance = new Map<string, number>();
  const name = (p: Point) => p.map((x) => Math.fround(x) + 0).join(' ');
  for (const t of triangles) {
    const [a, b, c] = t.map(name) as [string, string, string];
    if (a === b || b === c || a === c) continue;
    for (const [u, v] of [
      [a, b],
      [b, c],
      [c, a],
    ] as const) {
      const [key, way] = u < v ? [`${u}|${v}`, 1] : [`${v}|${u}`, -1];
      balance.set(key, (balance.get(key) ?? 0) + way);
    }
  }
  const odd = [...balance.values()].filter((n) => n % 2 !== 0).length;
  const even = [...balance.values()].filter((n) => n !== 0 && n % 2 === 0).length;
  return { open: odd, flipped: even };
}

let stl: Map<string, Buffer> | null = null;
let missing = '';

beforeAll(() => {
  const found = filesOfPackage('occt-misc');
  if ('missing' in found) {
    missing = found.missing;
    console.warn(`tests/real-parts: skipped. ${missing}`);
    return;
  }
  stl = new Map(
    found.files.filter((f) => f.endsWith('.stl')).map((f) => [basename(f, '.stl'), readFileSync(f)]),
  );
});

const file = (name: string): Buffer => stl!.get(name)!;
const part = (name: string, more = '') =>
  `  - { name: ${name}, solid: { mesh: { file: ${name}.stl, unit: mm } }, density: 1000${more} }\n`;
const files = (names: readonly string[]) =>
  Object.fromEntries(names.map((name) => [`${name}.stl`, new Uint8Array(file(name))]));

describe('the STL files of Debian’s occt-misc', () => {
  it.for(CLOSED)(
    '%s: volume, centre and tensor agree with the divergence theorem',
    (name, context?: unknown) => {
      if (!stl) return (context as { skip(why: string): void } | undefined)?.skip(missing);
      const triangles = readTriangles(file(name));
      const expected = integrate(triangles, 0.001);
      const found = rollUpText(`assembly: a\nparts:\n${part(name)}`, { files: files([name]) }).total.basic;
      const size = Math.cbrt(expected.mass);
      expectBody(
        {
          ...found,
          mass: found.mass / 1000,
          secondMoments: found.secondMoments.map((q) => q / 1000) as unknown as Body['secondMoments'],
        },
        expected,
        1e-9,
        size,
      );
    },
  );

  it('are parts of an assembly like any other: placed, turned and summed', (context) => {
    if (!stl) return context.skip(missing);
    const places: Body['centre'][] = [
      [0, 0, 0],
      [1, 0, 0],
      [0, -2, 0],
      [0.5, 0.5, 3],
    ];
    const yaml = `assembly: all\nparts:\n${CLOSED.map((name, i) => part(name, `, at: [ ${places[i]!.join(', ')} ], rotate: [ { z: 90 deg } ]`)).join('')}`;
    const record = recordOfText(yaml, { files: files(CLOSED) });
    // A quarter turn about z: x' = −y, y' = x.
    const turned = CLOSED.map((name, i): Body => {
      const b = integrate(readTriangles(file(name)), 0.001);
      const [x, y, z] = b.centre;
      const [xx, yy, zz, xy, xz, yz] = b.secondMoments;
      const [px, py, pz] = places[i]!;
      return { mass: b.mass, centre: [px - y, py + x, pz + z], secondMoments: [yy, xx, zz, -xy, -yz, xz] };
    });
    const whole = turned.reduce(merge);
    expect(record.basic.mass / (1000 * whole.mass)).toBeCloseTo(1, 9);
    whole.centre.forEach((c, k) => {
      expect(record.basic.centre![k]).toBeCloseTo(c, 9);
    });
    const [xx, yy, zz] = whole.secondMoments;
    expect(record.basic.inertia!.aboutCentre[0][0]! / (1000 * (yy + zz))).toBeCloseTo(1, 9);
    expect(record.basic.inertia!.aboutCentre[1][1]! / (1000 * (xx + zz))).toBeCloseTo(1, 9);
    for (const p of record.parts) {
      const triangles = readTriangles(file(p.path));
      expect(p.mesh!.triangles + p.mesh!.collapsed).toBe(triangles.length);
    }
  });

  it.for(OPEN)('%s is refused as open, with as many edges as there are', (name, context) => {
    if (!stl) return context.skip(missing);
    const [fault] = faultsOf(`assembly: a\nparts:\n${part(name)}`, { files: files([name]) });
    expect(fault!.code).toBe('MESH_OPEN');
    expect(fault!.at).toMatchObject({ file: 'top.yaml', line: 3 });
    const edges = Number(/(\d+) edges? ha/.exec(fault!.message)![1]);
    expect(edges).toBe(unbalancedEdges(readTriangles(file(name))).open);
  });

  it('propeller is refused: it disagrees with itself about outside', (context) => {
    if (!stl) return context.skip(missing);
    const [fault] = faultsOf(`assembly: a\nparts:\n${part('propeller')}`, { files: files(['propeller']) });
    expect(fault!.code).toBe('MESH_FLIPPED');
    const { open, flipped } = unbalancedEdges(readTriangles(file('propeller')));
    expect(open).toBe(0);
    expect(Number(/along (\d+) edges/.exec(fault!.message)![1])).toBe(flipped);
  });

  it('motor counts as a thin shell all the same, open or not', (context) => {
    if (!stl) return context.skip(missing);
    const yaml =
      'assembly: a\nparts: [ { name: motor, solid: { mesh: { file: motor.stl, unit: mm, fill: shell, thickness: 0.1 mm } }, density: 1000 } ]';
    const record = recordOfText(yaml, { files: files(['motor']) });
    const area = readTriangles(file('motor')).reduce((sum, [p, q, r]) => {
      const e = [0, 1, 2].map((k) => q[k]! - p[k]!);
      const f = [0, 1, 2].map((k) => r[k]! - p[k]!);
      return (
        sum +
        Math.hypot(
          e[1]! * f[2]! - e[2]! * f[1]!,
          e[2]! * f[0]! - e[0]! * f[2]!,
          e[0]! * f[1]! - e[1]! * f[0]!,
        ) /
          2
      );
    }, 0);
    expect(record.basic.mass / (area * 1e-6 * 1e-4 * 1000)).toBeCloseTo(1, 9);
    expect(record.parts[0]!.mesh!.openEdges).toBe(unbalancedEdges(readTriangles(file('motor'))).open);
  });
});
