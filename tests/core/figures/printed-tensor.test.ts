import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  formatFixed,
  isPossible,
  printMoments,
  printTensor,
  readFigure,
  tensorRows,
} from '../../../core/figures/index.ts';
import { inertiaAboutCentre } from '../../../core/inertia/body.ts';
import { eigenSymmetric3 } from '../../../core/linalg/eigen-symmetric3.ts';
import type { Symmetric3 } from '../../../core/linalg/symmetric3.ts';
import { anyParticles, bodyOf } from '../../helpers/build-record.ts';

/** A uniform plate in its own plane, 1 kg: I_zz is exactly I_xx + I_yy. */
const plate = (a: number, b: number): Symmetric3 => [
  (b * b) / 12,
  (a * a) / 12,
  (a * a + b * b) / 12,
  0,
  0,
  0,
];

/** Judges what a reader reads, by another road than the code's whole-number minors. */
function smallestSecondMoment(rows: string[][]): number {
  const j = rows.map((row) => row.map(readFigure));
  const half = (j[0]![0]! + j[1]![1]! + j[2]![2]!) / 2;
  const q: Symmetric3 = [
    half - j[0]![0]!,
    half - j[1]![1]!,
    half - j[2]![2]!,
    -j[0]![1]!,
    -j[0]![2]!,
    -j[1]![2]!,
  ];
  return eigenSymmetric3(q).values[0] / half;
}

describe('printTensor', () => {
  it('keeps a flat plate possible at two to six digits, where plain rounding leaves the sum short', () => {
    let short = 0;
    for (let digits = 2; digits <= 6; digits++) {
      const tensor = plate(0.1, 0.2);
      const printed = printTensor(tensor, digits);
      const [a, b, c] = tensor.slice(0, 3).map((x) => readFigure(formatFixed(x, printed.decimals)));
      if (a! + b! < c! - 1e-12) short++;
      expect(isPossible(printed.units)).toBe(true);
      const [xx, yy, zz] = printed.units as bigint[];
      expect(xx! + yy! >= zz!).toBe(true);
    }
    expect(short).toBeGreaterThan(0);
  });

  it('mends a plate by rounding the largest moment toward the sum of the others, and says so', () => {
    const printed = printTensor([0.33334, 0.33334, 0.66668, 0, 0, 0], 4);
    expect(printed.units.slice(0, 3)).toEqual([3333n, 3333n, 6666n]);
    expect(printed.note).toBe('last digits changed by one so that the printed tensor stays possible');
  });

  it('leaves a tensor alone that plain rounding keeps possible', () => {
    const printed = printTensor([0.2562, 9.6457, 9.7874, 0.0042, 0.421, 0.0006]);
    expect(tensorRows(printed, 'negative')).toEqual([
      ['0.2562', '0.0042', '0.4210'],
      ['0.0042', '9.6457', '0.0006'],
      ['0.4210', '0.0006', '9.7874'],
    ]);
    expect(printed.note).toBeNull();
  });

  it('turns the sign of the products alone where they are asked for as +∫xy dm', () => {
    const rows = tensorRows(printTensor([1, 2, 2.5, 0.1, -0.2, 0]), 'positive');
    expect(rows[0]).toEqual(['1.0000', '−0.1000', '0.2000']);
    expect(rows[2]![2]).toBe('2.5000');
    expect(rows[1]![2]).toBe('0.0000');
  });

  it('is possible in its printed digits for every body of particles, rods and flat ones too', () => {
    const flat = anyParticles().map((ps) =>
      ps.map((p) => ({ ...p, at: [p.at[0], p.at[1], p.at[0] / 3] as const })),
    );
    const straight = anyParticles().map((ps) =>
      ps.map((p) => ({ ...p, at: [p.at[0], p.at[0] * 0.7, p.at[0] / 3] as const })),
    );
    fc.assert(
      fc.property(
        fc.oneof(anyParticles(), flat, straight),
        fc.integer({ min: 2, max: 7 }),
        (particles, digits) => {
          const tensor = inertiaAboutCentre(bodyOf(particles));
          const printed = printTensor(tensor, digits);
          if (printed.note !== 'no body has this tensor') {
            expect(isPossible(printed.units)).toBe(true);
            expect(smallestSecondMoment(tensorRows(printed, 'negative')) || 0).toBeGreaterThanOrEqual(-1e-12);
          }
          const ten = 10 ** printed.decimals;
          printed.units.forEach((u, k) => {
            expect(Math.abs(Number(u) - tensor[k]! * ten)).toBeLessThanOrEqual(4);
          });
        },
      ),
      { numRuns: 1500 },
    );
  });

  it('seldom has to change a digit by more than one or add more than two', () => {
    let more = 0;
    const straight = fc
      .sample(anyParticles(), { numRuns: 400, seed: 7 })
      .map((ps) => ps.map((p) => ({ ...p, at: [p.at[0], p.at[0] * 0.7, p.at[0] / 3] as const })));
    for (const particles of straight) {
      const tensor = inertiaAboutCentre(bodyOf(particles));
      const plain = printTensor(tensor, 5);
      const ten = 10 ** plain.decimals;
      if (plain.units.some((u, k) => Math.abs(Number(u) - tensor[k]! * ten) > 1.001)) more++;
    }
    expect(more).toBeLessThan(4);
  });

  it('prints a cut-out, whose moments are negative, by the same rule', () => {
    const minus = plate(0.1, 0.2).map((x) => -x) as unknown as Symmetric3;
    const printed = printTensor(minus, 3);
    expect(isPossible(printed.units.map((u) => -u))).toBe(true);
    expect(tensorRows(printed, 'negative')[2]![2]).toMatch(/^−/);
  });

  it('says of a tensor that no body can have what it is instead of mending it', () => {
    expect(printTensor([1, 1, 3, 0, 0, 0]).note).toBe('no body has this tensor');
  });
});

describe('printMoments', () => {
  it('never prints one moment as more than the other two together', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-9, max: 1e9, noNaN: true }),
        fc.double({ min: 1e-9, max: 1e9, noNaN: true }),
        fc.integer({ min: 2, max: 6 }),
        (a, b, digits) => {
          const moments = [Math.min(a, b), Math.max(a, b), a + b];
          const { decimals, texts } = printMoments(moments, digits);
          const [x, y, z] = texts.map((t) => BigInt(t.replace('.', '')));
          expect(x! + y! >= z!).toBe(true);
          expect(texts.every((t) => (t.split('.')[1]?.length ?? 0) === decimals)).toBe(true);
        },
      ),
    );
  });
});
