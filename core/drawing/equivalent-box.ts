import type { Vector3 } from '../linalg/vector3.ts';

/**
 * The uniform box that has a body's mass, centre and inertia tensor: half-lengths √(3 λᵢ / m) along the principal axes,
 * λᵢ = (½ tr J − Jᵢ) the principal second moments.
 *
 * @param moments principal moments about the centre [kg·m²]
 * @returns half-lengths along the principal axes [m]; zero where a moment's second moment is none
 */
export function equivalentHalfLengths(mass: number, moments: readonly number[]): Vector3 {
  const half = (moments[0]! + moments[1]! + moments[2]!) / 2;
  const length = (moment: number) => Math.sqrt(Math.max(0, (3 * (half - moment)) / mass));
  return [length(moments[0]!), length(moments[1]!), length(moments[2]!)];
}

/** The twelve edges of a box as polylines, in the axes of its directions. */
export function boxEdges(centre: Vector3, axes: readonly (readonly number[])[], half: Vector3): Vector3[][] {
  const corner = (i: number): Vector3 => {
    const s = [i & 1 ? 1 : -1, i & 2 ? 1 : -1, i & 4 ? 1 : -1];
    const at = (k: 0 | 1 | 2) =>
      centre[k] +
      s[0]! * half[0] * axes[0]![k]! +
      s[1]! * half[1] * axes[1]![k]! +
      s[2]! * half[2] * axes[2]![k]!;
    return [at(0), at(1), at(2)];
  };
  const c = [0, 1, 2, 3, 4, 5, 6, 7].map(corner);
  const path = (...is: number[]) => is.map((i) => c[i]!);
  return [path(0, 1, 3, 2, 0), path(4, 5, 7, 6, 4), path(0, 4), path(1, 5), path(2, 6), path(3, 7)];
}
