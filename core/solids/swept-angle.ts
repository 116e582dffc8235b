import { cos, sin, wholeQuarterTurns } from '../math/index.ts';

/** What a sweep by an angle about z needs, free of cancellation for a sliver as for a full turn. */
export interface SweptAngle {
  /** The angle itself [rad]. */
  readonly angle: number;
  /** Sine and cosine of half the angle: the direction of the bisector. */
  readonly sinHalf: number;
  readonly cosHalf: number;
  /** angle − sin(angle). */
  readonly lessSine: number;
  /** (angle² − 4 sin²(angle/2)) / angle. */
  readonly chordLoss: number;
}

const FULL: SweptAngle = {
  angle: 2 * Math.PI,
  sinHalf: 0,
  cosHalf: -1,
  lessSine: 2 * Math.PI,
  chordLoss: 2 * Math.PI,
};
/** @param angle in (0, 2π] [rad]; quarter turns are exact */
export function sweptAngle(angle: number): SweptAngle {
  if (angle >= 2 * Math.PI || wholeQuarterTurns(angle) === 4) return FULL;
  const half = angle / 2;
  const sinHalf = sin(half);
  return {
    angle,
    sinHalf,
    cosHalf: cos(half),
    lessSine: lessSine(angle),
    chordLoss: (2 * lessSine(half) * (angle + 2 * sinHalf)) / angle,
  };
}

/** x − sin x for 0 ≤ x: its series x³/6 − x⁵/120 + … below 1, where the subtraction would lose digits. */
export function lessSine(x: number): number {
  if (x >= 1) return x - sin(x);
  const square = x * x;
  let term = (x * square) / 6;
  let sum = term;
  for (let k = 4; k <= 18; k += 2) {
    term *= -square / (k * (k + 1));
    sum += term;
  }
  return sum;
}
