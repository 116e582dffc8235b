import type { Body } from './body.ts';

/**
 * Union of two bodies in central form: Q = Q₁ + Q₂ + (m₁ m₂ / (m₁ + m₂)) d dᵀ, d = c₁ − c₂ (Huygens–Steiner).
 * Never sums about a far origin, so an assembly keeps what its coordinates carry.
 *
 * @param a mass not negative, both bodies in the same axes
 * @param b mass not negative
 * @returns the union; a side of no mass keeps its second moments and lends no centre
 */
export function merge(a: Body, b: Body): Body {
  if (b.mass === 0 && isNothing(b)) return a;
  if (a.mass === 0 && isNothing(a)) return b;
  const mass = a.mass + b.mass;
  if (mass === 0) return { ...a, secondMoments: sum(a, b, 0, [0, 0, 0], 1) };
  const d = [a.centre[0] - b.centre[0], a.centre[1] - b.centre[1], a.centre[2] - b.centre[2]] as const;
  // The nearer the heavier side the step starts, the less a light part far off disturbs its digits.
  const heavier = a.mass >= b.mass ? a : b;
  const step = heavier === a ? -b.mass / mass : a.mass / mass;
  return {
    mass,
    centre: [
      heavier.centre[0] + step * d[0],
      heavier.centre[1] + step * d[1],
      heavier.centre[2] + step * d[2],
    ],
    secondMoments: sum(a, b, a.mass * (b.mass / mass), d, 1),
  };
}

/**
 * A body without a part of it: Q = Q₁ − Q₂ − (m₁ m₂ / (m₁ − m₂)) d dᵀ, d = c₁ − c₂, the inverse of `merge`.
 *
 * @param whole mass greater than the cut's
 * @param cut mass not negative, same axes
 */
export function subtractBody(whole: Body, cut: Body): Body {
  if (cut.mass === 0 && isNothing(cut)) return whole;
  const mass = whole.mass - cut.mass;
  const d = [
    whole.centre[0] - cut.centre[0],
    whole.centre[1] - cut.centre[1],
    whole.centre[2] - cut.centre[2],
  ] as const;
  const step = cut.mass / mass;
  return {
    mass,
    centre: [whole.centre[0] + step * d[0], whole.centre[1] + step * d[1], whole.centre[2] + step * d[2]],
    secondMoments: sum(whole, cut, -whole.mass * step, d, -1),
  };
}

function isNothing(b: Body): boolean {
  return b.secondMoments.every((q) => q === 0);
}

function sum(a: Body, b: Body, k: number, d: readonly [number, number, number], sign: 1 | -1) {
  const p = a.secondMoments;
  const q = b.secondMoments;
  return [
    p[0] + sign * q[0] + k * d[0] * d[0],
    p[1] + sign * q[1] + k * d[1] * d[1],
    p[2] + sign * q[2] + k * d[2] * d[2],
    p[3] + sign * q[3] + k * d[0] * d[1],
    p[4] + sign * q[4] + k * d[0] * d[2],
    p[5] + sign * q[5] + k * d[1] * d[2],
  ] as const;
}
