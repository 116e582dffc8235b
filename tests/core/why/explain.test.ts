import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { eigenSymmetric3 } from '#core/linalg/eigen-symmetric3.ts';
import { apply } from '#core/linalg/matrix3.ts';
import { type Matrix3, type Symmetric3, turnSymmetric } from '#core/linalg/symmetric3.ts';
import type { Vector3 } from '#core/linalg/vector3.ts';
import type { GivenTensor } from '#core/rollup/given-tensor.ts';
import { explain } from '#core/why/explain.ts';
import { UNIT_SLIPS } from '#core/why/inertia-units.ts';

const EXACT: Symmetric3 = [0, 0, 0, 0, 0, 0];

const given = (change: Partial<GivenTensor> & Pick<GivenTensor, 'inertia'>): GivenTensor => ({
  mass: null,
  centre: null,
  about: 'centre',
  products: 'negative',
  axes: 'unknown',
  halfUnits: EXACT,
  ...change,
});

/** Scalene, three different products, centre off every plane: symmetric cubes prove nothing. */
const J: Symmetric3 = [0.05, 0.07, 0.04, 0.002, -0.001, 0.003];
const A = given({ inertia: J, mass: 2, centre: [0.1, 0.02, -0.03] });

/** m (|c|² 1 − c cᵀ), written out. */
const shift = (m: number, [x, y, z]: Vector3): Symmetric3 => [
  m * (y * y + z * z),
  m * (x * x + z * z),
  m * (x * x + y * y),
  -m * x * y,
  -m * x * z,
  -m * y * z,
];
const plus = (a: Symmetric3, b: Symmetric3, k = 1) => a.map((x, i) => x + k * b[i]!) as unknown as Symmetric3;
const times = (a: Symmetric3, k: number) => a.map((x) => x * k) as unknown as Symmetric3;
const negated = (j: Symmetric3): Symmetric3 => [j[0], j[1], j[2], -j[3], -j[4], -j[5]];

const first = (b: GivenTensor, a = A) => {
  const found = explain(a, b);
  expect(found.explained, found.summary).toBe(true);
  return found.explanations[0]!;
};

describe('explain', () => {
  it('says that two tensors agree when they do, whatever each declares', () => {
    expect(explain(A, A).agree).toBe(true);
    const aboutOrigin = given({
      ...A,
      inertia: negated(plus(J, shift(2, A.centre!))),
      about: 'origin',
      products: 'positive',
    });
    expect(explain(A, aboutOrigin).agree).toBe(true);
  });

  it('calls all three products flipped a sign convention', () => {
    expect(first(given({ ...A, inertia: negated(J) })).sentence).toBe('B is A with its products negated.');
  });

  it.each([
    ['about the origin, not about its centre', plus(J, shift(2, [0.1, 0.02, -0.03]))],
    ['shifted twice from its centre to the origin', plus(J, shift(2, [0.1, 0.02, -0.03]), 2)],
    ['shifted from its centre the wrong way', plus(J, shift(2, [0.1, 0.02, -0.03]), -1)],
  ])('finds a tensor %s', (words, inertia) => {
    expect(first(given({ ...A, inertia })).sentence).toBe(`B is A ${words}.`);
  });

  it('finds a tensor that is declared about the origin and is about its centre', () => {
    expect(first(given({ ...A, about: 'origin' })).sentence).toBe(
      'B is A about its centre, not about the origin.',
    );
  });

  it('finds every pair of units, alone and with the sign', () => {
    for (const slip of UNIT_SLIPS) {
      const b = given({ inertia: times(J, 1 / slip.ratio) });
      expect(first(b).sentence).toBe(`B is A read in ${slip.is}, not ${slip.readAs}.`);
      const both = first(given({ inertia: times(negated(J), 1 / slip.ratio) }));
      expect(both.sentence).toBe(`B is A with its products negated, read in ${slip.is}, not ${slip.readAs}.`);
    }
  });

  it('knows the customary units by their definitions', () => {
    // NIST SP 811, appendix B: 1 lb·in² = 2.926397e-4 kg·m², 1 slug·ft² = 1.355818 kg·m², 1 lb·ft² = 4.214011e-2.
    const ratio = (is: string) => UNIT_SLIPS.find((s) => s.is === is && s.readAs === 'kg·m²')!.ratio;
    expect(ratio('lb·in²')).toBeCloseTo(2.926397e-4, 9);
    expect(ratio('slug·ft²')).toBeCloseTo(1.355818, 6);
    expect(ratio('lb·ft²')).toBeCloseTo(4.214011e-2, 7);
    expect(ratio('g·mm²')).toBe(1e-9);
  });

  it('finds elements in another order', () => {
    // Numbers that stand as xx xy xz yy yz zz and were taken as xx yy zz xy xz yz.
    const [xx, yy, zz, xy, xz, yz] = J;
    const b = given({ inertia: [xx, xy, xz, yy, yz, zz] });
    expect(first(b).sentence).toBe('B is A with its elements in the order xx xy xz yy yz zz.');
    const swapped = given({ inertia: [xx, yy, zz, xy, yz, xz] });
    expect(first(swapped).sentence).toBe('B is A with its elements in the order xx yy zz xy yz xz.');
  });

  it('leaves two flipped products to the centre: a half turn or a mirror image', () => {
    // About y: (x, y, z) → (−x, y, −z) and y → −y give the same tensor, with xy and yz flipped.
    const inertia: Symmetric3 = [J[0], J[1], J[2], -J[3], J[4], -J[5]];
    const [x, y, z] = A.centre!;
    expect(first(given({ inertia, mass: 2, centre: [-x, y, -z] })).sentence).toBe(
      'B is A turned half about y.',
    );
    expect(first(given({ inertia, mass: 2, centre: [x, -y, z] })).sentence).toBe(
      'B is A mirrored in the xz plane.',
    );
    const without = first(given({ inertia }), given({ inertia: J }));
    expect(without.sentence).toContain('turned half about y or mirrored in the xz plane');
    expect(without.centresAgree).toBeNull();
  });

  it('finds axes that swapped names', () => {
    const turn: Matrix3 = [
      [0, 1, 0],
      [0, 0, 1],
      [1, 0, 0],
    ];
    // b's vector v is a's R v, so a's tensor is R J_b Rᵀ: take J_b from it with the inverse, which is the transpose.
    const back: Matrix3 = [
      [0, 0, 1],
      [1, 0, 0],
      [0, 1, 0],
    ];
    const b = given({ ...A, inertia: turnSymmetric(back, J), centre: apply(back, A.centre!) });
    const e = first(b);
    expect(e.steps.map((s) => s.kind)).toEqual(['axes']);
    expect(e.centresAgree).toBe(true);
    expect(turnSymmetric(turn, b.inertia)).toEqual(J);
  });

  describe('of a part that its assembly turns by R', () => {
    const [c, s] = [0.8, 0.6];
    const rotation: Matrix3 = [
      [c, -s, 0],
      [s, c, 0],
      [0, 0, 1],
    ];
    const transposed: Matrix3 = [
      [c, s, 0],
      [-s, c, 0],
      [0, 0, 1],
    ];
    const offset: Vector3 = [0.4, -0.1, 0.25];
    const centre: Vector3 = [0.1, 0.02, -0.03];
    const axes = { turn: rotation, offset };
    const whole = (inertia: Symmetric3, more: Partial<GivenTensor> = {}) =>
      given({ inertia, axes: 'assembly', ...more });
    const part = (inertia: Symmetric3, more: Partial<GivenTensor> = {}) => given({ inertia, axes, ...more });

    it('brings it beside the assembly’s own numbers, whichever side it is on', () => {
      // The same body in the assembly: R J Rᵀ, offset + R c.
      const turnedCentre = apply(rotation, centre).map((x, k) => x + offset[k]!) as unknown as Vector3;
      const own = part(J, { mass: 2, centre });
      const placed = whole(turnSymmetric(rotation, J), { mass: 2, centre: turnedCentre });
      for (const found of [explain(own, placed), explain(placed, own)]) {
        expect(found.agree).toBe(true);
        expect(found.explanations[0]!.centresAgree).toBe(true);
        expect(found.summary).toBe('B is A: the two agree as they are declared.');
      }
    });

    it('finds the rotation transposed or left out, whichever side it is on', () => {
      const slipped = whole(turnSymmetric(transposed, J));
      const unturned = whole(J);
      for (const [a, b] of [
        [part(J), slipped],
        [slipped, part(J)],
      ] as const)
        expect(first(b, a).sentence).toBe('B is A turned by the transpose of its rotation.');
      for (const [a, b] of [
        [part(J), unturned],
        [unturned, part(J)],
      ] as const)
        expect(first(b, a).sentence).toBe('B is A not turned by its rotation.');
    });

    it('takes it as it is written beside itself and beside numbers whose axes nobody knows', () => {
      expect(explain(part(J), part(J)).agree).toBe(true);
      expect(explain(part(J), given({ inertia: J })).agree).toBe(true);
      expect(explain(given({ inertia: J }), part(J)).agree).toBe(true);
      const there = given({ inertia: turnSymmetric(rotation, J) });
      expect(first(there, part(J)).sentence).toBe('B is A turned by its rotation.');
      expect(first(part(J), there).sentence).toBe('B is A not turned by its rotation.');
    });

    it('calls no two bodies mirror images because their centres are told in different axes', () => {
      const apart = whole(J, { mass: 2, centre: [-0.3, -0.02, 0.01] });
      const found = explain(whole(J, { mass: 2, centre }), apart);
      expect([found.agree, found.summary]).toEqual([
        true,
        'B is A: the two agree as they are declared; their centres do not.',
      ]);
    });
  });

  it('says that two tensors of nothing agree, and one of nothing with none other', () => {
    const nothing = given({ inertia: [0, 0, 0, 0, 0, 0] });
    expect(explain(nothing, nothing).agree).toBe(true);
    expect(explain(A, nothing).explained).toBe(false);
    expect(explain(nothing, A).explained).toBe(false);
  });

  it('keeps to the digits given, and says how near it came where nothing explains', () => {
    const rounded: Symmetric3 = [0.0501, 0.0699, 0.04, -0.002, 0.001, -0.003];
    const half = EXACT.map(() => 0.0001) as unknown as Symmetric3;
    expect(first(given({ inertia: rounded, halfUnits: half })).sentence).toBe(
      'B is A with its products negated.',
    );
    const nothing = explain(A, given({ inertia: rounded }));
    expect(nothing.explained).toBe(false);
    expect(nothing.summary).toContain('Nothing explains it within the digits given');
    expect(nothing.explanations[0]!.residual).toBeCloseTo(0.0001 / 0.07, 6);
    const other = explain(A, given({ inertia: [3, 4, 5, 0.3, 0.1, 0.2] }));
    expect([other.explained, other.explanations]).toEqual([false, []]);
    expect(other.differences[0]).toMatchObject({ element: 'zz', a: 0.04, b: 5 });
  });

  it('marks a reading that no body can have', () => {
    const a = given({ inertia: [1, 2, 3.5, 0.1, 0.2, 0.3] });
    expect(first(given({ inertia: negated(a.inertia) }), a).possible).toBe(false);
  });

  it('explains published pairs', () => {
    // NASA NESC flight-simulation check cases, Apollo-like vehicle: one printed set, read under both signs of products.
    const printed: Symmetric3 = [36502.7, 38372.4, 36514.9, -27.1, 233.2, 1152.4];
    const other = given({ inertia: printed, products: 'positive' });
    expect(first(other, given({ inertia: printed })).sentence).toBe('B is A with its products negated.');
    // Their principal moments differ: 35883.675776… and 35897.771939… kg·m² for the smallest.
    expect(eigenSymmetric3(printed).values[0]).toBeCloseTo(35883.675776215365, 6);
    // F. Tonon, J. Math. Stat. 1(1), 2004: the template puts −b' (xz) and −c' (xy) into each other's place.
    const right: Symmetric3 = [
      43520.33257, 194711.28938, 191168.76173, -11996.20119, 46343.16662, -4417.6615,
    ];
    const slipped: Symmetric3 = [right[0], right[1], right[2], right[4], right[3], right[5]];
    expect(first(given({ inertia: slipped }), given({ inertia: right })).sentence).toBe(
      'B is A with its elements in the order xx yy zz xz xy yz.',
    );
    // B. L. Stevens & F. L. Lewis, Aircraft Control and Simulation, appendix A: Ixz = +982 slug·ft² is the plus integral;
    // copied into the tensor's slot it is a half turn about x or z as far as the tensor tells, or the sign of products.
    const f16: Symmetric3 = [9496, 55814, 63100, 0, -982, 0];
    const copied: Symmetric3 = [9496, 55814, 63100, 0, 982, 0];
    const sentences = explain(given({ inertia: f16 }), given({ inertia: copied })).explanations.map(
      (e) => e.sentence,
    );
    expect(sentences).toContain('B is A with its products negated.');
  });

  it('finds any one slip of sign, point, unit or half turn, and any two of them, with no more slips than were made', () => {
    const point = fc.double({ min: 0.02, max: 0.2, noNaN: true });
    const body = fc
      .tuple(fc.array(fc.tuple(point, point, point), { minLength: 5, maxLength: 8 }), point, point, point)
      .map(([points, ...centre]) => {
        // Second moments of equal points about their mean: a possible tensor by construction.
        const mean = [0, 1, 2].map((k) => points.reduce((s, p) => s + p[k]!, 0) / points.length);
        const q = (i: number, k: number) =>
          points.reduce((s, p) => s + (p[i]! - mean[i]!) * (p[k]! - mean[k]!), 0) +
          (i === k ? 0.001 * (i + 1) : 0);
        const inertia: Symmetric3 = [
          q(1, 1) + q(2, 2),
          q(0, 0) + q(2, 2),
          q(0, 0) + q(1, 1),
          -q(0, 1),
          -q(0, 2),
          -q(1, 2),
        ];
        return given({ inertia, mass: 3, centre: centre as unknown as Vector3 });
      });
    const slip = fc.record({
      sign: fc.boolean(),
      shifts: fc.constantFrom(0, 1, 2, -1),
      unit: fc.option(fc.constantFrom(...UNIT_SLIPS)),
    });
    fc.assert(
      fc.property(body, slip, (a, { sign, shifts, unit }) => {
        const made = Number(sign) + Number(shifts !== 0) + Number(unit !== null);
        const shifted = plus(a.inertia, shift(3, a.centre!), shifts);
        const signed = sign ? negated(shifted) : shifted;
        const b = given({ ...a, inertia: unit ? times(signed, 1 / unit.ratio) : signed });
        const found = explain(a, b);
        expect(found.explained).toBe(true);
        expect(found.explanations[0]!.steps.length).toBeLessThanOrEqual(made);
      }),
      { numRuns: 200 },
    );
  });
});
