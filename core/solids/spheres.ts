import type { Body } from '../inertia/body.ts';
import { bodyOnAxis } from './body-of.ts';

// Spheres and their parts. Lengths in metres; unit density: `mass` is the volume [m³], `secondMoments` the central
// Q [m⁵] in local axes. Source of the closed forms: Meriam and Kraige, Engineering Mechanics: Dynamics, appendix D.

/** Full sphere; origin at its centre. */
export function sphere(diameter: number): Body {
  const r = diameter / 2;
  const q = (r * r) / 5;
  return bodyOnAxis((4 / 3) * Math.PI * (r * r * r), 0, q, q, q);
}

/**
 * Sphere with a concentric hollow; origin at its centre. Written with the wall itself: R³ − r³ = t (R² + R r + r²) and
 * R⁵ − r⁵ = t (R⁴ + … + r⁴), sums of positive terms. A wall equal to the radius is a full sphere.
 */
export function hollowSphere(diameter: number, wall: number): Body {
  const outer = diameter / 2;
  const inner = outer - wall;
  const o2 = outer * outer;
  const i2 = inner * inner;
  const cross = outer * inner;
  const cubic = o2 + cross + i2;
  const quintic = o2 * o2 + cross * (o2 + cross + i2) + i2 * i2;
  const q = quintic / (5 * cubic);
  return bodyOnAxis((4 / 3) * Math.PI * wall * cubic, 0, q, q, q);
}

/** Half sphere; origin at the centre of its flat face, dome on +z. */
export function hemisphere(diameter: number): Body {
  const r = diameter / 2;
  const r2 = r * r;
  return bodyOnAxis((2 / 3) * Math.PI * (r2 * r), (3 / 8) * r, r2 / 5, r2 / 5, (19 / 320) * r2);
}

/**
 * Piece of a sphere cut off by a plane, `height` from the cut to the pole; origin at the centre of the cut, pole on +z.
 *
 * With w = diameter − height, the part of the diameter left below the cut, all moments are sums of positive terms
 * (integration of disks of area π u (w + h − u), u from the pole), so a cap of no height and a whole sphere (w = 0)
 * keep their digits alike.
 */
export function sphericalCap(diameter: number, height: number): Body {
  const h = height;
  const w = diameter - height;
  const s = 3 * w + h;
  const across = (h * (10 * w * w + 5 * w * h + h * h)) / (20 * s);
  const along = (h * h * (10 * w * w + 8 * w * h + h * h)) / (20 * s * s);
  return bodyOnAxis((Math.PI * (h * h) * s) / 6, (h * (2 * w + h)) / (2 * s), across, across, along);
}

/** Ellipsoid with full axes x, y, z; origin at its centre. */
export const ellipsoid = (x: number, y: number, z: number): Body =>
  bodyOnAxis((Math.PI / 6) * (x * y * z), 0, (x * x) / 20, (y * y) / 20, (z * z) / 20);
