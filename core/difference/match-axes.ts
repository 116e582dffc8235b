import { assignAxes } from '../inertia/principal-axes.ts';
import { type Eigen3, eigenSymmetric3 } from '../linalg/eigen-symmetric3.ts';
import type { Symmetric3 } from '../linalg/symmetric3.ts';
import { dot, type Vector3 } from '../linalg/vector3.ts';

/** One side: its central tensor and which of its ascending moments share a free plane. */
export interface AxesOf {
  readonly tensor: Symmetric3;
  readonly free: readonly number[];
}

export interface MatchedAxes {
  readonly a: Eigen3;
  readonly b: Eigen3;
  /** For each axis of A by rank, the rank of its match in B. */
  readonly toB: readonly [number, number, number];
  /** Ranks in A that are reported together, because a plane is free on either side; singles alone. */
  readonly groups: readonly (readonly number[])[];
}

/**
 * Matches the principal axes of two central tensors by the one assignment (greatest Σ|cos|). Where a plane is free its
 * axes may be any in it, so the greatest sum over them all decides: the axis square to the plane goes to the nearest.
 * Swapping the sides inverts the match.
 */
export function matchAxes(a: AxesOf, b: AxesOf): MatchedAxes {
  const ea = eigenSymmetric3(a.tensor);
  const eb = eigenSymmetric3(b.tensor);
  // Ties are broken from the side whose tensor comes first, so that both directions break them alike.
  const forward = comesFirst(a.tensor, b.tensor);
  const toB = forward ? assign(ea, a.free, eb, b.free) : invert(assign(eb, b.free, ea, a.free));
  const groups = joined(
    a.free,
    b.free.map((rank) => toB.indexOf(rank)),
  );
  return { a: ea, b: eb, toB, groups };
}

function comesFirst(a: Symmetric3, b: Symmetric3): boolean {
  for (let k = 0; k < 6; k++) if (a[k] !== b[k]) return a[k]! < b[k]!;
  return true;
}

type Permutation = readonly [number, number, number];

const invert = (p: Permutation): Permutation => [p.indexOf(0), p.indexOf(1), p.indexOf(2)];

function assign(from: Eigen3, free: readonly number[], to: Eigen3, toFree: readonly number[]): Permutation {
  if (free.length === 3 || toFree.length === 3) return [0, 1, 2];
  if (free.length === 0 && toFree.length === 0) return assignAxes(from.vectors, to.vectors);
  const square = (ranks: readonly number[]) => 3 - ranks[0]! - ranks[1]!;
  if (free.length === 2 && toFree.length === 2) {
    const [n, m] = [square(free), square(toFree)];
    // Over all axes in both planes Σ|cos| is 1 + 2 cos θ for n with m, 1 + 2 sin θ for n in the other plane.
    const cosine = Math.abs(dot(from.vectors[n]!, to.vectors[m]!));
    if (cosine * cosine >= 0.5) return oneMatched(n, m);
    return assignAxes(from.vectors, to.vectors);
  }
  if (toFree.length === 2) return invert(assign(to, toFree, from, free));
  const n = square(free);
  const cosines = to.vectors.map((v) => Math.abs(dot(from.vectors[n]!, v)));
  return oneMatched(n, cosines.indexOf(Math.max(...cosines)));
}

/** Axis n goes to m; the two others keep their order. */
function oneMatched(n: number, m: number): Permutation {
  const rest = [0, 1, 2].filter((k) => k !== m);
  return [0, 1, 2].map((k) => (k === n ? m : rest.shift()!)) as unknown as Permutation;
}

/** Sets of ranks linked by a free plane on either side. */
function joined(first: readonly number[], second: readonly number[]): number[][] {
  const groups: number[][] = [[0], [1], [2]];
  for (const plane of [first, second]) {
    const hit = groups.filter((group) => group.some((rank) => plane.includes(rank)));
    if (hit.length < 2) continue;
    const rest = groups.filter((group) => !hit.includes(group));
    groups.splice(0, groups.length, ...rest, hit.flat().sort());
  }
  return groups.sort((p, q) => p[0]! - q[0]!);
}

/** Angle between two axes whatever their signs [rad], 0 … π/2; keeps the digits of a microradian. */
export function halfChords(v: Vector3, w: Vector3): { apart: number; together: number } {
  const length = (sign: 1 | -1) => {
    const [x, y, z] = [v[0] + sign * w[0], v[1] + sign * w[1], v[2] + sign * w[2]];
    return Math.sqrt(x * x + y * y + z * z);
  };
  const [minus, plus] = [length(-1), length(1)];
  return { apart: Math.min(minus, plus), together: Math.max(minus, plus) };
}
