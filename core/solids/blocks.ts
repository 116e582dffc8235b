import type { Body } from '../inertia/body.ts';
import type { Vector3 } from '../linalg/vector3.ts';
import { bodyOnAxis } from './body-of.ts';

// Bodies with flat faces and closed forms. Each function takes lengths in metres and returns a body of unit density:
// `mass` is the volume [m³], `secondMoments` the central Q [m⁵], both in the solid's local axes.
// Source of the closed forms: Meriam and Kraige, Engineering Mechanics: Dynamics, appendix D.

/** Rectangular block x × y × z; origin at its centre. */
export const box = (x: number, y: number, z: number): Body =>
  bodyOnAxis(x * y * z, 0, (x * x) / 12, (y * y) / 12, (z * z) / 12);

/** Right pyramid on a rectangle x × y; origin at the centre of the base, apex on +z. */
export const pyramid = (x: number, y: number, height: number): Body =>
  bodyOnAxis((x * y * height) / 3, height / 4, (x * x) / 20, (y * y) / 20, (3 * (height * height)) / 80);

/** Right triangular prism: right-angle edge along z at the origin, legs on +x and +y, 0 ≤ z ≤ its size in z. */
export function wedge(x: number, y: number, z: number): Body {
  const mass = (x * y * z) / 2;
  return {
    mass,
    centre: [x / 3, y / 3, z / 2],
    secondMoments: [
      (mass * (x * x)) / 18,
      (mass * (y * y)) / 18,
      (mass * (z * z)) / 12,
      (-mass * (x * y)) / 36,
      0,
      0,
    ],
  };
}

/**
 * Tetrahedron of four vertices in either turning sense, in its own axes. With d the vertices from their mean,
 * Q = V/20 Σ d dᵀ: a sum of squares, so nothing cancels (equal to Tonon, J. Math. Stat. 1(1), 2004).
 */
export function tetrahedron(a: Vector3, b: Vector3, c: Vector3, d: Vector3): Body {
  // Edges from one vertex, so that a tetrahedron far from the origin keeps its digits.
  const bx = b[0] - a[0];
  const by = b[1] - a[1];
  const bz = b[2] - a[2];
  const cx = c[0] - a[0];
  const cy = c[1] - a[1];
  const cz = c[2] - a[2];
  const dx = d[0] - a[0];
  const dy = d[1] - a[1];
  const dz = d[2] - a[2];
  const determinant = bx * (cy * dz - cz * dy) + by * (cz * dx - cx * dz) + bz * (cx * dy - cy * dx);
  const mass = Math.abs(determinant) / 6;
  const mx = (bx + cx + dx) / 4;
  const my = (by + cy + dy) / 4;
  const mz = (bz + cz + dz) / 4;
  const k = mass / 20;
  const sum = (p: number, q: number, r: number, m: number, s: number, t: number, u: number, n: number) =>
    k * (m * n + (p - m) * (s - n) + (q - m) * (t - n) + (r - m) * (u - n));
  return {
    mass,
    centre: [a[0] + mx, a[1] + my, a[2] + mz],
    secondMoments: [
      sum(bx, cx, dx, mx, bx, cx, dx, mx),
      sum(by, cy, dy, my, by, cy, dy, my),
      sum(bz, cz, dz, mz, bz, cz, dz, mz),
      sum(bx, cx, dx, mx, by, cy, dy, my),
      sum(bx, cx, dx, mx, bz, cz, dz, mz),
      sum(by, cy, dy, my, bz, cz, dz, mz),
    ],
  };
}
