import type { Body } from '../inertia/body.ts';
import { sectionMoments, type Vector2 } from './section-moments.ts';

/**
 * A plane outline with holes, drawn out along +z from z = 0 (polygon moments by Green's theorem).
 *
 * @param outline points [m] in either turning sense; closes by itself
 * @param holes outlines inside it that do not overlap
 * @param height [m]
 * @returns unit density: mass is the volume [m³], central Q [m⁵], local axes
 */
export function extrusion(
  outline: readonly Vector2[],
  holes: readonly (readonly Vector2[])[],
  height: number,
): Body {
  const section = sectionMoments(outline, holes);
  return {
    mass: section.area * height,
    centre: [section.u, section.v, height / 2],
    secondMoments: [
      section.uu * height,
      section.vv * height,
      (section.area * height * (height * height)) / 12,
      section.uv * height,
      0,
      0,
    ],
  };
}
