/** Three components along x, y, z of axes that the variable's name or its doc says. */
export type Vector3 = readonly [number, number, number];

export const ZERO: Vector3 = [0, 0, 0];

export const add = (a: Vector3, b: Vector3): Vector3 => [a[0] + b[0], a[1] + b[1], a[2] + b[2]];
export const subtract = (a: Vector3, b: Vector3): Vector3 => [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
export const scale = (a: Vector3, k: number): Vector3 => [a[0] * k, a[1] * k, a[2] * k];
export const dot = (a: Vector3, b: Vector3): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
export const cross = (a: Vector3, b: Vector3): Vector3 => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
];
export const norm = (a: Vector3): number => Math.sqrt(dot(a, a));

/** 2^600: multiplying by it is exact, and brings the square of any double into range. */
const FAR = 4.149515568880993e180;

/** The vector of length 1 in the direction of one that is not zero, however short or long it is. */
export function unit(a: Vector3): Vector3 {
  const largest = Math.max(Math.abs(a[0]), Math.abs(a[1]), Math.abs(a[2]));
  const near = largest < 1e-100 ? scale(a, FAR) : largest > 1e100 ? scale(a, 1 / FAR) : a;
  const n = norm(near);
  return [near[0] / n, near[1] / n, near[2] / n];
}
