import type { Body } from '../inertia/body.ts';
import type { Vector3 } from '../linalg/vector3.ts';
import { bodyOnAxis } from './body-of.ts';

// Surfaces without thickness. Lengths in metres; unit area density: `mass` is the area [m²], `secondMoments` the central
// Q [m⁴] in local axes. Source of the closed forms: Meriam and Kraige, Engineering Mechanics: Dynamics, appendix D.

/** Flat round disk in z = 0; origin at its centre. */
export function disk(diameter: number): Body {
  const r2 = (diameter / 2) * (diameter / 2);
  return bodyOnAxis(Math.PI * r2, 0, r2 / 4, r2 / 4, 0);
}

/** Flat rectangle x × y in z = 0; origin at its centre. */
export const plate = (x: number, y: number): Body => bodyOnAxis(x * y, 0, (x * x) / 12, (y * y) / 12, 0);

/** Flat triangle of three vertices, in its own axes. With d the vertices from their mean, Q = A/12 Σ d dᵀ. */
export function trianglePlate(a: Vector3, b: Vector3, c: Vector3): Body {
  const bx = b[0] - a[0];
  const by = b[1] - a[1];
  const bz = b[2] - a[2];
  const cx = c[0] - a[0];
  const cy = c[1] - a[1];
  const cz = c[2] - a[2];
  const nx = by * cz - bz * cy;
  const ny = bz * cx - bx * cz;
  const nz = bx * cy - by * cx;
  const mass = Math.sqrt(nx * nx + ny * ny + nz * nz) / 2;
  const mx = (bx + cx) / 3;
  const my = (by + cy) / 3;
  const mz = (bz + cz) / 3;
  const k = mass / 12;
  const sum = (p: number, q: number, m: number, s: number, t: number, n: number) =>
    k * (m * n + (p - m) * (s - n) + (q - m) * (t - n));
  return {
    mass,
    centre: [a[0] + mx, a[1] + my, a[2] + mz],
    secondMoments: [
      sum(bx, cx, mx, bx, cx, mx),
      sum(by, cy, my, by, cy, my),
      sum(bz, cz, mz, bz, cz, mz),
      sum(bx, cx, mx, by, cy, my),
      sum(bx, cx, mx, bz, cz, mz),
      sum(by, cy, my, bz, cz, mz),
    ],
  };
}

/** Thin sphere; origin at its centre. */
export function sphericalShell(diameter: number): Body {
  const r = diameter / 2;
  const q = (r * r) / 3;
  return bodyOnAxis(4 * Math.PI * (r * r), 0, q, q, q);
}

/** Thin half sphere without its flat face; origin at the centre of the rim, dome on +z. */
export function hemisphericalShell(diameter: number): Body {
  const r = diameter / 2;
  const r2 = r * r;
  return bodyOnAxis(2 * Math.PI * r2, r / 2, r2 / 3, r2 / 3, r2 / 12);
}

/** Thin round tube with open ends; origin at its centre. */
export function cylindricalShell(diameter: number, length: number): Body {
  const r = diameter / 2;
  return bodyOnAxis(Math.PI * diameter * length, 0, (r * r) / 2, (r * r) / 2, (length * length) / 12);
}

/** Thin cone without its base; origin at the centre of the rim, apex on +z. */
export function conicalShell(diameter: number, height: number): Body {
  const r = diameter / 2;
  const slant = Math.sqrt(r * r + height * height);
  return bodyOnAxis(Math.PI * r * slant, height / 3, (r * r) / 4, (r * r) / 4, (height * height) / 18);
}
