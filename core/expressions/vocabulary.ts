import { findUnit } from '../units/unit-table.ts';

/** Fewest and most arguments of each function. `if` takes a comparison first. */
const FUNCTIONS = {
  sqrt: [1, 1],
  abs: [1, 1],
  min: [2, Infinity],
  max: [2, Infinity],
  sin: [1, 1],
  cos: [1, 1],
  tan: [1, 1],
  asin: [1, 1],
  acos: [1, 1],
  atan: [1, 1],
  atan2: [2, 2],
  hypot: [2, Infinity],
  floor: [1, 1],
  ceil: [1, 1],
  round: [1, 1],
  if: [3, 3],
} as const;

export type FunctionName = keyof typeof FUNCTIONS;

export const FUNCTION_NAMES = Object.keys(FUNCTIONS) as readonly FunctionName[];

export const isFunctionName = (name: string): name is FunctionName => Object.hasOwn(FUNCTIONS, name);

export function argumentCounts(name: FunctionName): { fewest: number; most: number } {
  const [fewest, most] = FUNCTIONS[name];
  return { fewest, most };
}

/** First words of the quantities of a roll-up; `centre.x`, `basic.mass` and the like start with one of these. */
export const QUANTITY_NAMES: readonly string[] = [
  'mass',
  'centre',
  'inertia',
  'origin',
  'principal',
  'gyration',
  'tilt',
  'basic',
  'predicted',
];

/** Whether a name is taken by a unit, a function, `pi`, `if` or a quantity, so that no parameter may bear it. */
export function isReservedName(name: string): boolean {
  return (
    name === 'pi' || isFunctionName(name) || QUANTITY_NAMES.includes(name) || findUnit(name) !== undefined
  );
}

const PARAMETER_NAME = /^[\p{L}_][\p{L}\p{M}\p{Nd}_]*$/u;

/**
 * Whether a text can name a parameter: letters of any script, digits and underscores, a letter or underscore first. Names
 * are compared in Unicode's composed form, see `composedName`.
 */
export const isParameterName = (name: string): boolean => PARAMETER_NAME.test(name);

/** The form (NFC) in which expressions hold names: an accented letter is the same however it was typed. */
export const composedName = (name: string): string => name.normalize('NFC');
