import type { Symmetric3 } from '../linalg/symmetric3.ts';
import type { Vector3 } from '../linalg/vector3.ts';
import { atan2 } from '../math/index.ts';
import type { PrincipalRecord } from '../record/record.ts';
import { axisWeights } from './axis-weights.ts';
import { halfChords, matchAxes } from './match-axes.ts';
import type { AxisChange, PrincipalChange } from './types.ts';

/** One change of principal moments, or of the sum over a free plane, with its weights on tensors. */
export interface PrincipalQuantity {
  name: string;
  a: number;
  b: number;
  /** Σ Gₖ Cₖ over xx yy zz xy xz yz attributes a tensor C to this change. */
  weights: Symmetric3;
}

interface Side {
  readonly tensor: Symmetric3;
  readonly record: PrincipalRecord;
}

/**
 * Principal moments of two records by matched axis. The moments and axes are the tensors' own, computed anew; names and
 * free planes are the records'.
 *
 * @param a central tensor in body axes [kg·m²], products negative, and what its record says of it
 */
export function principalChange(
  a: Side,
  b: Side,
): { principal: PrincipalChange; quantities: PrincipalQuantity[] } {
  const match = matchAxes(
    { tensor: a.tensor, free: a.record.free },
    { tensor: b.tensor, free: b.record.free },
  );
  const quantities: PrincipalQuantity[] = [];
  const axes: AxisChange[] = [];
  for (const group of match.groups) {
    const ranks = group.map((rank) => match.toB[rank]!);
    const from = group.map((rank) => match.a.vectors[rank]!);
    const to = ranks.map((rank) => match.b.vectors[rank]!);
    const name = `principal.${group
      .map((rank) => a.record.nearest[rank]!)
      .sort()
      .join('+')}`;
    quantities.push({
      name,
      a: total(group, match.a.values),
      b: total(ranks, match.b.values),
      weights: axisWeights(from, to),
    });
    group.forEach((rank, i) => {
      const other = ranks[i]!;
      const free = group.length > 1;
      axes.push({
        quantity: name,
        rank: { a: rank, b: other },
        nearest: { a: a.record.nearest[rank]!, b: b.record.nearest[other]! },
        moment: { a: match.a.values[rank]!, b: match.b.values[other]! },
        axis: { a: [...from[i]!], b: alignedTo(from[i]!, to[i]!) },
        turned: free ? null : angleBetween(from[i]!, to[i]!),
        free,
        swapped: !free && rank !== other,
      });
    });
  }
  axes.sort((p, q) => p.rank.a - q.rank.a);
  return { principal: { axes, ranksSwapped: axes.some((axis) => axis.swapped) }, quantities };
}

const total = (ranks: readonly number[], values: Vector3) =>
  [...ranks].sort().reduce((sum, rank) => sum + values[rank]!, 0);

function alignedTo(v: Vector3, w: Vector3): number[] {
  const sign = v[0] * w[0] + v[1] * w[1] + v[2] * w[2] < 0 ? -1 : 1;
  return w.map((x) => sign * x + 0);
}

/** By chords, so that a turn of a microradian keeps its digits. */
function angleBetween(v: Vector3, w: Vector3): number {
  const { apart, together } = halfChords(v, w);
  return 2 * atan2(apart, together);
}
