import { compose, IN_PLACE, type Placement } from '../inertia/placement.ts';
import { apply } from '../linalg/matrix3.ts';
import type { Matrix3 } from '../linalg/symmetric3.ts';
import { scale, subtract, unit, type Vector3 } from '../linalg/vector3.ts';
import { rotationSineCosine } from '../math/index.ts';

export type Plane = 'xy' | 'xz' | 'yz';

/** One `repeat:` entry with its numbers evaluated; lengths in m, angles in rad, in the parent's axes. */
export type Repeat =
  | { kind: 'line'; count: number; step: Vector3 }
  | { kind: 'ring'; count: number; axis: 'x' | 'y' | 'z'; through: Vector3; angle: number }
  | { kind: 'mirror'; plane: Plane };

const MIRRORS: Record<Plane, Matrix3> = {
  xy: [
    [1, 0, 0],
    [0, 1, 0],
    [0, 0, -1],
  ],
  xz: [
    [1, 0, 0],
    [0, -1, 0],
    [0, 0, 1],
  ],
  yz: [
    [-1, 0, 0],
    [0, 1, 0],
    [0, 0, 1],
  ],
};

/** The mirror image in a plane through the parent's origin. */
export const mirrorIn = (plane: Plane): Placement => ({ turn: MIRRORS[plane], offset: [0, 0, 0] });

/**
 * Rotation matrix about a body axis by the right-hand rule; exact at quarter turns.
 *
 * @param angle [rad]
 */
export function turnAbout(axis: 'x' | 'y' | 'z', angle: number): Matrix3 {
  const { sine: s, cosine: c } = rotationSineCosine(angle);
  if (axis === 'x')
    return [
      [1, 0, 0],
      [0, c, -s],
      [0, s, c],
    ];
  if (axis === 'y')
    return [
      [c, 0, s],
      [0, 1, 0],
      [-s, 0, c],
    ];
  return [
    [c, -s, 0],
    [s, c, 0],
    [0, 0, 1],
  ];
}

/**
 * Rotation about any axis by the right-hand rule (Rodrigues); exact at quarter turns about body axes.
 *
 * @param axis not zero, any length
 * @param angle [rad]
 */
export function turnAboutVector(axis: Vector3, angle: number): Matrix3 {
  const [x, y, z] = unit(axis);
  const { sine: s, cosine: c } = rotationSineCosine(angle);
  const k = 1 - c;
  return [
    [c + k * x * x, k * x * y - s * z, k * x * z + s * y],
    [k * x * y + s * z, c + k * y * y, k * y * z - s * x],
    [k * x * z - s * y, k * y * z + s * x, c + k * z * z],
  ];
}

const FULL_TURN = 2 * Math.PI;

/**
 * Placements of all copies in the parent's axes, the original first. A list of repeats works in order: each entry
 * repeats all that the entries before it made.
 */
export function copiesOf(repeats: readonly Repeat[]): Placement[] {
  let copies: Placement[] = [IN_PLACE];
  for (const repeat of repeats) {
    const steps = stepsOf(repeat);
    copies = steps.flatMap((step) => copies.map((copy) => (step === IN_PLACE ? copy : compose(step, copy))));
  }
  return copies;
}

function stepsOf(repeat: Repeat): Placement[] {
  if (repeat.kind === 'mirror') return [IN_PLACE, mirrorIn(repeat.plane)];
  if (repeat.kind === 'line')
    return Array.from({ length: repeat.count }, (_, k) =>
      k === 0 ? IN_PLACE : { turn: IN_PLACE.turn, offset: scale(repeat.step, k) },
    );
  const full = Math.abs(Math.abs(repeat.angle) - FULL_TURN) <= 4 * Number.EPSILON * FULL_TURN;
  const parts = full ? repeat.count : repeat.count - 1;
  return Array.from({ length: repeat.count }, (_, k) => {
    if (k === 0) return IN_PLACE;
    const turn = turnAbout(repeat.axis, (repeat.angle * k) / parts);
    return { turn, offset: subtract(repeat.through, apply(turn, repeat.through)) };
  });
}
