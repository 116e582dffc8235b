import type { Vector3 } from '../linalg/vector3.ts';

/** One of the three views: which body axes lie to the right and upward on the sheet. */
export interface View {
  readonly name: 'top' | 'side' | 'front';
  readonly right: 0 | 1 | 2;
  readonly up: 0 | 1 | 2;
  /** Where the eye is, in words. */
  readonly from: string;
}

/**
 * Third-angle projection of right-handed axes: the side as seen from −y, the top above it as seen from +z, the front
 * to the right of it as seen from +x.
 */
export const VIEWS = {
  top: { name: 'top', right: 0, up: 1, from: 'from +z' },
  side: { name: 'side', right: 0, up: 2, from: 'from −y' },
  front: { name: 'front', right: 1, up: 2, from: 'from +x' },
} as const satisfies Record<string, View>;

export interface Box {
  readonly min: Vector3;
  readonly max: Vector3;
}

/** The box around points, in body axes; null for none. */
export function boxAround(points: Iterable<Vector3>): Box | null {
  const min: [number, number, number] = [Infinity, Infinity, Infinity];
  const max: [number, number, number] = [-Infinity, -Infinity, -Infinity];
  for (const p of points)
    for (let k = 0; k < 3; k++) {
      min[k] = Math.min(min[k]!, p[k]!);
      max[k] = Math.max(max[k]!, p[k]!);
    }
  return min[0] <= max[0] ? { min, max } : null;
}
