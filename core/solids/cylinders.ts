import type { Body } from '../inertia/body.ts';
import { bodyOnAxis } from './body-of.ts';

// Bodies of constant section along z, mid-length at z = 0. Lengths in metres; unit density: `mass` is the volume [m³],
// `secondMoments` the central Q [m⁵] in local axes.
// Source of the closed forms: Meriam and Kraige, Engineering Mechanics: Dynamics, appendix D.

/** Full round rod; origin at its centre. */
export function cylinder(diameter: number, length: number): Body {
  const r2 = (diameter / 2) * (diameter / 2);
  return bodyOnAxis(Math.PI * r2 * length, 0, r2 / 4, r2 / 4, (length * length) / 12);
}

/**
 * Round tube; origin at its centre. Written with the wall itself, R² − r² = t (R + r) and R² + r² as a sum, so a wall
 * of a millionth of the radius keeps every digit. A wall equal to the radius is a full rod.
 */
export function tube(diameter: number, wall: number, length: number): Body {
  const outer = diameter / 2;
  const inner = outer - wall;
  const mass = Math.PI * wall * (outer + inner) * length;
  const across = (outer * outer + inner * inner) / 4;
  return bodyOnAxis(mass, 0, across, across, (length * length) / 12);
}

/** Rod of elliptical section with full axes x and y; origin at its centre. */
export function ellipticalCylinder(x: number, y: number, length: number): Body {
  const a = x / 2;
  const b = y / 2;
  return bodyOnAxis(Math.PI * (a * b) * length, 0, (a * a) / 4, (b * b) / 4, (length * length) / 12);
}

/** 4/(3π), the centroid of a half disk per radius. */
const HALF_DISK_CENTROID = 4 / (3 * Math.PI);
/** 1/4 − 16/(9π²), its central second moment toward the arc per area and radius², from 40 digits. */
const HALF_DISK_SECOND = 0.06987345130251063;

/** The half y ≥ 0 of a round rod; origin on the rod's axis at mid-length. */
export function halfCylinder(diameter: number, length: number): Body {
  const r = diameter / 2;
  const r2 = r * r;
  const mass = (Math.PI * r2 * length) / 2;
  return {
    mass,
    centre: [0, HALF_DISK_CENTROID * r, 0],
    secondMoments: [(mass * r2) / 4, mass * r2 * HALF_DISK_SECOND, (mass * (length * length)) / 12, 0, 0, 0],
  };
}
