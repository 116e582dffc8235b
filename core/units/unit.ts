import { type Dimension, PLAIN, productDimension } from './dimension.ts';
import {
  decimalFactor,
  type ExactFactor,
  nearestProduct,
  powerOfTen,
  productFactor,
} from './exact-factor.ts';

/** A unit of measure, single or compound. Value in SI = value in the unit × factor. */
export interface Unit {
  /** As written in a file: "mm", "g*mm^2", "kg/m^3", "1/s"; "" for plain numbers. */
  readonly name: string;
  readonly dimension: Dimension;
  /** The double nearest to the exact factor. */
  readonly factor: number;
  /** The factor's power of ten, when it is one: −3 for mm. Undefined for in, lb, deg, minute … */
  readonly decimalExponent: number | undefined;
  readonly exact: ExactFactor;
}

/** One factor of a compound unit; the power is whole and not zero. */
export interface UnitPower {
  readonly unit: Unit;
  readonly power: number;
}

export function makeUnit(name: string, dimension: Dimension, exact: ExactFactor): Unit {
  const factor = nearestProduct(1n, 0, exact);
  return Object.freeze({ name, dimension, factor, decimalExponent: powerOfTen(exact), exact });
}

/** The unit of plain numbers: factor 1, no name. */
export const PLAIN_UNIT: Unit = makeUnit('', PLAIN, decimalFactor(1n));

/** The product of powers of units under a name; undefined when an exponent of its dimension leaves ±100. */
export function productUnit(name: string, powers: readonly UnitPower[]): Unit | undefined {
  let dimension = PLAIN;
  let exact = PLAIN_UNIT.exact;
  for (const { unit, power } of powers) {
    const next = productDimension(dimension, unit.dimension, power);
    if (next === undefined) return undefined;
    dimension = next;
    exact = productFactor(exact, unit.exact, power);
  }
  return makeUnit(name, dimension, exact);
}
