import { apply, multiply } from '../linalg/matrix3.ts';
import { IDENTITY, type Matrix3, turnSymmetric } from '../linalg/symmetric3.ts';
import { add, type Vector3 } from '../linalg/vector3.ts';
import type { Body } from './body.ts';

/**
 * Where local axes stand in a parent's: a local point x lands at `offset + turn x`.
 * The columns of `turn` are the local axes in the parent's; its determinant is +1, or −1 for a mirror image.
 */
export interface Placement {
  readonly turn: Matrix3;
  readonly offset: Vector3;
}

export const IN_PLACE: Placement = { turn: IDENTITY, offset: [0, 0, 0] };

/** A local point in the parent's axes [m]. */
export const placePoint = (p: Placement, x: Vector3): Vector3 =>
  add(p.turn === IDENTITY ? x : apply(p.turn, x), p.offset);

/** Local axes → parent → grandparent as one placement. */
export function compose(outer: Placement, inner: Placement): Placement {
  if (outer === IN_PLACE) return inner;
  if (inner === IN_PLACE) return outer;
  return {
    turn: outer.turn === IDENTITY ? inner.turn : multiply(outer.turn, inner.turn),
    offset: placePoint(outer, inner.offset),
  };
}

/** A body from local into the parent's axes: Q → R Q Rᵀ, centre → offset + R c. Mirrors included. */
export function placeBody(p: Placement, body: Body): Body {
  if (p === IN_PLACE) return body;
  return {
    mass: body.mass,
    centre: placePoint(p, body.centre),
    secondMoments: p.turn === IDENTITY ? body.secondMoments : turnSymmetric(p.turn, body.secondMoments),
  };
}

/** Parent's axes → local: the inverse of `placePoint` for a rotation or mirror. */
export const pointInLocal = (p: Placement, x: Vector3): Vector3 => {
  const d: Vector3 = [x[0] - p.offset[0], x[1] - p.offset[1], x[2] - p.offset[2]];
  const t = p.turn;
  return [
    t[0][0] * d[0] + t[1][0] * d[1] + t[2][0] * d[2],
    t[0][1] * d[0] + t[1][1] * d[1] + t[2][1] * d[2],
    t[0][2] * d[0] + t[1][2] * d[1] + t[2][2] * d[2],
  ];
};
