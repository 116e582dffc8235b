import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { shiftedText } from '../../../core/units/decimal-text.ts';
import { getUnit, literalValue, parseUnit, shiftDecimal, type Unit } from '../../../core/units/index.ts';

const decimal = fc
  .tuple(
    fc.bigInt({ min: 0n, max: 10n ** 20n }),
    fc.integer({ min: 0, max: 25 }),
    fc.integer({ min: -30, max: 30 }),
  )
  .map(([digits, places, exponent]) => {
    const text = String(digits).padStart(places + 1, '0');
    const written = places === 0 ? text : `${text.slice(0, -places)}.${text.slice(-places)}`;
    return { digits, power: exponent - places, text: exponent === 0 ? written : `${written}e${exponent}` };
  });

/** Whether a double is nearest to top / bottom: no neighbour is nearer, by whole-number arithmetic alone. */
function isNearest(double: number, top: bigint, bottom: bigint): boolean {
  const distance = (x: number): [bigint, bigint] => {
    const [n, d] = asFraction(x);
    const difference = n * bottom - top * d;
    return [difference < 0n ? -difference : difference, d];
  };
  const [mine, myScale] = distance(double);
  return [neighbour(double, 1n), neighbour(double, -1n)].every((other) => {
    const [its, itsScale] = distance(other);
    return mine * itsScale <= its * myScale;
  });
}

function asFraction(x: number): [bigint, bigint] {
  let value = x;
  let bottom = 1n;
  while (!Number.isInteger(value)) {
    value *= 2;
    bottom *= 2n;
  }
  return [BigInt(value), bottom];
}

function neighbour(x: number, step: bigint): number {
  const double = new Float64Array([x]);
  const bits = new BigInt64Array(double.buffer);
  bits[0] = bits[0]! + step;
  return double[0]!;
}

describe('a decimal with a unit', () => {
  it('of millimetres reads as the decimal of metres', () => {
    expect(literalValue('1.2', getUnit('mm'))).toBe(0.0012);
    expect(literalValue('0.1', getUnit('um'))).toBe(1e-7);
    expect(literalValue('3e2', getUnit('km'))).toBe(300000);
    expect(literalValue('1.1', parseUnit('g/mm^3'))).toBe(1100000);
    expect(literalValue('5200', parseUnit('g*mm^2'))).toBe(5.2e-6);
  });

  it('of inches, pounds and ounces reads as the exact product', () => {
    expect(literalValue('0.1', getUnit('in'))).toBe(0.00254);
    expect(literalValue('3.3', getUnit('ft'))).toBe(1.00584);
    expect(literalValue('9', getUnit('oz'))).toBe(0.255145708125);
    expect(literalValue('1', parseUnit('lb/in^3'))).toBe(Number('27679.9047102031211936')); // 0.45359237 / 0.0254^3
  });

  it('of degrees and turns reads as the double nearest to the true angle', () => {
    expect(literalValue('180', getUnit('deg'))).toBe(Math.PI);
    expect(literalValue('90', getUnit('deg'))).toBe(Math.PI / 2);
    expect(literalValue('0.5', getUnit('rev'))).toBe(Math.PI);
    expect(literalValue('30', getUnit('rpm'))).toBe(Math.PI);
  });

  const tens: readonly (readonly [string, number])[] = [
    ['mm', -3],
    ['um', -6],
    ['km', 3],
    ['g*mm^2', -9],
    ['g/mm^3', 6],
    ['kN/mm', 6],
    ['1/mm', 3],
  ];
  it.each(tens)('of %s is the double nearest to the number with its exponent moved by %d', (name, power) => {
    const unit = parseUnit(name);
    expect(unit.decimalExponent).toBe(power);
    fc.assert(
      fc.property(decimal, ({ digits, power: written, text }) => {
        expect(literalValue(text, unit)).toBe(Number(`${digits}e${written + power}`));
      }),
    );
  });

  const fractions: readonly (readonly [string, bigint, bigint])[] = [
    ['mm', 1n, 1000n],
    ['in', 254n, 10000n],
    ['ft', 3048n, 10000n],
    ['lb', 45359237n, 100000000n],
    ['oz', 45359237n, 1600000000n],
    ['slug', 44482216152605n, 3048000000000n],
    ['hour', 3600n, 1n],
    ['lb*in^2', 45359237n * 254n ** 2n, 10n ** 16n],
  ];
  it.each(fractions)('of %s has no double nearer to its exact value', (name, top, bottom) => {
    const unit: Unit = parseUnit(name);
    fc.assert(
      fc.property(decimal, ({ digits, power, text }) => {
        const ten = 10n ** BigInt(Math.abs(power));
        const [a, b] = power < 0 ? [digits * top, bottom * ten] : [digits * top * ten, bottom];
        expect(digits === 0n || isNearest(literalValue(text, unit), a, b)).toBe(true);
      }),
    );
  });

  it('of absurd size neither hangs nor fails', () => {
    expect(literalValue('1e999999999', getUnit('in'))).toBe(Infinity);
    expect(literalValue('1e-999999999', getUnit('in'))).toBe(0);
    expect(literalValue('1e99999999999999999999999', getUnit('mm'))).toBe(Infinity);
    expect(literalValue('1e-99999999999999999999999', getUnit('mm'))).toBe(0);
    expect(literalValue('7'.repeat(1900), getUnit('deg'))).toBe(Infinity);
  });
});

describe('shiftedText', () => {
  it('unshifted is the shortest text that the language itself writes', () => {
    const magnitude = fc.integer({ min: -12, max: 25 });
    const written = fc
      .tuple(fc.integer({ min: 1, max: 999_999 }), magnitude)
      .map(([n, k]) => Number(`${n}e${k}`));
    fc.assert(
      fc.property(fc.oneof(written, fc.double({ noNaN: true, noDefaultInfinity: true })), (value) => {
        expect(shiftedText(value, 0)).toBe(String(value).replace('e+', 'e'));
      }),
      { numRuns: 1000 },
    );
  });

  it('moves the point and drops the zeros it uncovers', () => {
    expect(shiftedText(0.0012, 3)).toBe('1.2');
    expect(shiftedText(1200, -3)).toBe('1.2');
    expect(shiftedText(-5e-324, 3)).toBe('-5e-321');
  });
});

describe('shiftDecimal', () => {
  it.each([
    ['12', -3, 0.012],
    ['-1.5', 3, -1500],
    ['1.5E2', -2, 1.5],
    ['.5', -1, 0.05],
    ['5.', 1, 50],
  ])('moves the exponent of %s by %d', (text, exponent, value) => {
    expect(shiftDecimal(text, exponent)).toBe(value);
  });
});
