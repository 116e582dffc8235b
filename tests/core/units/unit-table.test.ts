import { describe, expect, it } from 'vitest';
import {
  ANGULAR_SPEED,
  FORCE,
  FREQUENCY,
  findUnit,
  getUnit,
  MASS,
  TIME,
  UNIT_NAMES,
} from '../../../core/units/index.ts';

describe('the unit table', () => {
  // Published factors: NIST SP 811 (2008) appendix B.8 and the SI brochure; the slug to the digits of SP 811 and beyond.
  it.each([
    ['m', 1],
    ['km', 1000],
    ['cm', 0.01],
    ['mm', 0.001],
    ['um', 0.000001],
    ['in', 0.0254],
    ['ft', 0.3048],
    ['kg', 1],
    ['g', 0.001],
    ['mg', 0.000001],
    ['t', 1000],
    ['lb', 0.45359237],
    ['oz', 0.028349523125],
    ['rad', 1],
    ['rev', 2 * Math.PI],
    ['deg', 0.017453292519943295],
    ['s', 1],
    ['minute', 60],
    ['hour', 3600],
    ['Hz', 1],
    ['N', 1],
    ['kN', 1000],
    ['lbf', 4.4482216152605],
    ['rpm', 0.10471975511965978],
  ])('has %s at %d in SI', (name, factor) => {
    expect(getUnit(name).factor).toBe(factor);
  });

  it('has the slug at 14.59390 kg, the mass that one pound-force moves by one foot per second squared', () => {
    expect(getUnit('slug').factor).toBeCloseTo(14.59390293720636, 12);
    expect(getUnit('slug').factor * getUnit('ft').factor).toBeCloseTo(getUnit('lbf').factor, 14);
  });

  it('holds exactly the units of the format', () => {
    const format = 'm km cm mm um in ft kg g mg t lb oz slug rad deg rev s minute hour Hz rpm N kN lbf';
    expect([...UNIT_NAMES]).toEqual(format.split(' '));
  });

  it('keeps frequency and angular speed apart', () => {
    expect(getUnit('Hz').dimension).toBe(FREQUENCY);
    expect(getUnit('rpm').dimension).toBe(ANGULAR_SPEED);
    expect(getUnit('lbf').dimension).toBe(FORCE);
    expect(getUnit('slug').dimension).toBe(MASS);
    expect(getUnit('hour').dimension).toBe(TIME);
  });

  it('minds capital letters and knows no object properties', () => {
    for (const name of ['MM', 'Kg', 'hz', 'constructor', '__proto__', ''])
      expect(findUnit(name)).toBeUndefined();
  });
});
