import { describe, expect, it } from 'vitest';
import {
  displayUnits,
  plainText,
  scaleFor,
  TENSOR_ROOM,
  unitOfLimit,
  unitText,
} from '../../../core/figures/index.ts';
import { buildLimit, buildRecord } from '../../helpers/build-record.ts';

const record = buildRecord();

describe('displayUnits', () => {
  it('takes the units of the file where nothing else is asked for', () => {
    expect(displayUnits(record)).toMatchObject({
      length: { text: 'mm', factor: 0.001 },
      inertia: { text: 'g·mm²', factor: 1e-9 },
      angle: { text: '°' },
    });
  });

  it('takes SI, or names each for its own kind in any order', () => {
    expect(displayUnits(record, 'si').inertia).toEqual({ text: 'kg·m²', factor: 1 });
    const mixed = displayUnits(record, 'deg, cm,kg');
    expect([mixed.length.text, mixed.mass.text, mixed.angle.text, mixed.inertia.text]).toEqual([
      'cm',
      'kg',
      '°',
      'kg·cm²',
    ]);
    expect(mixed.inertia.factor).toBe(1e-4);
  });

  it('refuses a name that is no unit, a kind that is not shown and two of one kind', () => {
    expect(() => displayUnits(record, 'mm,furlong')).toThrow(/furlong/);
    expect(() => displayUnits(record, 's')).toThrow(/a time/);
    expect(() => displayUnits(record, 'mm,cm')).toThrow(/two units of length/);
  });

  it('keeps the unit in which a file writes a limit unless others are asked for', () => {
    const limit = buildLimit({ value: 0.2, max: 0.25, shown: { unit: 'oz', factor: 0.028349523125 } });
    expect(unitOfLimit(limit, displayUnits(record)).text).toBe('oz');
    expect(unitOfLimit(limit, displayUnits(record, 'si')).text).toBe('kg');
    expect(unitOfLimit({ unit: '1', shown: { unit: '', factor: 1 } }, displayUnits(record, 'si')).text).toBe(
      '',
    );
  });
});

describe('scaleFor', () => {
  it('puts an engineering power of ten in the head of a tensor whose figures need it', () => {
    const si = displayUnits(record, 'si').inertia;
    expect(scaleFor(si, [9.7874e-3], TENSOR_ROOM)).toEqual({ head: 'kg·m² × 10⁻³', factor: 0.001 });
    expect(scaleFor(si, [12.5], TENSOR_ROOM).head).toBe('kg·m²');
    expect(scaleFor(si, [2.4e7], TENSOR_ROOM).head).toBe('kg·m² × 10⁶');
    expect(scaleFor(si, [0], TENSOR_ROOM).head).toBe('kg·m²');
  });
});

describe('unitText', () => {
  it('raises powers, dots products and leaves a plain number without unit', () => {
    expect(['g*mm^2', 'kg/m^3', 'deg', '1', 'm^-2'].map(unitText)).toEqual([
      'g·mm²',
      'kg/m³',
      '°',
      '',
      'm⁻²',
    ]);
  });
});

describe('plainText', () => {
  it('shows control and turning characters instead of passing them on', () => {
    expect(plainText('a\x1b[31mb\u202ec\u2028\ud800é船')).toBe('a\\x1b[31mb\\u{202e}c\\u{2028}\\u{d800}é船');
  });
});
