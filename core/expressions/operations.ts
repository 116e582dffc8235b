import { acos, asin, atan, atan2, cos, hypot, pow, sin, tan } from '../math/index.ts';

/** Numeric meaning of each operation of one operand, in SI (angles in radians). Same bits on every engine. */
export const UNARY = {
  negate: (x: number): number => 0 - x, // never −0
  sqrt: Math.sqrt,
  abs: Math.abs,
  sin,
  cos,
  tan,
  asin,
  acos,
  atan,
  floor: Math.floor,
  ceil: (x: number): number => Math.ceil(x) + 0,
  round: roundHalfAway,
} as const;

/** Numeric meaning of each operation of two operands. min, max and hypot of more are done from the left. */
export const BINARY = {
  add: (x: number, y: number): number => x + y,
  subtract: (x: number, y: number): number => x - y,
  multiply: (x: number, y: number): number => x * y,
  divide: (x: number, y: number): number => x / y,
  power: pow,
  min: Math.min,
  max: Math.max,
  atan2,
  hypot,
} as const;

export const COMPARE = {
  '<': (x: number, y: number): boolean => x < y,
  '<=': (x: number, y: number): boolean => x <= y,
  '>': (x: number, y: number): boolean => x > y,
  '>=': (x: number, y: number): boolean => x >= y,
  '==': (x: number, y: number): boolean => x === y,
  '!=': (x: number, y: number): boolean => x !== y,
} as const;

export type UnaryOperation = keyof typeof UNARY;
export type BinaryOperation = keyof typeof BINARY;

/** To the nearest whole number, halves away from zero; never −0. */
function roundHalfAway(x: number): number {
  const down = Math.floor(Math.abs(x));
  const size = Math.abs(x) - down >= 0.5 ? down + 1 : down;
  return x < 0 ? 0 - size : size;
}
