import { cos as generalCosine, sin as generalSine, tan as generalTangent } from './elementary.ts';

const QUARTER = Math.PI / 2;
const MOST_QUARTERS = 2 ** 20;
/** π/2 as a double, its product with k and the reader's own conversion round once each: two units together. */
const NEAR = 2 * Number.EPSILON;

/**
 * How many quarter turns an angle is, when it is a whole number of them to within rounding (2 ε of itself, for up
 * to 2^20 quarters); undefined otherwise. `90 deg` and `pi / 2 * 1 rad` are one quarter turn.
 *
 * @param angle [rad]
 */
export function wholeQuarterTurns(angle: number): number | undefined {
  const quarters = Math.round(angle / QUARTER);
  if (!(Math.abs(quarters) <= MOST_QUARTERS)) return undefined;
  const exact = quarters * QUARTER;
  return Math.abs(angle - exact) <= NEAR * Math.abs(exact) ? quarters : undefined;
}

const SINES = [0, 1, 0, -1] as const;

/** Sine of an angle [rad]; exactly 0 or ±1 at whole quarter turns. */
export function sin(angle: number): number {
  const quarters = wholeQuarterTurns(angle);
  return quarters === undefined ? generalSine(angle) : SINES[(quarters & 3) as 0 | 1 | 2 | 3];
}

/** Cosine of an angle [rad]; exactly 0 or ±1 at whole quarter turns. */
export function cos(angle: number): number {
  const quarters = wholeQuarterTurns(angle);
  return quarters === undefined ? generalCosine(angle) : SINES[((quarters + 1) & 3) as 0 | 1 | 2 | 3];
}

/** Tangent of an angle [rad]; exactly 0 at half turns, Infinity at the odd quarters, where it has no value. */
export function tan(angle: number): number {
  const quarters = wholeQuarterTurns(angle);
  if (quarters === undefined) return generalTangent(angle);
  return (quarters & 1) === 0 ? 0 : Infinity;
}

/**
 * Sine and cosine for a rotation matrix: quarter turns give exact zeros and ones, so turned axes stay axes.
 *
 * @param angle [rad]
 */
export function rotationSineCosine(angle: number): { sine: number; cosine: number } {
  return { sine: sin(angle), cosine: cos(angle) };
}
