import {
  compileExpression,
  ExpressionError,
  type FieldUnit,
  lookupIn,
  type SymbolInfo,
} from '../../../core/expressions/index.ts';
import { ANGLE, type FileUnits, getUnit, LENGTH, MASS, PLAIN } from '../../../core/units/index.ts';

/** The units and parameters of a small machine, for the tests of expressions. */
export const FILE: FileUnits = {
  length: getUnit('mm'),
  mass: getUnit('g'),
  angle: getUnit('deg'),
  time: getUnit('s'),
};

const SYMBOLS = new Map<string, SymbolInfo>([
  ['boom', { dimension: LENGTH, slot: 0 }],
  ['wall', { dimension: LENGTH, slot: 1 }],
  ['load', { dimension: MASS, slot: 2 }],
  ['sweep', { dimension: ANGLE, slot: 3 }],
  ['n', { dimension: PLAIN, slot: 4 }],
  ['nothing', { dimension: PLAIN, slot: 5 }],
  ['centre.x', { dimension: LENGTH, slot: 6 }],
]);

export const LOOKUP = lookupIn(SYMBOLS);

/** boom 420 mm, wall 1.2 mm, load 2 kg, sweep 30 deg, n 3, nothing 0, centre.x −5 mm. */
export const VALUES = [0.42, 0.0012, 2, Math.PI / 6, 3, 0, -0.005];

export const MM: FieldUnit = FILE.length;

/** The value in SI of an expression over the parameters above. */
export function evaluateText(text: string, field: FieldUnit | null = null): number {
  return compileExpression(text, field, LOOKUP, FILE).evaluate(VALUES);
}

/** The fault of an expression that must not compile. */
export function faultOf(text: string, field: FieldUnit | null = null): ExpressionError {
  try {
    compileExpression(text, field, LOOKUP, FILE);
  } catch (error) {
    if (error instanceof ExpressionError) return error;
    throw error;
  }
  throw new Error(`${text} was accepted`);
}

/** Code and the text pointed at. */
export function faultAt(text: string, field: FieldUnit | null = null): [code: string, part: string] {
  const { code, start, end } = faultOf(text, field);
  return [code, text.slice(start, end)];
}
