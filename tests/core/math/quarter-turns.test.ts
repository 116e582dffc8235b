import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cos, rotationSineCosine, sin, tan, wholeQuarterTurns } from '../../../core/math/index.ts';

describe('quarter turns', () => {
  it.each([
    [0, 0, 1],
    [90, 1, 0],
    [180, 0, -1],
    [270, -1, 0],
    [360, 0, 1],
    [-90, -1, 0],
    [-180, 0, -1],
    [3690, 1, 0],
  ])('%d degrees has sine %d and cosine %d exactly', (degrees, sine, cosine) => {
    const angle = (degrees * Math.PI) / 180;
    expect(rotationSineCosine(angle)).toEqual({ sine, cosine });
    expect(rotationSineCosine(degrees * (Math.PI / 180))).toEqual({ sine, cosine });
  });

  it('holds for any whole number of quarters up to 2^20', () => {
    fc.assert(
      fc.property(fc.integer({ min: -(2 ** 20), max: 2 ** 20 }), (k) => {
        expect(wholeQuarterTurns((k * Math.PI) / 2) === k).toBe(true);
        expect(sin((k * Math.PI) / 2)).toBe([0, 1, 0, -1][((k % 4) + 4) % 4]);
        expect(cos((k * Math.PI) / 2)).toBe([1, 0, -1, 0][((k % 4) + 4) % 4]);
      }),
    );
  });

  it('leaves angles next to a quarter turn alone', () => {
    for (const off of [1e-14, -1e-14, 1e-9]) {
      expect(wholeQuarterTurns(Math.PI / 2 + off)).toBeUndefined();
      expect(cos(Math.PI / 2 + off)).toBeCloseTo(-off, 15);
    }
    expect(sin(1e-300)).toBe(1e-300);
    expect(wholeQuarterTurns(Number.NaN)).toBeUndefined();
    expect(wholeQuarterTurns(Infinity)).toBeUndefined();
  });

  it('gives tan no finite value at odd quarters, and 0 at even ones', () => {
    expect(tan(Math.PI / 2)).toBe(Infinity);
    expect(tan(Math.PI)).toBe(0);
  });
});
