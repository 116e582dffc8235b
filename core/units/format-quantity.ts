import { fromSi } from './convert.ts';
import { shiftedText } from './decimal-text.ts';
import type { Unit } from './unit.ts';

/** Doubles carry 15 decimal digits for certain; more would show the conversion's own rounding. */
const CERTAIN_DIGITS = 15;

/**
 * A value in a unit as a file would write it: `1.2 mm`, `5 /s`, `3`. In a decimal-scaled unit it reads back as the same
 * double; in others to 15 digits.
 *
 * @param value in SI
 */
export function formatQuantity(value: number, unit: Unit): string {
  const number =
    unit.decimalExponent === undefined || !Number.isFinite(value)
      ? String(Number(fromSi(value, unit).toPrecision(CERTAIN_DIGITS)))
      : shiftedText(value, -unit.decimalExponent);
  return withUnit(number, unit);
}

/** A number's text followed by a unit: "5 mm", "5 /s", "5". */
export function withUnit(number: string, unit: Unit): string {
  if (unit.name === '') return number;
  return unit.name.startsWith('1/') ? `${number} ${unit.name.slice(1)}` : `${number} ${unit.name}`;
}
