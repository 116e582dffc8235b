import { eigenSymmetric3 } from '../linalg/eigen-symmetric3.ts';
import type { Vector3 } from '../linalg/vector3.ts';
import { atan2 } from '../math/index.ts';
import { type Body, inertiaAboutCentre } from './body.ts';

export type AxisName = 'x' | 'y' | 'z';
export const AXIS_NAMES: readonly AxisName[] = ['x', 'y', 'z'];

/** Two principal moments nearer than this share of the largest are one: their axes are free in that plane. */
export const EQUAL_MOMENTS = 1e-9;

export interface PrincipalAxes {
  /** Ascending [kg·m²], about the centre of mass. */
  readonly moments: Vector3;
  /** Row i: unit axis of moment i in the body's axes; right-handed, signs canonical. */
  readonly axes: readonly [Vector3, Vector3, Vector3];
  /** The body axis that names principal axis i, under the one assignment. */
  readonly nearest: readonly [AxisName, AxisName, AxisName];
  /** Indices of principal axes that are free to turn because their moments are equal; empty, two or all three. */
  readonly free: readonly number[];
  /** Angle between body axis x, y, z and the principal axis that it names [rad], 0 … π/2. */
  readonly tilt: Vector3;
}

/**
 * Principal moments and axes of a body about its centre of mass.
 *
 * Axes are named by the assignment of body axes that maximises Σ|cos| over all six permutations (the first of
 * equals in lexical order); the same assignment gives tilts and tracks axes between runs. Where a plane is free,
 * its axes are first turned to the representatives nearest the body axes, for names and display alone.
 */
export function principalAxes(body: Body): PrincipalAxes {
  const { values, vectors } = eigenSymmetric3(inertiaAboutCentre(body));
  const free = freeAxes(values);
  const axes = free.length > 0 ? alignFree(vectors, free) : vectors;
  const assignment = assignAxes(axes, IDENTITY_AXES);
  const tilt: [number, number, number] = [0, 0, 0];
  assignment.forEach((bodyAxis, i) => {
    tilt[bodyAxis] = angleToBodyAxis(axes[i]!, bodyAxis);
  });
  const names = assignment.map((k) => AXIS_NAMES[k]!) as [AxisName, AxisName, AxisName];
  return { moments: values, axes, nearest: names, free, tilt };
}

/** By the sine and the cosine, so that a tilt of a microradian keeps its digits. */
function angleToBodyAxis(axis: Vector3, k: number): number {
  const [p, q] = [axis[(k + 1) % 3]!, axis[(k + 2) % 3]!];
  return atan2(Math.sqrt(p * p + q * q), Math.abs(axis[k]!));
}

const IDENTITY_AXES: readonly [Vector3, Vector3, Vector3] = [
  [1, 0, 0],
  [0, 1, 0],
  [0, 0, 1],
];

const PERMUTATIONS: readonly (readonly [number, number, number])[] = [
  [0, 1, 2],
  [0, 2, 1],
  [1, 0, 2],
  [1, 2, 0],
  [2, 0, 1],
  [2, 1, 0],
];

/**
 * The one assignment: which row of `to` each row of `from` matches, by the greatest Σ|cos|.
 *
 * @returns for each row of `from`, the index of its row in `to`
 */
export function assignAxes(
  from: readonly (readonly number[])[],
  to: readonly (readonly number[])[],
): readonly [number, number, number] {
  let best = PERMUTATIONS[0]!;
  let bestSum = -1;
  for (const permutation of PERMUTATIONS) {
    let total = 0;
    for (let i = 0; i < 3; i++) {
      const a = from[i]!;
      const b = to[permutation[i]!]!;
      total += Math.abs(a[0]! * b[0]! + a[1]! * b[1]! + a[2]! * b[2]!);
    }
    // A gain within rounding is a tie: the earlier permutation stays, so names do not flicker.
    if (total > bestSum + 1e-12) {
      best = permutation;
      bestSum = total;
    }
  }
  return best;
}

function freeAxes(moments: Vector3): number[] {
  const bound = EQUAL_MOMENTS * Math.abs(moments[2]);
  const low = moments[1] - moments[0] <= bound;
  const high = moments[2] - moments[1] <= bound;
  if (low && high) return [0, 1, 2];
  if (low) return [0, 1];
  return high ? [1, 2] : [];
}

/** Representatives of a free plane: the projections of the body axis least out of it, and the axis square to that. */
function alignFree(
  axes: readonly [Vector3, Vector3, Vector3],
  free: readonly number[],
): [Vector3, Vector3, Vector3] {
  if (free.length === 3)
    return [
      [1, 0, 0],
      [0, 1, 0],
      [0, 0, 1],
    ];
  const fixed = free[0] === 1 ? 0 : 2;
  const n = axes[fixed]!;
  let k = 0;
  for (let i = 1; i < 3; i++) if (Math.abs(n[i]!) < Math.abs(n[k]!)) k = i;
  const p: [number, number, number] = [-n[0] * n[k]!, -n[1] * n[k]!, -n[2] * n[k]!];
  p[k] = p[k]! + 1;
  const length = Math.sqrt(p[0] * p[0] + p[1] * p[1] + p[2] * p[2]);
  const u: Vector3 = [p[0] / length + 0, p[1] / length + 0, p[2] / length + 0];
  const cross = (a: Vector3, b: Vector3): Vector3 => [
    a[1] * b[2] - a[2] * b[1] + 0,
    a[2] * b[0] - a[0] * b[2] + 0,
    a[0] * b[1] - a[1] * b[0] + 0,
  ];
  if (fixed === 0) {
    // axes 2 and 3 free: axis 1 keeps its sign, axis 2 = u, axis 3 = 1 × 2.
    return [n, u, cross(n, u)];
  }
  // axes 1 and 2 free: both with the largest component positive, axis 3 = 1 × 2.
  const second = cross(n, u);
  let j = 0;
  for (let i = 1; i < 3; i++) if (Math.abs(second[i]!) > Math.abs(second[j]!)) j = i;
  const w: Vector3 = second[j]! < 0 ? [0 - second[0], 0 - second[1], 0 - second[2]] : second;
  return [u, w, cross(u, w)];
}
