import { describe, expect, it } from 'vitest';
import { DENSITY, dimension, INERTIA, parseUnit, TextError } from '../../../core/units/index.ts';

function faultOf(text: string): TextError {
  try {
    parseUnit(text);
  } catch (error) {
    if (error instanceof TextError) return error;
    throw error;
  }
  throw new Error(`${text} was read`);
}

describe('parseUnit', () => {
  it.each([
    ['mm', 'mm', 0.001],
    ['g*mm^2', 'g*mm^2', 1e-9],
    ['g * mm ^ 2', 'g*mm^2', 1e-9],
    ['kg/m^3', 'kg/m^3', 1],
    ['1/s', '1/s', 1],
    ['s^-1', '1/s', 1],
    ['m/s*kg', 'm*kg/s', 1],
    ['kg*m/s/s', 'kg*m/s/s', 1],
    ['lbf*s^2/ft', 'lbf*s^2/ft', 14.593902937206364],
  ])('reads %s', (text, name, factor) => {
    const unit = parseUnit(text);
    expect(unit.name).toBe(name);
    expect(unit.factor).toBe(factor);
    expect(parseUnit(unit.name)).toEqual(unit);
  });

  it('finds the dimension of a compound', () => {
    expect(parseUnit('g/cm^3').dimension).toBe(DENSITY);
    expect(parseUnit('lb*in^2').dimension).toBe(INERTIA);
    expect(parseUnit('N').dimension).toBe(parseUnit('kg*m/s^2').dimension);
    expect(parseUnit('rev/s').dimension).toBe(parseUnit('rpm').dimension);
    expect(parseUnit('mm/m').dimension).toBe(dimension(0, 0, 0, 0));
  });

  it.each([
    ['', 'UNITS_SYNTAX'],
    ['1', 'UNITS_SYNTAX'],
    ['/s', 'UNITS_SYNTAX'],
    ['m m', 'UNITS_SYNTAX'],
    ['m*', 'UNITS_SYNTAX'],
    ['m^', 'UNITS_SYNTAX'],
    ['m^0', 'UNITS_SYNTAX'],
    ['m^1.5', 'UNITS_SYNTAX'],
    ['m/1', 'UNITS_SYNTAX'],
    ['2 mm', 'UNITS_SYNTAX'],
    ['m^60*m^60', 'UNITS_SYNTAX'],
    ['lb^60/kg^60', 'UNITS_SYNTAX'],
    ['furlong', 'UNITS_UNKNOWN_NAME'],
    ['g*mmm', 'UNITS_UNKNOWN_NAME'],
  ])('refuses "%s" with %s', (text, code) => {
    expect(faultOf(text).code).toBe(code);
  });

  it('points at the unknown name and proposes a known one', () => {
    expect(faultOf('g*mmm^2')).toMatchObject({
      message: '"mmm" is not a unit',
      hint: 'did you mean mm?',
      start: 2,
      end: 5,
    });
    expect(faultOf('µm').hint).toBe('did you mean um?');
    expect(faultOf('inch').hint).toBe('did you mean in?');
    expect(faultOf('kg/m3').hint).toBe('did you mean m^3?');
    expect(faultOf('g*mm²').hint).toBe('did you mean mm^2?');
  });
});
