import type { Body } from '../inertia/body.ts';
import { bodyOnAxis } from './body-of.ts';

// Bodies without a section: they take a mass, never a density. `mass` is the length [m] (1 for a particle),
// `secondMoments` the central Q per unit of line density [m³], in local axes.

/** A mass in one point. */
export const particle = (): Body => bodyOnAxis(1, 0, 0, 0, 0);

/** Slender straight rod along z; origin at its centre. */
export const rod = (length: number): Body => bodyOnAxis(length, 0, 0, 0, (length * length) / 12);

/** Thin circular hoop in z = 0; origin at its centre. */
export function ring(diameter: number): Body {
  const r = diameter / 2;
  return bodyOnAxis(Math.PI * diameter, 0, (r * r) / 2, (r * r) / 2, 0);
}
