import { type Placement, placePoint } from '../inertia/placement.ts';
import type { Vector3 } from '../linalg/vector3.ts';
import type { Extent } from '../solids/dimensions.ts';
import type { OwnBody } from './own-body.ts';
import type { Scope } from './scope.ts';
import type { Member, PartNode } from './tree.ts';

/** A cut may leave its host's box by this share of the host's size: rounding of coordinates, not a misplaced hole. */
const SLACK = 1e-6;

/**
 * There are no booleans, so a cut must lie wholly in material: a warning where its bounding box leaves that of the
 * material it stands in (the host's own solid and its children, or at the top all parts). Silent where a size is unknown.
 */
export function warnIfCutLeavesHost(own: OwnBody | null, members: readonly Member[], scope: Scope): void {
  const standing = members.flatMap((m) => (m.kind === 'copies' ? m.copies : [m]));
  const cuts = standing.filter((m) => m.node.part.cut);
  if (cuts.length === 0) return;
  const around = standing.filter((m) => !m.node.part.cut).map((m) => boxOf(m.node, m.placement));
  if (own) around.push(own.extent);
  if (around.length === 0 || around.some((box) => box === null)) return;
  const host = around.reduce((a, b) => join(a!, b!))!;
  const slack = SLACK * Math.max(...[0, 1, 2].map((k) => host.max[k]! - host.min[k]!));
  for (const cut of cuts) {
    const box = boxOf(cut.node, cut.placement);
    if (
      !box ||
      [0, 1, 2].every((k) => box.min[k]! >= host.min[k]! - slack && box.max[k]! <= host.max[k]! + slack)
    )
      continue;
    scope.run.warnings.push({
      code: 'CUT_LEAVES_HOST',
      message: `${scope.prefix}${cut.name}: the cut's bounding box leaves its host's; only what lies in material may be cut`,
      at: { file: scope.file.path, line: cut.node.part.line },
    });
  }
}

/** Bounding box of a node in its parent's axes; null where a body or mesh of unknown size is in it. */
function boxOf(node: PartNode, placement: Placement): Extent | null {
  const boxes: (Extent | null)[] = node.members
    .flatMap((m) => (m.kind === 'copies' ? m.copies : [m]))
    .filter((m) => !m.node.part.cut)
    .map((m) => boxOf(m.node, m.placement));
  if (node.own) boxes.push(node.own.extent);
  if (boxes.length === 0 || boxes.some((b) => b === null)) return null;
  const local = boxes.reduce((a, b) => join(a!, b!))!;
  return boxAround(cornersOf(local).map((p) => placePoint(placement, p)));
}

/** The eight corners of a box. */
export const cornersOf = ({ min, max }: Extent): Vector3[] =>
  [0, 1, 2, 3, 4, 5, 6, 7].map((i) => [
    (i & 1 ? max : min)[0],
    (i & 2 ? max : min)[1],
    (i & 4 ? max : min)[2],
  ]);

const boxAround = (points: readonly Vector3[]): Extent => {
  const min: [number, number, number] = [Infinity, Infinity, Infinity];
  const max: [number, number, number] = [-Infinity, -Infinity, -Infinity];
  for (const p of points)
    for (let k = 0; k < 3; k++) {
      min[k] = Math.min(min[k]!, p[k]!);
      max[k] = Math.max(max[k]!, p[k]!);
    }
  return { min, max };
};

const join = (a: Extent, b: Extent): Extent => boxAround([a.min, a.max, b.min, b.max]);
