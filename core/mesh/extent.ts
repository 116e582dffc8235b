import type { Vector3 } from '../linalg/vector3.ts';

/** An axis-aligned box [m]. */
export interface Extent {
  readonly min: Vector3;
  readonly max: Vector3;
}
