import type { Body } from '../inertia/body.ts';
import { bodyOnAxis } from './body-of.ts';

// Tapering bodies of revolution; origin at the centre of the base, body on +z. Lengths in metres; unit density: `mass`
// is the volume [m³], `secondMoments` the central Q [m⁵] in local axes.
// Source of the closed forms: Meriam and Kraige, Engineering Mechanics: Dynamics, appendix D.

/** Full round cone, apex on +z. */
export function cone(diameter: number, height: number): Body {
  const r2 = (diameter / 2) * (diameter / 2);
  const across = (3 / 20) * r2;
  return bodyOnAxis((Math.PI * r2 * height) / 3, height / 4, across, across, (3 / 80) * (height * height));
}

/**
 * Cone cut parallel to its base; `topDiameter` may be smaller or larger than `diameter`, equal to it or zero. Every
 * moment is a symmetric sum of positive terms in the two radii, so nearly equal radii lose nothing.
 */
export function frustum(diameter: number, topDiameter: number, height: number): Body {
  const a = diameter / 2;
  const b = topDiameter / 2;
  const a2 = a * a;
  const b2 = b * b;
  const ab = a * b;
  const s = a2 + ab + b2;
  const across = (3 * (a2 * a2 + ab * s + b2 * b2)) / (20 * s);
  const along = (3 * (a2 * a2 + 4 * ab * a2 + 10 * ab * ab + 4 * ab * b2 + b2 * b2)) / (80 * s * s);
  const z = (height * (a2 + 2 * ab + 3 * b2)) / (4 * s);
  return bodyOnAxis((Math.PI * height * s) / 3, z, across, across, along * (height * height));
}

/** Paraboloid of revolution, base at z = 0, apex on +z. */
export function paraboloid(diameter: number, height: number): Body {
  const r2 = (diameter / 2) * (diameter / 2);
  return bodyOnAxis((Math.PI * r2 * height) / 2, height / 3, r2 / 6, r2 / 6, (height * height) / 18);
}
