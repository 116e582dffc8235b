import { displayUnits } from '../figures/index.ts';
import { placePoint } from '../inertia/placement.ts';
import { principalAxes } from '../inertia/principal-axes.ts';
import type { Vector3 } from '../linalg/vector3.ts';
import type { RollUpRecord } from '../record/record.ts';
import { leafBody } from '../rollup/leaf-body.ts';
import type { RollUp } from '../rollup/roll-up.ts';
import type { Leaf } from '../rollup/tree.ts';
import { wireframe } from '../solids/index.ts';
import { boxEdges, equivalentHalfLengths } from './equivalent-box.ts';
import { type DrawnPart, threeView } from './three-view.ts';

/** More outlines than this make a blot, not a drawing. */
const DRAWN_AT_MOST = 1500;

/** Front, side and top of a roll-up as SVG; predicted masses where the file has growth. */
export function drawRoll(roll: RollUp, record: RollUpRecord): string {
  const on = record.conventions.growth ? 'predicted' : 'basic';
  const totals = record[on];
  const leaves = [...roll.leaves].sort((a, b) => massOf(b) - massOf(a)).slice(0, DRAWN_AT_MOST);
  const { length, mass } = displayUnits(record);
  return threeView({
    title: record.assembly,
    state: record.state,
    stamp: record.stamp,
    on,
    frame: record.conventions.frame,
    parts: leaves.map(drawnPart),
    omitted: roll.leaves.length - leaves.length,
    mass: totals.mass,
    centre: totals.centre as unknown as Vector3,
    principal: totals.principal!,
    limits: centreLimits(record),
    units: { length, mass },
  });
}

const massOf = (leaf: Leaf): number => leaf.node.own!.body.mass * leaf.factor.basic;

function drawnPart(leaf: Leaf): DrawnPart {
  return { path: leaf.path, cut: leaf.sign < 0, lines: linesOf(leaf) };
}

/** A solid by its edges, a mesh by its bounding box, a bought item by its equivalent box, a particle by a mark. */
function linesOf(leaf: Leaf): Vector3[][] {
  const { part, own } = leaf.node;
  const { shape } = part;
  if (shape.kind === 'solid' && own!.dimensions) {
    const wires = wireframe(shape.solid.name, own!.dimensions);
    const placed = wires.map((line) => line.map((p) => placePoint(leaf.placement, p)));
    if (placed.length > 0) return placed;
  } else if (own!.extent) {
    const { min, max } = own!.extent;
    const middle = [0, 1, 2].map((k) => (min[k]! + max[k]!) / 2) as unknown as Vector3;
    const half = [0, 1, 2].map((k) => (max[k]! - min[k]!) / 2) as unknown as Vector3;
    return boxEdges(middle, BODY_AXES, half).map((line) => line.map((p) => placePoint(leaf.placement, p)));
  }
  const body = leafBody(leaf, 'basic');
  if (shape.kind !== 'body' || !(body.mass > 0)) return [[body.centre]];
  const { moments, axes } = principalAxes(body);
  return boxEdges(body.centre, axes, equivalentHalfLengths(body.mass, moments));
}

const BODY_AXES = [
  [1, 0, 0],
  [0, 1, 0],
  [0, 0, 1],
];

/** Limits on the whole's centre in body axes, as plain `centre.x|y|z`. */
function centreLimits(record: RollUpRecord) {
  return record.limits.flatMap((limit) => {
    const axis = /^\s*(?:basic\.|predicted\.)?centre\.([xyz])\s*$/.exec(limit.quantity)?.[1];
    if (!axis || limit.of !== null || limit.frame !== null) return [];
    return [{ axis: 'xyz'.indexOf(axis) as 0 | 1 | 2, min: limit.min, max: limit.max }];
  });
}
