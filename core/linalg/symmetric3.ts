import type { Vector3 } from './vector3.ts';

/** A symmetric 3×3 matrix by its six elements: asymmetry cannot exist. Order: xx, yy, zz, xy, xz, yz. */
export type Symmetric3 = readonly [number, number, number, number, number, number];

/** Rows of a full 3×3 matrix. */
export type Matrix3 = readonly [Vector3, Vector3, Vector3];

export const ZERO_SYMMETRIC: Symmetric3 = [0, 0, 0, 0, 0, 0];
export const IDENTITY: Matrix3 = [
  [1, 0, 0],
  [0, 1, 0],
  [0, 0, 1],
];

export const trace = (a: Symmetric3): number => a[0] + a[1] + a[2];

/** The nine elements as rows. */
export const toRows = (a: Symmetric3): [number[], number[], number[]] => [
  [a[0], a[3], a[4]],
  [a[3], a[1], a[5]],
  [a[4], a[5], a[2]],
];

/** The six of a full matrix, off-diagonals averaged; the caller has checked symmetry. */
export const fromRows = (m: readonly (readonly number[])[]): Symmetric3 => [
  m[0]![0]!,
  m[1]![1]!,
  m[2]![2]!,
  (m[0]![1]! + m[1]![0]!) / 2,
  (m[0]![2]! + m[2]![0]!) / 2,
  (m[1]![2]! + m[2]![1]!) / 2,
];

export const addSymmetric = (a: Symmetric3, b: Symmetric3): Symmetric3 => [
  a[0] + b[0],
  a[1] + b[1],
  a[2] + b[2],
  a[3] + b[3],
  a[4] + b[4],
  a[5] + b[5],
];

export const scaleSymmetric = (a: Symmetric3, k: number): Symmetric3 => [
  a[0] * k,
  a[1] * k,
  a[2] * k,
  a[3] * k,
  a[4] * k,
  a[5] * k,
];

/** k v vᵀ. */
export const outer = (v: Vector3, k = 1): Symmetric3 => [
  k * v[0] * v[0],
  k * v[1] * v[1],
  k * v[2] * v[2],
  k * v[0] * v[1],
  k * v[0] * v[2],
  k * v[1] * v[2],
];

/** vᵀ A w. */
export const bilinear = (v: Vector3, a: Symmetric3, w: Vector3): number =>
  v[0] * (a[0] * w[0] + a[3] * w[1] + a[4] * w[2]) +
  v[1] * (a[3] * w[0] + a[1] * w[1] + a[5] * w[2]) +
  v[2] * (a[4] * w[0] + a[5] * w[1] + a[2] * w[2]);

/** R A Rᵀ: the same tensor after its body turned by R (proper or mirror). */
export function turnSymmetric(r: Matrix3, a: Symmetric3): Symmetric3 {
  const u: Vector3[] = [];
  for (const row of r)
    u.push([
      row[0] * a[0] + row[1] * a[3] + row[2] * a[4],
      row[0] * a[3] + row[1] * a[1] + row[2] * a[5],
      row[0] * a[4] + row[1] * a[5] + row[2] * a[2],
    ]);
  const at = (i: number, j: number) => u[i]![0] * r[j]![0] + u[i]![1] * r[j]![1] + u[i]![2] * r[j]![2];
  return [at(0, 0), at(1, 1), at(2, 2), at(0, 1), at(0, 2), at(1, 2)];
}
