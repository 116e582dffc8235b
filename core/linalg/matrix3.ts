import type { Matrix3 } from './symmetric3.ts';
import { cross, dot, type Vector3 } from './vector3.ts';

/** M v. */
export const apply = (m: Matrix3, v: Vector3): Vector3 => [
  m[0][0] * v[0] + m[0][1] * v[1] + m[0][2] * v[2],
  m[1][0] * v[0] + m[1][1] * v[1] + m[1][2] * v[2],
  m[2][0] * v[0] + m[2][1] * v[1] + m[2][2] * v[2],
];

export const transpose = (m: Matrix3): Matrix3 => [
  [m[0][0], m[1][0], m[2][0]],
  [m[0][1], m[1][1], m[2][1]],
  [m[0][2], m[1][2], m[2][2]],
];

/** A B. */
export function multiply(a: Matrix3, b: Matrix3): Matrix3 {
  const row = (r: Vector3): Vector3 => [
    r[0] * b[0][0] + r[1] * b[1][0] + r[2] * b[2][0],
    r[0] * b[0][1] + r[1] * b[1][1] + r[2] * b[2][1],
    r[0] * b[0][2] + r[1] * b[1][2] + r[2] * b[2][2],
  ];
  return [row(a[0]), row(a[1]), row(a[2])];
}

export const determinant = (m: Matrix3): number => dot(m[0], cross(m[1], m[2]));

/** Largest element of M Mᵀ − 1: zero for a rotation or a mirror, 2e for a matrix off by e. */
export function orthonormalityError(m: Matrix3): number {
  let worst = 0;
  for (let i = 0; i < 3; i++)
    for (let j = i; j < 3; j++) worst = Math.max(worst, Math.abs(dot(m[i]!, m[j]!) - (i === j ? 1 : 0)));
  return worst;
}
