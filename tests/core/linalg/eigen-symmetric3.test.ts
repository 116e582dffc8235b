import fc from 'fast-check';
import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import { describe, expect, it } from 'vitest';
import { eigenSymmetric3 } from '#core/linalg/eigen-symmetric3.ts';
import { quaternionFromAxes } from '#core/linalg/quaternion.ts';
import { bilinear, type Symmetric3, toRows } from '#core/linalg/symmetric3.ts';
import { cross, dot, type Vector3 } from '#core/linalg/vector3.ts';
import { referenceCase } from '../../helpers/reference-cases.ts';

const entry = fc.integer({ min: -10_000, max: 10_000 }).map((n) => n / 1000);
const anySymmetric = fc.tuple(entry, entry, entry, entry, entry, entry) as fc.Arbitrary<Symmetric3>;

const six = (rows: number[][]): Symmetric3 => [
  rows[0]![0]!,
  rows[1]![1]!,
  rows[2]![2]!,
  rows[0]![1]!,
  rows[0]![2]!,
  rows[1]![2]!,
];

describe('eigenSymmetric3', () => {
  it('agrees with the eigenvalues of a general linear algebra library (ml-matrix)', () => {
    fc.assert(
      fc.property(anySymmetric, (a) => {
        const size = Math.max(...a.map(Math.abs), 1e-300);
        const other = new EigenvalueDecomposition(new Matrix(toRows(a)), {
          assumeSymmetric: true,
        }).realEigenvalues
          .slice()
          .sort((x, y) => x - y);
        eigenSymmetric3(a).values.forEach((value, i) => {
          expect(Math.abs(value - other[i]!)).toBeLessThanOrEqual(1e-13 * size);
        });
      }),
    );
  });

  it('gives vectors that turn the matrix to its values', () => {
    fc.assert(
      fc.property(anySymmetric, (a) => {
        const { values, vectors } = eigenSymmetric3(a);
        const size = Math.max(...a.map(Math.abs), 1e-300);
        for (let i = 0; i < 3; i++)
          for (let k = 0; k < 3; k++)
            expect(
              Math.abs(bilinear(vectors[i]!, a, vectors[k]!) - (i === k ? values[i]! : 0)),
            ).toBeLessThanOrEqual(4e-15 * size * 8);
      }),
    );
  });

  it('orders values upward and makes the axes right-handed, the first two with their largest component positive', () => {
    fc.assert(
      fc.property(anySymmetric, (a) => {
        const { values, vectors } = eigenSymmetric3(a);
        expect(values[0]).toBeLessThanOrEqual(values[1]);
        expect(values[1]).toBeLessThanOrEqual(values[2]);
        for (const v of vectors.slice(0, 2)) {
          const largest = v.reduce((m, x) => (Math.abs(x) > Math.abs(m) ? x : m), 0);
          expect(largest).toBeGreaterThan(0);
        }
        expect(dot(cross(vectors[0], vectors[1]), vectors[2])).toBeCloseTo(1, 12);
      }),
    );
  });

  it('keeps the digits of a small value beside large ones', () => {
    // diag(1e-12, 1, 2) turned by 30° about z and then about x: the small value must not drown in eps × 2.
    const a: Symmetric3 = [1e-12, 1, 2, 0, 0, 0];
    expect(eigenSymmetric3(a).values[0]).toBe(1e-12);
    const graded = eigenSymmetric3([1e-12, 1, 2, 1e-7, 0, 0]);
    // By hand: λ ≈ 1e-12 − 1e-14 / (1 − 1e-12).
    expect(graded.values[0] / (1e-12 - 1e-14)).toBeCloseTo(1, 12);
  });

  it.each(['L-nesc-apollo', 'L-station'])('gives the published principal moments of %s', (id) => {
    // L-nesc-apollo: NASA NESC flight-simulation check cases, vehicle models. L-station: B. Wie, Space Vehicle Dynamics and
    // Control (data from memory); the eigenvalues were made at 50 digits.
    const { inputs, expected } = referenceCase(id);
    if (id === 'L-station') {
      eigenSymmetric3(six(inputs.I_1e6_slug_ft2)).values.forEach((value, i) => {
        expect(value / expected.principal_1e6_slug_ft2[i]).toBeCloseTo(1, 12);
      });
      return;
    }
    for (const [sign, moments, axes] of [
      [1, expected.principal_if_printed_products_are_tensor_entries, expected.axes_tensor_entries],
      [-1, expected.principal_if_printed_products_are_plus_integrals, expected.axes_plus_integrals],
    ] as const) {
      const { values, vectors } = eigenSymmetric3([
        inputs.Ixx,
        inputs.Iyy,
        inputs.Izz,
        sign * inputs.Ixy,
        sign * inputs.Izx,
        sign * inputs.Iyz,
      ]);
      for (const i of [0, 1, 2]) expect(values[i]! / moments[i]).toBeCloseTo(1, 12);
      for (const i of [0, 1, 2]) expect(Math.abs(dot(vectors[i]!, axes[i] as Vector3))).toBeCloseTo(1, 10);
    }
  });

  it('answers multiples of the unit matrix and zero', () => {
    expect(eigenSymmetric3([2, 2, 2, 0, 0, 0])).toEqual({
      values: [2, 2, 2],
      vectors: [
        [1, 0, 0],
        [0, 1, 0],
        [0, 0, 1],
      ],
    });
    expect(eigenSymmetric3([0, 0, 0, 0, 0, 0]).values).toEqual([0, 0, 0]);
  });
});

describe('quaternionFromAxes', () => {
  it('turns x, y, z into the axes it was made from', () => {
    fc.assert(
      fc.property(anySymmetric, (a) => {
        const { vectors } = eigenSymmetric3(a);
        const [w, x, y, z] = quaternionFromAxes(vectors);
        expect(w * w + x * x + y * y + z * z).toBeCloseTo(1, 12);
        expect(w).toBeGreaterThanOrEqual(0);
        // v' = v + 2 q × (q × v + w v)
        const turn = (v: Vector3): number[] => {
          const q: Vector3 = [x, y, z];
          const c = cross(q, v);
          const d = cross(q, [c[0] + w * v[0], c[1] + w * v[1], c[2] + w * v[2]]);
          return [v[0] + 2 * d[0], v[1] + 2 * d[1], v[2] + 2 * d[2]];
        };
        (
          [
            [1, 0, 0],
            [0, 1, 0],
            [0, 0, 1],
          ] as const
        ).forEach((v, i) => {
          for (const k of [0, 1, 2]) expect(turn(v)[k]).toBeCloseTo(vectors[i]![k]!, 12);
        });
      }),
    );
  });

  it('knows a quarter turn about z', () => {
    const [w, x, y, z] = quaternionFromAxes([
      [0, 1, 0],
      [-1, 0, 0],
      [0, 0, 1],
    ]);
    expect([w, x, y, z]).toEqual([expect.closeTo(Math.SQRT1_2, 15), 0, 0, expect.closeTo(Math.SQRT1_2, 15)]);
  });
});
