import { shiftDecimal } from './decimal-text.ts';
import type { Unit } from './unit.ts';

/** Whole powers of ten that are doubles without rounding. */
const EXACT_TENS = Array.from({ length: 23 }, (_, k) => Number(`1e${k}`));

/** Value in SI from a value in a unit. Decimal-scaled units divide by an exact power of ten instead of rounding twice. */
export function toSi(value: number, unit: Unit): number {
  const scale = unitScale(unit);
  return scale.divide ? value / scale.by : value * scale.by;
}

/** How to bring a value in a unit to SI with one rounding where there is a way: × by, or ÷ by. */
export function unitScale(unit: Unit): { divide: boolean; by: number } {
  const tens = unit.decimalExponent === undefined ? undefined : EXACT_TENS[Math.abs(unit.decimalExponent)];
  if (tens === undefined) return { divide: false, by: unit.factor };
  return { divide: unit.decimalExponent! < 0, by: tens };
}

/** Value in a unit from a value in SI. For a decimal-scaled unit, the double nearest to the shortest decimal, shifted. */
export function fromSi(value: number, unit: Unit): number {
  if (unit.decimalExponent === undefined || !Number.isFinite(value)) return value / unit.factor;
  return shiftDecimal(String(value), -unit.decimalExponent);
}
