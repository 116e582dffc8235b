import type { Warning } from '../errors.ts';
import { inertiaAboutCentre } from '../inertia/body.ts';
import { placePoint } from '../inertia/placement.ts';
import { cornersOf } from './cut-extent.ts';
import { leafBody } from './leaf-body.ts';
import type { Leaf } from './tree.ts';

/**
 * A bought item whose radius of gyration is larger than the whole machine cannot be in it: its tensor is too large for
 * its mass by powers of ten.
 */
export function gyrationWarnings(leaves: readonly Leaf[]): Warning[] {
  const bodies = leaves.filter((leaf) => leaf.node.part.shape.kind === 'body');
  if (bodies.length === 0) return [];
  const size = sizeOf(leaves);
  return bodies.flatMap((leaf) => {
    const body = leafBody(leaf, 'basic');
    const gyration = Math.sqrt(Math.max(0, ...inertiaAboutCentre(body).slice(0, 3)) / body.mass);
    if (!(size > 0 && gyration > size)) return [];
    const mm = (metres: number) => `${Number((metres * 1000).toPrecision(3))} mm`;
    return [
      {
        code: 'BODY_GYRATION_TOO_LARGE',
        message: `${leaf.path}: a radius of gyration of ${mm(gyration)} is larger than the whole assembly (${mm(size)}); look for a slip of units`,
        at: { file: leaf.node.scope.file.path, line: leaf.node.part.line },
      },
    ];
  });
}

/** Diagonal of the box around all solids and the centres of all bodies [m]; zero where there is one body alone. */
function sizeOf(leaves: readonly Leaf[]): number {
  const min = [Infinity, Infinity, Infinity];
  const max = [-Infinity, -Infinity, -Infinity];
  const take = (p: readonly number[]) => {
    for (let k = 0; k < 3; k++) {
      min[k] = Math.min(min[k]!, p[k]!);
      max[k] = Math.max(max[k]!, p[k]!);
    }
  };
  for (const leaf of leaves) {
    const { body, extent } = leaf.node.own!;
    if (!extent) take(placePoint(leaf.placement, body.centre));
    else for (const corner of cornersOf(extent)) take(placePoint(leaf.placement, corner));
  }
  const d = [0, 1, 2].map((k) => max[k]! - min[k]!);
  return Math.sqrt(d[0]! * d[0]! + d[1]! * d[1]! + d[2]! * d[2]!);
}
