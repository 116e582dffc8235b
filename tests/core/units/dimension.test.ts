import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  AREA,
  aDimension,
  baseUnitText,
  dimension,
  dimensionName,
  FORCE,
  INERTIA,
  LENGTH,
  MASS,
  PLAIN,
  parseUnit,
  productDimension,
} from '../../../core/units/index.ts';

const exponent = fc.integer({ min: -40, max: 40 });
const anyDimension = fc.tuple(exponent, exponent, exponent, exponent).map((e) => dimension(...e));

describe('a dimension', () => {
  it('is one object for each kind', () => {
    fc.assert(
      fc.property(anyDimension, anyDimension, (a, b) => {
        const same = a.length === b.length && a.mass === b.mass && a.time === b.time && a.angle === b.angle;
        expect(a === b).toBe(same);
        expect(dimension(a.length, a.mass, a.time, a.angle)).toBe(a);
      }),
    );
  });

  it('is another object when any exponent differs', () => {
    const places = [-17, -16, -1, 0, 1, 15, 16];
    const kinds = new Set<unknown>();
    for (const a of places)
      for (const b of places)
        for (const c of places) for (const d of places) kinds.add(dimension(a, b, c, d));
    expect(kinds.size).toBe(places.length ** 4);
  });

  it('divides back what it multiplied', () => {
    fc.assert(
      fc.property(anyDimension, anyDimension, (a, b) => {
        expect(productDimension(productDimension(a, b)!, b, -1)).toBe(a);
      }),
    );
  });

  it('has whole powers or none', () => {
    expect(productDimension(PLAIN, AREA, 0.5)).toBe(LENGTH);
    expect(productDimension(PLAIN, dimension(3, 0, 0, 0), 1 / 3)).toBe(LENGTH);
    expect(productDimension(PLAIN, LENGTH, 0.5)).toBeUndefined();
    expect(productDimension(PLAIN, LENGTH, 101)).toBeUndefined();
    expect(productDimension(PLAIN, LENGTH, Number.NaN)).toBeUndefined();
    expect(() => dimension(0.5, 0, 0, 0)).toThrow(RangeError);
  });

  it('is named in words, with the right article', () => {
    expect(dimensionName(INERTIA)).toBe('moment of inertia');
    expect(aDimension(AREA)).toBe('an area');
    expect(aDimension(MASS)).toBe('a mass');
    expect(aDimension(PLAIN)).toBe('a plain number');
    expect(aDimension(dimension(3, 1, -1, 0))).toBe('a quantity in kg*m^3/s');
  });

  it('has a unit text that reads back as that dimension', () => {
    expect(baseUnitText(FORCE)).toBe('kg*m/s^2');
    fc.assert(
      fc.property(fc.tuple(...Array(4).fill(fc.integer({ min: -9, max: 9 }))), (e) => {
        const kind = dimension(...(e as [number, number, number, number]));
        if (kind !== PLAIN) expect(parseUnit(baseUnitText(kind)).dimension).toBe(kind);
      }),
    );
  });
});
