import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  ANGLE,
  DENSITY,
  FORCE,
  FREQUENCY,
  formatQuantity,
  fromSi,
  getUnit,
  INERTIA,
  LENGTH,
  literalValue,
  MASS,
  PLAIN,
  parseUnit,
  SI_UNITS,
  toSi,
  unitFor,
} from '../../../core/units/index.ts';

const file = { length: getUnit('mm'), mass: getUnit('g'), angle: getUnit('deg'), time: getUnit('s') };

describe('the units of a file', () => {
  it('give bare numbers of derived kinds the product of the base units', () => {
    expect(unitFor(INERTIA, file).name).toBe('g*mm^2');
    expect(unitFor(INERTIA, file).decimalExponent).toBe(-9);
    expect(unitFor(DENSITY, file).name).toBe('g/mm^3');
    expect(unitFor(FORCE, file).name).toBe('g*mm/s^2');
    expect(unitFor(FREQUENCY, file).name).toBe('1/s');
    expect(unitFor(ANGLE, file)).toBe(file.angle);
    expect(unitFor(PLAIN, file)).toMatchObject({ name: '', factor: 1 });
  });

  it('give density and inertia the units the file names for them', () => {
    const named = { ...file, density: parseUnit('g/cm^3'), inertia: parseUnit('kg*m^2') };
    expect(unitFor(DENSITY, named)).toBe(named.density);
    expect(unitFor(INERTIA, named)).toBe(named.inertia);
    expect(unitFor(MASS, named)).toBe(named.mass);
    expect(unitFor(DENSITY, file).name).toBe('g/mm^3');
  });

  it('are m, kg, rad and s where the file says nothing', () => {
    expect([LENGTH, MASS, ANGLE, INERTIA].map((kind) => unitFor(kind, SI_UNITS).name)).toEqual([
      'm',
      'kg',
      'rad',
      'kg*m^2',
    ]);
  });
});

describe('a value in a unit', () => {
  it('prints as a file would write it', () => {
    expect(formatQuantity(0.0012, getUnit('mm'))).toBe('1.2 mm');
    expect(formatQuantity(Math.PI / 2, getUnit('deg'))).toBe('90 deg');
    expect(formatQuantity(0.0254, getUnit('in'))).toBe('1 in');
    expect(formatQuantity(5, parseUnit('1/s'))).toBe('5 /s');
    expect(formatQuantity(0.25, unitFor(PLAIN, file))).toBe('0.25');
    expect(formatQuantity(-0.3, getUnit('mm'))).toBe('-300 mm');
    expect(formatQuantity(1.5e-13, getUnit('mm'))).toBe('1.5e-10 mm');
    expect(formatQuantity(1e30, getUnit('km'))).toBe('1e27 km');
    expect(formatQuantity(0, getUnit('km'))).toBe('0 km');
  });

  it('in a decimal-scaled unit reads back as the same double', () => {
    for (const unit of [getUnit('mm'), getUnit('km'), parseUnit('g*mm^2')])
      fc.assert(
        fc.property(fc.double({ min: 0, noNaN: true, noDefaultInfinity: true }), (value) => {
          const written = formatQuantity(value, unit).split(' ')[0]!;
          expect(literalValue(written, unit)).toBe(value);
          if (value !== 0) expect(formatQuantity(-value, unit)).toBe(`-${formatQuantity(value, unit)}`);
        }),
      );
  });

  it('goes to SI with one rounding in a decimal-scaled unit', () => {
    expect(toSi(1.2, getUnit('mm'))).toBe(0.0012);
    expect(toSi(12, getUnit('mm'))).toBe(0.012);
    expect(toSi(2, getUnit('km'))).toBe(2000);
    for (let k = 1; k < 2000; k++) expect(fromSi(Number(`${k}e-4`), getUnit('mm'))).toBe(k / 10);
    expect(toSi(2, getUnit('in'))).toBe(0.0508);
  });
});
