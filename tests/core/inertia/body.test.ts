import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { balancedSum, closeMoments, netBody, sumMoments } from '#core/inertia/balance-sum.ts';
import {
  type Body,
  inertiaAboutCentre,
  inertiaAboutPoint,
  secondMomentsFromInertia,
} from '#core/inertia/body.ts';
import { merge, subtractBody } from '#core/inertia/merge.ts';
import { judgeBody, judgeTensor } from '#core/inertia/possibility.ts';
import { possibleReadings } from '#core/inertia/possible-readings.ts';
import { principalAxes } from '#core/inertia/principal-axes.ts';
import type { Symmetric3 } from '#core/linalg/symmetric3.ts';
import type { Vector3 } from '#core/linalg/vector3.ts';
import { expectBody, expectClose } from '../../helpers/expect-body.ts';
import { referenceCase } from '../../helpers/reference-cases.ts';

const six = (rows: number[][]): Symmetric3 => [
  rows[0]![0]!,
  rows[1]![1]!,
  rows[2]![2]!,
  rows[0]![1]!,
  rows[0]![2]!,
  rows[1]![2]!,
];
const particle = (mass: number, ...centre: [number, number, number]): Body => ({
  mass,
  centre,
  secondMoments: [0, 0, 0, 0, 0, 0],
});

/** Decimals of three places: what people write, and clear of numbers too small to be a body's. */
const number = (min: number, max: number) =>
  fc.integer({ min: min * 1000, max: max * 1000 }).map((n) => n / 1000);
const place = fc.tuple(number(-2, 2), number(-2, 2), number(-2, 2)) as fc.Arbitrary<Vector3>;
/** A possible body: second moments as a sum of outer products. */
const anyBody: fc.Arbitrary<Body> = fc
  .tuple(number(0.1, 10), place, place, place, place)
  .map(([mass, centre, a, b, c]) => {
    const q = (i: number, k: number) => a[i]! * a[k]! + b[i]! * b[k]! + c[i]! * c[k]! + (i === k ? 0.01 : 0);
    return { mass, centre, secondMoments: [q(0, 0), q(1, 1), q(2, 2), q(0, 1), q(0, 2), q(1, 2)] };
  });

describe('products of inertia', () => {
  it('are the tensor’s own elements: mass in the first quadrant gives a negative I_xy', () => {
    // Two particles of 1 kg at (1, 1, 0) and (−1, −1, 0): I_xy = −Σ m x y = −2. This fails if the sign is turned.
    const body = merge(particle(1, 1, 1, 0), particle(1, -1, -1, 0));
    expect(inertiaAboutCentre(body)).toEqual([2, 2, 4, -2, 0, 0]);
    expect(body.secondMoments[3]).toBe(2);
  });

  it('are those of a published part: the bent plate about its corner (Meriam & Kraige, Dynamics, ch. 7; from memory)', () => {
    const { expected } = referenceCase('L-meriam-bent-plate');
    const sigma = 70;
    const plate = (mass: number, centre: Vector3, x: number, y: number, z: number): Body => ({
      mass,
      centre,
      secondMoments: [(mass * x * x) / 12, (mass * y * y) / 12, (mass * z * z) / 12, 0, 0, 0],
    });
    const whole = merge(
      plate(sigma * 0.125 * 0.1, [0, 0.0625, 0.05], 0, 0.125, 0.1),
      plate(sigma * 0.075 * 0.15, [0.0375, 0.125, 0.075], 0.075, 0, 0.15),
    );
    expectClose(inertiaAboutPoint(whole, [0, 0, 0]), six(expected.I_O), 1e-12, 'about O');
    expectClose(inertiaAboutCentre(whole), six(expected.I_com), 1e-12, 'about the centre');
    expectClose([...whole.centre], expected.com_m, 1e-12, 'centre');
  });
});

describe('inertiaAboutPoint', () => {
  it('follows the parallel-axis theorem with products (Steiner; exact rational values)', () => {
    const { inputs, expected } = referenceCase('V-parallel-axis');
    const body: Body = {
      mass: inputs.m,
      centre: [0, 0, 0],
      secondMoments: secondMomentsFromInertia(six(inputs.I_C)),
    };
    expectClose(inertiaAboutPoint(body, inputs.d), six(expected.I_P), 1e-14);
    expectClose(
      inertiaAboutPoint(body, inputs.d.map((x: number) => -x) as unknown as Vector3),
      six(expected.I_P),
      1e-14,
    );
  });

  it('is undone by going back through the centre', () => {
    fc.assert(
      fc.property(anyBody, place, (body, point) => {
        const moved = inertiaAboutPoint(body, point);
        const d = body.centre.map((c, k) => c - point[k]!) as unknown as Vector3;
        const back = inertiaAboutPoint(
          { ...body, mass: -body.mass, centre: d, secondMoments: secondMomentsFromInertia(moved) },
          [0, 0, 0],
        );
        expectClose(back, inertiaAboutCentre(body), 1e-13 * (1 + (moved[0] + moved[1] + moved[2]) / 1e-3));
      }),
    );
  });
});

describe('merge', () => {
  it.each(['P-goldstein', 'P-four', 'P-collinear'])('sums the particles of %s to the exact values', (id) => {
    // P-goldstein: H. Goldstein, Classical Mechanics, ch. 5 exercise (from memory); the others exact rational arithmetic.
    const { inputs, expected } = referenceCase(id);
    const bodies: Body[] = inputs.particles.map((p: { m_kg: number; r_m: [number, number, number] }) =>
      particle(p.m_kg, ...p.r_m),
    );
    const whole = bodies.reduce(merge);
    expectClose([...whole.centre], expected.com_m, 1e-14, 'centre');
    expectClose(inertiaAboutCentre(whole), six(expected.I_com), 1e-14, 'about the centre');
    expectClose(inertiaAboutPoint(whole, [0, 0, 0]), six(expected.I_origin), 1e-14, 'about the origin');
    expectClose(
      [...principalAxes(whole).moments],
      expected.principal_com.map((x: number) => (Math.abs(x) < 1e-30 ? 0 : x)),
      1e-14,
    );
  });

  it('does not care about order or grouping, to rounding', () => {
    fc.assert(
      fc.property(anyBody, anyBody, anyBody, (a, b, c) => {
        const size = 4;
        expectBody(merge(a, b), merge(b, a), 1e-14, size);
        expectBody(merge(merge(a, b), c), merge(a, merge(b, c)), 1e-13, size);
      }),
    );
  });

  it('is undone by subtractBody', () => {
    fc.assert(
      fc.property(anyBody, anyBody, (a, b) => {
        const back = subtractBody(merge(a, b), b);
        const lost = (a.mass + b.mass) / a.mass;
        expectBody(
          back,
          a,
          1e-13 *
            lost *
            lost *
            (1 +
              Math.max(...b.secondMoments.map(Math.abs)) / Math.max(...a.secondMoments.map(Math.abs), 1e-3)) *
            10,
          4,
        );
      }),
    );
  });

  it('keeps a 1 m assembly 10,000 km away to 8 × what its coordinates carry (eps × d/L)', () => {
    const d = 1e7;
    const near = [
      particle(2, 0, 0, 0),
      particle(1, 1, 0.25, 0),
      particle(3, 0.5, -0.5, 0.75),
      particle(0.5, -0.25, 0.5, 0.5),
    ];
    const far = near.map((b) => particle(b.mass, b.centre[0] + d, b.centre[1] + d, b.centre[2] - d));
    const exact = inertiaAboutCentre(balancedSum(near, merge));
    const found = inertiaAboutCentre(balancedSum(far, merge));
    expectClose(found, exact, 8 * Number.EPSILON * d);
  });

  it('loses nothing to a particle of no mass, and keeps what a massless side weighs in moments', () => {
    const body = merge(particle(2, 1, 0, 0), particle(0, 1e6, 0, 0));
    expect(body).toEqual(particle(2, 1, 0, 0));
  });
});

describe('the fixed tree', () => {
  it('halves the list, the left half never smaller', () => {
    const shape = (n: number) =>
      balancedSum(
        Array.from({ length: n }, (_, i) => `${i}`),
        (a, b) => `(${a}${b})`,
      );
    expect([1, 2, 3, 4, 5].map(shape)).toEqual(['0', '(01)', '((01)2)', '((01)(23))', '(((01)2)(34))']);
  });

  it('nets material less cut-outs once, and hands both sides up where nothing is left', () => {
    const box: Body = { mass: 3, centre: [0, 0, 0], secondMoments: [1, 1, 1, 0, 0, 0] };
    const hole: Body = { mass: 1, centre: [0, 0, 0], secondMoments: [0.25, 0.25, 0.25, 0, 0, 0] };
    const closed = closeMoments({ material: box, cut: hole });
    expect(closed).toEqual({
      material: { mass: 2, centre: [0, 0, 0], secondMoments: [0.75, 0.75, 0.75, 0, 0, 0] },
      cut: null,
    });
    const nothing = sumMoments([
      { material: box, cut: null },
      { material: null, cut: box },
    ]);
    expect(netBody(nothing)).toBeNull();
    expect(closeMoments(nothing)).toBe(nothing);
    // What was singular inside a group is not lost to the whole.
    const whole = netBody(sumMoments([nothing, { material: hole, cut: null }]));
    expectBody(whole!, hole, 1e-15, 1);
  });
});

describe('possible tensors', () => {
  it.each(['V-ok', 'V-pd-not-physical', 'V-diag-hides', 'V-planar'])('judges %s as published', (id) => {
    // P. M. Wensing, S. Kim, J.-J. E. Slotine 2018 (from memory); principal moments at 50 digits.
    const { inputs, expected } = referenceCase(id);
    const result = judgeTensor(six(inputs.I));
    expect(result.possible).toBe(expected.physical);
    expectClose(result.moments, expected.principal, 1e-12);
    expect(result.shortfall).toBeCloseTo(-expected.triangle_slack, 12);
  });

  it('holds for every body that is a sum of particles, and for flat and straight ones', () => {
    fc.assert(
      fc.property(fc.array(fc.tuple(number(0, 5), place), { minLength: 1, maxLength: 8 }), (points) => {
        const bodies = points.map(([m, [x, y, z]]) => particle(m + 0.01, x, y, z));
        expect(judgeBody(bodies.reduce(merge)).possible).toBe(true);
        expect(judgeTensor(inertiaAboutCentre(bodies.reduce(merge))).possible).toBe(true);
        const flat = bodies.map((b) => particle(b.mass, b.centre[0], b.centre[1], 0)).reduce(merge);
        expect(judgeTensor(inertiaAboutCentre(flat)).possible).toBe(true);
      }),
    );
  });

  it('names the reading that would make an impossible tensor possible, and no other', () => {
    const given = { mass: 1, centre: [0, 0, 0] as const, about: [0, 0, 0] as const, allowance: 0 };
    // Of a long x-y body the sign of one product changes nothing about possibility; three products together do.
    const right: Symmetric3 = [2, 2, 2, -0.9, -0.9, -0.9];
    expect(judgeTensor(right).possible).toBe(true);
    const wrong: Symmetric3 = [2, 2, 2, 0.9, 0.9, 0.9];
    expect(judgeTensor(wrong).possible).toBe(false);
    expect(possibleReadings({ ...given, inertia: wrong })).toEqual(["with the products' sign the other way"]);
    // Central moments given as if about the origin: taking the shift away leaves too little.
    const shifted = possibleReadings({
      mass: 10,
      centre: [1, 0, 0],
      about: [0, 0, 0],
      inertia: [1, 2, 2, 0, 0, 0],
      allowance: 0,
    });
    expect(shifted).toContain('about the centre');
    expect(possibleReadings({ ...given, inertia: [-1, 2, 3, 0, 0, 0] })).toEqual([]);
  });
});

describe('principalAxes', () => {
  it('names axes by the one assignment, and tilts by the same', () => {
    // R-axis-tilt, by hand: tan 2α = 2·0.06/(5 − 4.2), α = 4.265382804974067°.
    const body: Body = {
      mass: 1,
      centre: [0, 0, 0],
      secondMoments: secondMomentsFromInertia([4.2, 3.9, 5, 0, -0.06, 0]),
    };
    const { moments, nearest, tilt, free } = principalAxes(body);
    expectClose([...moments], [3.9, 4.195525031676866, 5.004474968323134], 1e-13);
    expect(nearest).toEqual(['y', 'x', 'z']);
    const degrees = tilt.map((t) => (t * 180) / Math.PI);
    expect(degrees[0]).toBeCloseTo(4.265382804974067, 11);
    expect(degrees[1]).toBe(0);
    expect(degrees[2]).toBeCloseTo(4.265382804974067, 11);
    expect(free).toEqual([]);
  });

  it('keeps the digits of a tilt of a microradian', () => {
    const body: Body = {
      mass: 1,
      centre: [0, 0, 0],
      secondMoments: secondMomentsFromInertia([1, 2, 3, -1e-6, 0, 0]),
    };
    // First order: α = 1e-6 / (2 − 1).
    expect(principalAxes(body).tilt[0] / 1e-6).toBeCloseTo(1, 9);
  });

  it('gives body axes where a plane or everything is free, and says so', () => {
    const round: Body = { mass: 1, centre: [0, 0, 0], secondMoments: [1, 1, 3, 0, 0, 0] };
    expect(principalAxes(round)).toMatchObject({ nearest: ['z', 'x', 'y'], free: [1, 2], tilt: [0, 0, 0] });
    const ball: Body = { mass: 1, centre: [0, 0, 0], secondMoments: [1, 1, 1, 0, 0, 0] };
    expect(principalAxes(ball)).toMatchObject({
      axes: [
        [1, 0, 0],
        [0, 1, 0],
        [0, 0, 1],
      ],
      free: [0, 1, 2],
    });
  });
});
