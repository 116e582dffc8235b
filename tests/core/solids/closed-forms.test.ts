import { describe, expect, it } from 'vitest';
import type { Body } from '../../../core/inertia/body.ts';
import type { SolidDimensions } from '../../../core/solids/dimensions.ts';
import { solidByName } from '../../../core/solids/registry.ts';
import { resolveTwins } from '../../../core/solids/twins.ts';
import {
  combine,
  disks,
  hoops,
  integrate,
  polygonMoment,
  type RawMoments,
  sweep,
  tetrahedra,
  toBody,
} from '../../helpers/exact-body.ts';
import { expectBody, largest } from '../../helpers/expect-body.ts';
import { exact, PI, squareRoot } from '../../helpers/rational.ts';

// The oracle: exact fractions of big integers, 90 digits of π, sine and cosine, moments about the origin from the
// definition (disks piled along z, polygons by their boundary, tetrahedra), rounded to doubles once at the end.
const TOLERANCE = 1e-13;

function make(name: string, given: SolidDimensions): Body {
  const solid = solidByName(name)!;
  const dims = resolveTwins(solid, given);
  expect(solid.check(dims)).toBeNull();
  return solid.make(dims);
}

function sizeOf(name: string, given: SolidDimensions): number {
  const solid = solidByName(name)!;
  const { min, max } = solid.extent(resolveTwins(solid, given));
  return largest([...min, ...max]);
}

function expectExact(name: string, given: SolidDimensions, expected: RawMoments): void {
  expectBody(make(name, given), toBody(expected), TOLERANCE, sizeOf(name, given));
}

const round = (d: number) => exact(d).over(2);
const squared = (d: number) => round(d).times(round(d));
/** Radius² of a sphere of diameter d at z from its lowest point: z (d − z). */
const ball = (d: number) => [0, d, -1];
/** Radius² of a ball less a hollow of the same centre, each on its own height. */
const hollow = (d: number, wall: number): RawMoments => {
  const r = round(d);
  const inner = r.minus(wall);
  const sphere = (radius: ReturnType<typeof exact>) =>
    disks([radius.times(radius), 0, -1], radius.times(-1), radius);
  return combine(sphere(r), sphere(inner), -1);
};
const tubeOf = (d: number, wall: number, length: number): RawMoments => {
  const inner = round(d).minus(wall);
  const ends = [exact(length).over(-2), exact(length).over(2)] as const;
  return combine(disks([squared(d)], ...ends), disks([inner.times(inner)], ...ends), -1);
};
const taper = (d: number, top: number, h: number) => {
  const slope = round(top).minus(round(d)).over(h);
  return [squared(d), slope.times(d), slope.times(slope)];
};

describe('round solids agree with exact integration', () => {
  it.each([
    [0.0734, 0.211],
    [3.1, 1e-6],
    [1e-6, 3.1],
  ])('cylinder of diameter %d and length %d', (diameter, length) => {
    const half = exact(length).over(2);
    expectExact('cylinder', { diameter, length }, disks([squared(diameter)], half.times(-1), half));
  });

  it.each([0.01, 0.05, 1e-6, 1e-9, 1e-12, 0.0499999])('tube of radius 0.05 and wall %d', (wall) => {
    expectExact('tube', { diameter: 0.1, wall, length: 0.3 }, tubeOf(0.1, wall, 0.3));
  });

  it('tube whose bore is within a hair of its diameter', () => {
    const [diameter, bore] = [0.1, 0.0999999999];
    const inner = squared(bore);
    const expected = combine(disks([squared(diameter)], -1, 1), disks([inner], -1, 1), -1);
    expectExact('tube', { diameter, bore, length: 2 }, expected);
  });

  it.each([0.01, 0.05, 1e-6, 1e-9, 1e-12])('hollow sphere of radius 0.05 and wall %d', (wall) => {
    expectExact('hollow_sphere', { diameter: 0.1, wall }, hollow(0.1, wall));
  });

  it('sphere and hemisphere', () => {
    const r = round(0.37);
    const dome = [squared(0.37), 0, -1];
    expectExact('sphere', { diameter: 0.37 }, disks(dome, r.times(-1), r));
    expectExact('hemisphere', { diameter: 0.37 }, disks(dome, 0, r));
  });

  it.each([0.07, 1e-3, 1e-6, 1e-12, 0.2, 0.3, 0.39999, 0.4])('spherical cap of height %d', (height) => {
    const diameter = 0.4;
    // Radius² at z above the cut: u (d − u) with u = h − z from the pole.
    const h = exact(height);
    const square = [h.times(exact(diameter).minus(h)), h.times(2).minus(diameter), -1];
    expectExact('spherical_cap', { diameter, height }, disks(square, 0, h));
    expect(ball(diameter)).toHaveLength(3);
  });

  it('ellipsoid and elliptical cylinder, three different sizes', () => {
    const [x, y, z] = [0.31, 0.17, 0.0923];
    const half = round(z);
    const square = [exact(1), 0, exact(-1).over(squared(z))];
    expectExact('ellipsoid', { size: [x, y, z] }, disks(square, half.times(-1), half, round(x), round(y)));
    expectExact(
      'elliptical_cylinder',
      { size: [x, y], length: z },
      disks([1], half.times(-1), half, round(x), round(y)),
    );
  });

  it.each([0.11, 0.16 - 1e-9, 0.16, 0.16 + 1e-12, 1e-9, 0.4, 0])('frustum of base 0.16 and top %d', (top) => {
    const square = taper(0.16, top, 0.22);
    expectExact('frustum', { diameter: 0.16, top_diameter: top, height: 0.22 }, disks(square, 0, 0.22));
  });

  it('cone and paraboloid', () => {
    expectExact('cone', { diameter: 0.12, height: 0.35 }, disks(taper(0.12, 0, 0.35), 0, 0.35));
    const square = [squared(0.3), squared(0.3).over(-0.41)];
    expectExact('paraboloid', { diameter: 0.3, height: 0.41 }, disks(square, 0, 0.41));
  });
});

describe('half cylinder and torus agree with exact integration', () => {
  it('half cylinder: the polar integral of a half disk', () => {
    const r = round(0.16);
    const length = 0.23;
    const r2 = r.times(r);
    const area = PI.times(r2).over(2);
    const zero = exact(0);
    const expected: RawMoments = {
      m: area.times(length),
      s: [zero, r2.times(r).times(2).over(3).times(length), zero],
      q: [
        area.times(r2).over(4).times(length),
        area.times(r2).over(4).times(length),
        area.times(integrate([0, 0, 1], round(-length), round(length))),
        zero,
        zero,
        zero,
      ],
    };
    expectExact('half_cylinder', { diameter: 0.16, length }, expected);
  });

  // Moments of a disk about its own centre: even powers only, r² /4 and so on of its area.
  const diskSection = (diameter: number, section: number) => (i: number, j: number) => {
    const big = round(diameter);
    const r2 = squared(section);
    const area = PI.times(r2);
    const uu = area.times(r2).over(4);
    if (j === 1) return exact(0);
    if (j === 2) return big.times(uu);
    if (i === 1) return big.times(area);
    if (i === 2) return big.times(big).times(area).plus(uu);
    return big.times(big).times(big).times(area).plus(big.times(3).times(uu));
  };

  it.each([2 * Math.PI, 6.2831853, 6.1, Math.PI, 3.1, Math.PI / 2, 0.7, 1e-2, 1e-4, 1e-8])(
    'torus turned through %d rad',
    (angle) => {
      const whole = angle === 2 * Math.PI ? PI.times(2) : angle;
      expectExact('torus', { diameter: 0.5, section: 0.12, angle }, sweep(diskSection(0.5, 0.12), whole));
    },
  );

  it('torus whose section reaches the axis, and one like a wire', () => {
    const full = PI.times(2);
    expectExact('torus', { diameter: 0.5, section: 0.5 }, sweep(diskSection(0.5, 0.5), full));
    expectExact('torus', { diameter: 0.5, section: 1e-7 }, sweep(diskSection(0.5, 1e-7), full));
  });
});

describe('turned profiles agree with exact integration', () => {
  const PROFILES: Record<string, readonly (readonly [number, number])[]> = {
    'a scalene triangle off the axis': [
      [0.21, 0.03],
      [0.37, 0.11],
      [0.25, 0.29],
    ],
    'an L that touches the axis': [
      [0, 0],
      [0.3, 0],
      [0.3, 0.04],
      [0.05, 0.04],
      [0.05, 0.4],
      [0, 0.4],
    ],
    'a wall of a millionth of its radius': [
      [0.3, 0.1],
      [0.3000003, 0.1],
      [0.3000003, 0.4],
      [0.3, 0.4],
    ],
    'a triangle 500 m up the axis': [
      [0.21, 500.03],
      [0.37, 500.11],
      [0.25, 500.29],
    ],
  };
  const ANGLES = [2 * Math.PI, 6.283185, 5, Math.PI, 1.2, 0.03, 1e-5, 1e-9];
  const CASES = Object.keys(PROFILES).flatMap((name) => ANGLES.map((angle) => [name, angle] as const));

  it.each(CASES)('%s through %d rad', (name, angle) => {
    const profile = PROFILES[name]!;
    const whole = angle === 2 * Math.PI ? PI.times(2) : angle;
    const expected = sweep((i, j) => polygonMoment(profile, i, j), whole);
    expectExact('revolve', { profile, angle }, expected);
    expectExact('revolve', { profile: [...profile].reverse(), angle }, expected);
  });
});

describe('solids with flat faces agree with exact integration', () => {
  type Point = readonly [number, number, number];
  const fan = (points: readonly Point[], faces: readonly (readonly number[])[]) =>
    tetrahedra(
      faces.flatMap((face) =>
        face.slice(2).map((_, k) => [points[face[0]!]!, points[face[k + 1]!]!, points[face[k + 2]!]!]),
      ),
    );
  const BOX = [
    [0, 3, 2, 1],
    [4, 5, 6, 7],
    [0, 1, 5, 4],
    [1, 2, 6, 5],
    [2, 3, 7, 6],
    [3, 0, 4, 7],
  ];
  const corners = (x: number, y: number, from: number, to: number): Point[] => [
    [-x / 2, -y / 2, from],
    [x / 2, -y / 2, from],
    [x / 2, y / 2, from],
    [-x / 2, y / 2, from],
    [-x / 2, -y / 2, to],
    [x / 2, -y / 2, to],
    [x / 2, y / 2, to],
    [-x / 2, y / 2, to],
  ];

  it('box, as box and as polyhedron', () => {
    const points = corners(0.31, 0.17, -0.045, 0.045);
    expectExact('box', { size: [0.31, 0.17, 0.09] }, fan(points, BOX));
    expectExact('polyhedron', { vertices: points, faces: BOX }, fan(points, BOX));
  });

  it('pyramid', () => {
    const points: Point[] = [...corners(0.4, 0.25, 0, 1).slice(0, 4), [0, 0, 0.45]];
    const faces = [
      [0, 3, 2, 1],
      [0, 1, 4],
      [1, 2, 4],
      [2, 3, 4],
      [3, 0, 4],
    ];
    expectExact('pyramid', { base: [0.4, 0.25], height: 0.45 }, fan(points, faces));
  });

  it('wedge, whose product is not zero', () => {
    const points: Point[] = [
      [0, 0, 0],
      [0.3, 0, 0],
      [0, 0.16, 0],
      [0, 0, 0.22],
      [0.3, 0, 0.22],
      [0, 0.16, 0.22],
    ];
    const faces = [
      [0, 2, 1],
      [3, 4, 5],
      [0, 1, 4, 3],
      [1, 2, 5, 4],
      [2, 0, 3, 5],
    ];
    expectExact('wedge', { size: [0.3, 0.16, 0.22] }, fan(points, faces));
  });

  it.each([0, 1000, 1e6])('scalene tetrahedron with three products, %d m from the origin', (far) => {
    const vertices: Point[] = [
      [8.3322 + far, -11.86875, 0.93355],
      [0.75523 + far, 5, 16.37072],
      [52.61236 + far, 5.25, -5.3858],
      [2 + far, 5.5, 3 - far],
    ];
    const faces = [
      [0, 1, 2],
      [0, 3, 1],
      [1, 3, 2],
      [2, 3, 0],
    ];
    const turn = (list: number[][]) => list.map((face) => [...face].reverse());
    const outward = fan(vertices, faces).m.n > 0n ? faces : turn(faces);
    expectExact('tetrahedron', { vertices }, fan(vertices, outward));
    expectExact('polyhedron', { vertices, faces: outward }, fan(vertices, outward));
  });

  const OUTLINE = [
    [0, 0],
    [0.31, 0.02],
    [0.28, 0.17],
    [0.15, 0.09],
    [0.02, 0.2],
  ] as const;
  const HOLE = [
    [0.05, 0.04],
    [0.09, 0.05],
    [0.06, 0.08],
  ] as const;
  const prism = (outline: readonly (readonly [number, number])[], height: number): RawMoments => {
    const p = (i: number, j: number) => polygonMoment(outline, i, j).times(height);
    const h = exact(height);
    return {
      m: p(0, 0),
      s: [p(1, 0), p(0, 1), p(0, 0).times(h).over(2)],
      q: [
        p(2, 0),
        p(0, 2),
        p(0, 0).times(h).times(h).over(3),
        p(1, 1),
        p(1, 0).times(h).over(2),
        p(0, 1).times(h).over(2),
      ],
    };
  };

  it('extrusion with a hole, outline and hole in either turning sense and closed twice', () => {
    const expected = combine(prism(OUTLINE, 0.07), prism(HOLE, 0.07), -1);
    const height = 0.07;
    expectExact('extrusion', { outline: OUTLINE, holes: [HOLE], height }, expected);
    expectExact('extrusion', { outline: [...OUTLINE].reverse(), holes: [HOLE], height }, expected);
    expectExact('extrusion', { outline: OUTLINE, holes: [[...HOLE].reverse()], height }, expected);
    expectExact('extrusion', { outline: [...OUTLINE, OUTLINE[0]], holes: [HOLE], height }, expected);
  });

  it('extrusion 3 km from its origin', () => {
    const far = OUTLINE.map(([x, y]) => [x + 3000, y - 2000] as const);
    expectExact('extrusion', { outline: far, height: 0.07 }, prism(far, 0.07));
  });
});

describe('thin bodies agree with exact integration', () => {
  it('cylindrical, spherical, hemispherical and conical shells', () => {
    const r = round(0.26);
    const half = exact(0.54).over(2);
    expectExact(
      'cylindrical_shell',
      { diameter: 0.26, length: 0.54 },
      hoops([r.times(r)], [r], half.times(-1), half),
    );
    const sphere = [r.times(r), 0, -1];
    // Archimedes: the zones of a sphere go with their heights.
    expectExact('spherical_shell', { diameter: 0.26 }, hoops(sphere, [r], r.times(-1), r));
    expectExact('hemispherical_shell', { diameter: 0.26 }, hoops(sphere, [r], 0, r));
    const slant = squareRoot(r.times(r).plus(exact(0.35).times(0.35)));
    const narrowing = [r.times(slant).over(0.35), r.times(slant).over(0.35).over(-0.35)];
    expectExact(
      'conical_shell',
      { diameter: 0.26, height: 0.35 },
      hoops(taper(0.26, 0, 0.35), narrowing, 0, 0.35),
    );
  });

  it('triangle plate in space: the limit of a tetrahedron, by its own edges', () => {
    const vertices = [
      [0.1, 0.2, -0.3],
      [0.7, -0.1, 0.2],
      [0.3, 0.9, 0.4],
    ] as const;
    const [a, b, c] = vertices.map((v) => v.map(exact)) as [
      ReturnType<typeof exact>[],
      ReturnType<typeof exact>[],
      ReturnType<typeof exact>[],
    ];
    const u = b.map((value, i) => value.minus(a[i]!));
    const v = c.map((value, i) => value.minus(a[i]!));
    const n = [0, 1, 2].map((i) =>
      u[(i + 1) % 3]!.times(v[(i + 2) % 3]!).minus(u[(i + 2) % 3]!.times(v[(i + 1) % 3]!)),
    );
    const twice = squareRoot(n.reduce((sum, value) => sum.plus(value.times(value)), exact(0)));
    // r = a + s u + t v over 0 ≤ s, 0 ≤ t, s + t ≤ 1: ∫ s = 1/6, ∫ s² = 1/12, ∫ s t = 1/24.
    const second = (i: number, j: number) =>
      a[i]!.times(a[j]!)
        .over(2)
        .plus(
          a[i]!.times(u[j]!.plus(v[j]!))
            .plus(a[j]!.times(u[i]!.plus(v[i]!)))
            .over(6),
        )
        .plus(u[i]!.times(u[j]!).plus(v[i]!.times(v[j]!)).over(12))
        .plus(u[i]!.times(v[j]!).plus(v[i]!.times(u[j]!)).over(24))
        .times(twice);
    const expected: RawMoments = {
      m: twice.over(2),
      s: [0, 1, 2].map((i) => a[i]!.over(2).plus(u[i]!.plus(v[i]!).over(6)).times(twice)),
      q: [second(0, 0), second(1, 1), second(2, 2), second(0, 1), second(0, 2), second(1, 2)],
    };
    expectExact('triangle_plate', { vertices }, expected);
  });
});
