import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { acos, asin, atan, atan2, cos, hypot, pow, sin, tan } from '../../../core/math/index.ts';
import { ulpsApart } from './ulps.ts';

describe('elementary functions', () => {
  // Decimal expansions from the OEIS: A049469, A049470, A049471, A019673, A019670, A003881, A002193, A002580; the sine and
  // cosine of 10^22 are the classic test of argument reduction (Ng, "Argument reduction for huge arguments", 1992).
  it.each([
    ['sin 1', sin(1), '0.84147098480789650665250232163029899962'],
    ['cos 1', cos(1), '0.54030230586813971740093660744297660373'],
    ['tan 1', tan(1), '1.55740772465490223050697480745836017308'],
    ['asin 1/2', asin(0.5), '0.52359877559829887307710723054658381403'],
    ['acos 1/2', acos(0.5), '1.04719755119659774615421446109316762806'],
    ['atan 1', atan(1), '0.78539816339744830961566084581987572104'],
    ['atan2(1, -1)', atan2(1, -1), '2.35619449019234492884698253745962716315'],
    ['2^(1/2)', pow(2, 0.5), '1.41421356237309504880168872420969807857'],
    ['2^(1/3)', pow(2, 1 / 3), '1.25992104989487316476721060727822835057'],
    ['sin 10^22', sin(1e22), '-0.85220084976718880177270589375302'],
    ['cos 10^22', cos(1e22), '0.52321478539513894549759442588601'],
  ])('gives %s as published to one unit of the last place', (_, value, published) => {
    expect(ulpsApart(value, Number(published))).toBeLessThanOrEqual(1);
  });

  const angle = fc.double({ min: -1000, max: 1000, noNaN: true });
  const cosineLike = fc.double({ min: -1, max: 1, noNaN: true });
  it.each([
    ['asin', asin, Math.asin, cosineLike],
    ['acos', acos, Math.acos, cosineLike],
    ['atan', atan, Math.atan, angle],
  ] as const)('agrees with the engine on %s to two units of the last place', (_, ours, engine, argument) => {
    fc.assert(fc.property(argument, (x) => ulpsApart(ours(x), engine(x)) <= 2));
  });

  it('agrees with the engine on sin, cos and tan away from quarter turns', () => {
    fc.assert(
      fc.property(angle, (x) => {
        expect(Math.abs(sin(x) - Math.sin(x))).toBeLessThanOrEqual(2.3e-16);
        expect(Math.abs(cos(x) - Math.cos(x))).toBeLessThanOrEqual(2.3e-16);
        expect(Math.abs(sin(x) ** 2 + cos(x) ** 2 - 1)).toBeLessThanOrEqual(5e-16);
      }),
    );
  });

  it('gives whole powers of ten exactly as far as doubles hold them', () => {
    for (let k = 0; k <= 22; k++) expect(pow(10, k)).toBe(Number(`1e${k}`));
  });

  it('squares and cubes as multiplication does', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true }), (x) => {
        expect(pow(x, 2)).toBe(x * x);
        expect(pow(x, 3)).toBe(x * x * x);
      }),
    );
  });

  it('has no value for a negative base under a broken exponent', () => {
    expect(pow(-8, 1 / 3)).toBeNaN();
    expect(pow(-8, 0.5)).toBeNaN();
  });
});

describe('hypot', () => {
  it.each([
    [3, 4, 5],
    [-5, 12, 13],
    [0, -7, 7],
    [0, 0, 0],
    [0, 5e-324, 5e-324],
    [-Infinity, 3, Infinity],
    [3e200, 4e200, 5e200],
    [3e-200, 4e-200, 5e-200],
    [1e160, 1, 1e160],
    [1, 1e-160, 1],
    [3e-320, 4e-320, 5e-320],
  ])('of %d and %d is %d', (x, y, length) => {
    expect(ulpsApart(hypot(x, y), length)).toBeLessThanOrEqual(1);
    expect(hypot(y, x)).toBe(hypot(x, y));
  });

  it('agrees with the engine to two units of the last place over the whole range', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true }), fc.double({ noNaN: true }), (x, y) => {
        expect(ulpsApart(hypot(x, y), Math.hypot(x, y))).toBeLessThanOrEqual(2);
      }),
      { numRuns: 1000 },
    );
  });
});
