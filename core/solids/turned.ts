import type { Body } from '../inertia/body.ts';
import { type SectionMoments, sectionMoments, type Vector2 } from './section-moments.ts';
import { sweptAngle } from './swept-angle.ts';

/**
 * A closed profile turned about z through an angle from the xz half-plane, counter-clockwise about +z.
 *
 * @param profile points (r, z) [m], r ≥ 0, in either turning sense; closes by itself
 * @param angle in (0, 2π] [rad]
 * @returns unit density: mass is the volume [m³], central Q [m⁵], local axes
 */
export const revolve = (profile: readonly Vector2[], angle: number): Body =>
  turnSection(sectionMoments(profile, []), angle);

/**
 * Ring of round section about z, centre at the origin; a partial one runs from +x toward +y.
 *
 * @param diameter of the circle through the section's centre [m]
 * @param section diameter of the section [m]
 * @param angle in (0, 2π] [rad]
 */
export function torus(diameter: number, section: number, angle: number): Body {
  const r2 = (section / 2) * (section / 2);
  const area = Math.PI * r2;
  const second = (area * r2) / 4;
  return turnSection(
    { area, u: diameter / 2, v: 0, uu: second, vv: second, uv: 0, uuu: 0, uuv: 0, uvv: 0 },
    angle,
  );
}

/**
 * The second-order kin of Pappus' theorem. With R the radius of the section's centroid, u and v offsets from it, and
 * sums over the section weighted by ρ = R + u:
 *   volume per radian ∫ρ dA = R A; ∫ρ² dA = R² A + uu; ∫ρ³ dA = R³ A + 3 R uu + uuu.
 * Moments are taken in axes along the bisector of the angle (p), across it (t) and z, where the pt and tz products
 * vanish, and turned back. The bisector's central moment is written as radial spread plus two terms that go with the
 * cube of the angle, so that a sliver of a turn keeps its digits.
 */
function turnSection(s: SectionMoments, angle: number): Body {
  const turn = sweptAngle(angle);
  const perRadian = s.u * s.area;
  const first = s.u * perRadian + s.uu;
  const second = s.u * (s.u * perRadian + 3 * s.uu) + s.uuu;
  const spread = s.u * s.uu + s.uuu - (s.uu * s.uu) / perRadian;
  const rise = s.uv / perRadian;
  const chord = 2 * turn.sinHalf;

  const across = (second * turn.lessSine) / 2;
  const along =
    turn.sinHalf === 0 ? across : turn.angle * spread - across + first * (first / perRadian) * turn.chordLoss;
  const axial = turn.angle * (s.u * s.vv + s.uvv - s.uv * rise);
  const alongAxial = chord * (s.u * s.uv + s.uuv - rise * s.uu);

  const c = turn.cosHalf;
  const n = turn.sinHalf;
  const mass = turn.angle * perRadian;
  const out = (first / perRadian) * (chord / turn.angle);
  return {
    mass,
    centre: [out * c, out * n, s.v + rise],
    secondMoments: [
      along * (c * c) + across * (n * n),
      along * (n * n) + across * (c * c),
      axial,
      (along - across) * (n * c),
      alongAxial * c,
      alongAxial * n,
    ],
  };
}
