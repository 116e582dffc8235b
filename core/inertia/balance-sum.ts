import type { Body } from './body.ts';
import { merge, subtractBody } from './merge.ts';

/**
 * What a node of the summation tree weighs: material and cut-outs apart, both with masses that are not negative.
 * A running sum through zero mass is singular, so cut-outs are subtracted once, when a group is closed.
 */
export interface Moments {
  readonly material: Body | null;
  readonly cut: Body | null;
}

export const NOTHING: Moments = { material: null, cut: null };

/**
 * The one order in which anything is ever added: a balanced binary tree over the items as they stand in the file,
 * the left half never smaller than the right. Rounding grows with its depth (log₂ n), and a changed item touches
 * only the nodes above it. Every face walks this tree, so all agree to the last bit.
 *
 * @param items at least one
 */
export function balancedSum<T>(items: readonly T[], join: (a: T, b: T) => T): T {
  const walk = (from: number, to: number): T => {
    if (to - from === 1) return items[from]!;
    const middle = from + Math.ceil((to - from) / 2);
    return join(walk(from, middle), walk(middle, to));
  };
  return walk(0, items.length);
}

const mergeMaybe = (a: Body | null, b: Body | null) => (a && b ? merge(a, b) : (a ?? b));

/** Sums children of one group on the fixed tree, material and cut-outs apart. */
export function sumMoments(items: readonly Moments[]): Moments {
  if (items.length === 0) return NOTHING;
  return balancedSum(items, (a, b) => ({
    material: mergeMaybe(a.material, b.material),
    cut: mergeMaybe(a.cut, b.cut),
  }));
}

/** A net mass below this share of the material's is what rounding leaves of nothing. */
const NO_MASS = 64 * Number.EPSILON;

/**
 * Closes a group: material less cut-outs.
 *
 * @returns the net body, or null where no mass remains (no centre, gyration or principal axes exist then)
 */
export function netBody({ material, cut }: Moments): Body | null {
  if (!material || material.mass === 0) return null;
  if (!cut) return material;
  return material.mass - cut.mass > NO_MASS * material.mass ? subtractBody(material, cut) : null;
}

/** The moments a closed group hands to its parent: its net body, or both sides where no net body exists. */
export function closeMoments(moments: Moments): Moments {
  const net = netBody(moments);
  return net ? { material: net, cut: null } : moments;
}

/** Net mass, also where it is zero or negative [kg]. */
export const netMass = ({ material, cut }: Moments): number => (material?.mass ?? 0) - (cut?.mass ?? 0);
