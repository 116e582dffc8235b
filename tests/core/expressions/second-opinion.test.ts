import fc from 'fast-check';
import { evaluate, type Unit } from 'mathjs';
import { describe, expect, it } from 'vitest';
import { evaluateText } from './small-machine.ts';

/** Far above the rounding of a few operations and far below any mistake. */
const CLOSE = 1e-9;

const isClose = (a: number, b: number): boolean =>
  Math.abs(a - b) <= CLOSE * Math.max(1, Math.abs(a), Math.abs(b));

const { expression } = fc.letrec<{ expression: string }>((tie) => ({
  expression: fc.oneof(
    { depthSize: 'small' },
    fc.integer({ min: 0, max: 12 }).map(String),
    fc.constantFrom('0.5', '2.25', 'pi', '1e-1'),
    fc
      .tuple(tie('expression'), fc.constantFrom(' + ', ' - ', ' * ', ' / '), tie('expression'))
      .map((parts) => parts.join('')),
    tie('expression').map((inner) => `-${inner}`),
    tie('expression').map((inner) => `(${inner})`),
    fc
      .tuple(tie('expression'), fc.constantFrom('2', '3', '-1', '2^2'))
      .map(([base, power]) => `(${base})^${power}`),
    tie('expression').map((inner) => `${inner}^2`),
    fc
      .tuple(fc.constantFrom('min', 'max', 'hypot'), tie('expression'), tie('expression'))
      .map(([name, a, b]) => `${name}(${a}, ${b})`),
    fc.tuple(fc.constantFrom('abs', 'sqrt'), tie('expression')).map(([name, inner]) => `${name}(${inner})`),
  ),
}));

describe('a second opinion', () => {
  it('agrees on expressions of plain numbers', () => {
    let compared = 0;
    fc.assert(
      fc.property(expression, (text) => {
        let other: unknown;
        try {
          other = evaluate(text);
        } catch {
          return; // it orders no complex numbers
        }
        // Outside the reals, or past the size where cancellation leaves no digits, there is nothing to compare.
        if (typeof other !== 'number' || !(Math.abs(other) < 1e6)) return;
        let mine: number;
        try {
          mine = evaluateText(text);
        } catch {
          return;
        }
        compared++;
        expect(isClose(mine, other), `${text}: ${mine}, ${other}`).toBe(true);
      }),
      { numRuns: 3000, seed: 20_260_101 },
    );
    expect(compared).toBeGreaterThan(1000);
  });

  it.each([
    ['(3 ft + 2 in) / 4 s', '(3 ft + 2 inch) / (4 s)', 'm/s'],
    ['12 lb / 2 in^3', '12 lbm / (2 inch^3)', 'kg/m^3'],
    ['1 slug', '1 lbf s^2 / ft', 'kg'],
    ['5 oz * (2 in)^2', '5 oz * (2 inch)^2', 'kg m^2'],
    ['3 lbf / 1 kg', '3 lbf / (1 kg)', 'm/s^2'],
    ['2 kN * 3 mm', '2 kN * (3 mm)', 'N m'],
    ['sqrt(2 m^2 + 300 cm^2)', 'sqrt(2 m^2 + 300 cm^2)', 'm'],
    ['90 minute + 1 hour', '90 minute + 1 hour', 's'],
    ['abs(-3 t + 20 mg)', 'abs(-3 tonne + 20 mg)', 'kg'],
    ['sin(30 deg) * 1 um', 'sin(30 deg) * 1 um', 'm'],
    ['atan2(1, 2) / 1 rad * 1 km', 'atan2(1, 2) * 1 km', 'm'],
    ['2 m * tan(20 deg) - 1 ft', '2 m * tan(20 deg) - 1 ft', 'm'],
    ['1 / 2 s', '1 / (2 s)', 's^-1'],
    ['7850 kg/m^3 * 20 mm * 30 mm * 1.5 m', '7850 kg/m^3 * 20 mm * 30 mm * 1.5 m', 'kg'],
  ])('agrees on %s', (mine, other, unit) => {
    const value = (evaluate(other) as Unit).toNumber(unit);
    expect(Math.abs(evaluateText(mine) / value - 1)).toBeLessThan(1e-12);
  });
});
