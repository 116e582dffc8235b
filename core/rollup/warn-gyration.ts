import type { Warning } from '../errors.ts';
import { inertiaAboutCentre } from '../inertia/body.ts';
import { placePoint } from '../inertia/placement.ts';
import { leafBody } from './leaf-body.ts';
import type { Leaf } from './tree.ts';

/**
 * A bought item whose radius of gyration is larger than the whole machine cannot be in it: its tensor is too large for
 * its mass by powers of ten. The machine's size is that of the box around every other part.
 */
export function gyrationWarnings(leaves: readonly Leaf[]): Warning[] {
  const bodies = leaves.filter((leaf) => leaf.node.part.shape.kind === 'body');
  return bodies.flatMap((leaf) => {
    const others = leaves.filter((other) => other.node !== leaf.node);
    const size = sizeOf(others, leaf);
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

/** Diagonal of the box around the other parts and this one's centre [m]. */
function sizeOf(others: readonly Leaf[], self: Leaf): number {
  if (others.length === 0) return 0;
  const min = [Infinity, Infinity, Infinity];
  const max = [-Infinity, -Infinity, -Infinity];
  const take = (p: readonly number[]) => {
    for (let k = 0; k < 3; k++) {
      min[k] = Math.min(min[k]!, p[k]!);
      max[k] = Math.max(max[k]!, p[k]!);
    }
  };
  take(placePoint(self.placement, self.node.own!.body.centre));
  for (const leaf of others) {
    const { body, extent } = leaf.node.own!;
    if (!extent) take(placePoint(leaf.placement, body.centre));
    else
      for (let i = 0; i < 8; i++)
        take(
          placePoint(leaf.placement, [
            (i & 1 ? extent.max : extent.min)[0],
            (i & 2 ? extent.max : extent.min)[1],
            (i & 4 ? extent.max : extent.min)[2],
          ]),
        );
  }
  const d = [0, 1, 2].map((k) => max[k]! - min[k]!);
  return Math.sqrt(d[0]! * d[0]! + d[1]! * d[1]! + d[2]! * d[2]!);
}
