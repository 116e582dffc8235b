import type { Unit } from '../units/index.ts';

/**
 * Half a unit of the last digit of a number as it is written: `5200 g*mm^2` is good to 0.5 g·mm², `1.20e-3` to 0.005e-3.
 * An expression of several terms carries no digits of its own: 0.
 *
 * @param text as it stands in the file
 * @param field the unit a bare number takes
 * @param value what the text came to [SI], from which a unit in the text is recovered
 * @returns in SI
 */
export function halfUnitOfLastDigit(text: string, field: Unit, value: number): number {
  const match = /^\s*[+-]?(\d+\.?\d*|\.\d+)(?:[eE]([+-]?\d+))?\s*([A-Za-z][^\s()+]*)?\s*$/.exec(text);
  if (!match) return 0;
  const decimals = match[1]!.split('.')[1]?.length ?? 0;
  const exponent = Number(match[2] ?? 0);
  const number = Number(`${match[1]}e${exponent}`);
  // A bare 0 is the absence of the product, not a rounding to whole units.
  if (number === 0 && decimals === 0) return 0;
  const step = Number(`5e${exponent - decimals - 1}`);
  if (match[3] === undefined) return step * field.factor;
  return number === 0 ? step * field.factor : step * Math.abs(value / number);
}
