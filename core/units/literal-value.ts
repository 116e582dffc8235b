import { decimalParts, shiftDecimal } from './decimal-text.ts';
import { nearestProduct } from './exact-factor.ts';
import type { Unit } from './unit.ts';

/** Beyond these the exact product would be slow and its double zero or infinite, or near it. */
const LONGEST_EXACT = 100;
const LARGEST_EXACT_EXPONENT = 250;

/** Values met so far in units that take an exact product, by unit and text: the same sizes and angles recur. */
const known = new WeakMap<Unit, Map<string, number>>();
const MOST_KNOWN = 2000;

/**
 * The SI value of a decimal number written with a unit: the nearest double. Decimal-scaled units shift the exponent in
 * the text; the others multiply exactly (numbers of up to 100 digits and exponents to ±250; past that one rounding more).
 *
 * @param text an unsigned decimal number, `1.2`, `.5`, `1e-5`
 */
export function literalValue(text: string, unit: Unit): number {
  if (unit.decimalExponent !== undefined) return shiftDecimal(text, unit.decimalExponent);
  let values = known.get(unit);
  if (values === undefined || values.size >= MOST_KNOWN) {
    values = new Map();
    known.set(unit, values);
  }
  let value = values.get(text);
  if (value === undefined) {
    value = exactProduct(text, unit);
    values.set(text, value);
  }
  return value;
}

function exactProduct(text: string, unit: Unit): number {
  if (text.length <= LONGEST_EXACT) {
    const { mantissa, exponent } = decimalParts(text);
    if (Math.abs(exponent) <= LARGEST_EXACT_EXPONENT) return nearestProduct(mantissa, exponent, unit.exact);
  }
  return Number(text) * unit.factor;
}
