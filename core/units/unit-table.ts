import { ANGLE, ANGULAR_SPEED, type Dimension, FORCE, FREQUENCY, LENGTH, MASS, TIME } from './dimension.ts';
import { decimalFactor, type ExactFactor, piFactor, productFactor } from './exact-factor.ts';
import { makeUnit, type Unit } from './unit.ts';

// Definitions: the SI brochure (9th edition) for metric units; NIST SP 811 (2008) B.8 for in, ft, lb and lbf, which are
// exact decimals (lbf = lb × 9.80665 m/s²). The slug is the mass that 1 lbf accelerates by 1 ft/s².
const one = decimalFactor(1n);
const pound = decimalFactor(45359237n, -8);
const poundForce = decimalFactor(44482216152605n, -13);
const foot = decimalFactor(3048n, -4);
const fullTurn = productFactor(piFactor, decimalFactor(2n));

const TABLE: readonly (readonly [name: string, dimension: Dimension, factor: ExactFactor])[] = [
  ['m', LENGTH, one],
  ['km', LENGTH, decimalFactor(1n, 3)],
  ['cm', LENGTH, decimalFactor(1n, -2)],
  ['mm', LENGTH, decimalFactor(1n, -3)],
  ['um', LENGTH, decimalFactor(1n, -6)],
  ['in', LENGTH, decimalFactor(254n, -4)],
  ['ft', LENGTH, foot],
  ['kg', MASS, one],
  ['g', MASS, decimalFactor(1n, -3)],
  ['mg', MASS, decimalFactor(1n, -6)],
  ['t', MASS, decimalFactor(1n, 3)],
  ['lb', MASS, pound],
  ['oz', MASS, productFactor(pound, decimalFactor(16n), -1)],
  ['slug', MASS, productFactor(poundForce, foot, -1)],
  ['rad', ANGLE, one],
  ['deg', ANGLE, productFactor(piFactor, decimalFactor(180n), -1)],
  ['rev', ANGLE, fullTurn],
  ['s', TIME, one],
  ['minute', TIME, decimalFactor(60n)],
  ['hour', TIME, decimalFactor(3600n)],
  ['Hz', FREQUENCY, one],
  ['rpm', ANGULAR_SPEED, productFactor(fullTurn, decimalFactor(60n), -1)],
  ['N', FORCE, one],
  ['kN', FORCE, decimalFactor(1n, 3)],
  ['lbf', FORCE, poundForce],
];

const units = new Map<string, Unit>(
  TABLE.map(([name, kind, factor]) => [name, makeUnit(name, kind, factor)]),
);

/** Names of the single units, in the order of the format's list. */
export const UNIT_NAMES: readonly string[] = [...units.keys()];

/** The single unit of that name; names are case-sensitive. */
export const findUnit = (name: string): Unit | undefined => units.get(name);

/** The unit of that name, which the program itself knows to exist. */
export function getUnit(name: string): Unit {
  const unit = units.get(name);
  if (unit === undefined) throw new RangeError(`no unit ${name}`);
  return unit;
}
