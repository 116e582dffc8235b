import type { JoinedSets } from './joined-sets.ts';
import type { TriangleMesh } from './volume-body.ts';

/** A closed mesh taken apart into its edge-connected shells. */
export interface Shells {
  readonly count: number;
  /** Shell of each triangle. */
  readonly of: Uint32Array;
  /** Places in `triangles` of each shell's triangles, shell after shell; shell s has starts[s] to starts[s + 1]. */
  readonly members: Uint32Array;
  readonly starts: Uint32Array;
  /** Signed volume of each [m³]: negative where it is turned inward. */
  readonly volumes: Float64Array;
  /** Bounding boxes, six numbers each: least x, y, z, greatest x, y, z [m]. */
  readonly boxes: Float64Array;
}

/** @param joined triangles joined along edges (`examineEdges`) */
export function takeApart(mesh: TriangleMesh, joined: JoinedSets): Shells {
  const { of, count } = joined.labels();
  const starts = new Uint32Array(count + 1);
  for (const shell of of) starts[shell + 1]!++;
  for (let s = 1; s <= count; s++) starts[s]! += starts[s - 1]!;
  const fill = starts.slice();
  const members = new Uint32Array(of.length);
  for (let t = 0; t < of.length; t++) members[fill[of[t]!]!++] = 3 * t;
  const shells = {
    count,
    of,
    members,
    starts,
    volumes: new Float64Array(count),
    boxes: new Float64Array(6 * count),
  };
  for (let s = 0; s < count; s++) measure(mesh, shells, s);
  return shells;
}

/** Places in `triangles` of one shell's triangles. */
export const membersOf = (shells: Shells, s: number): Uint32Array =>
  shells.members.subarray(shells.starts[s]!, shells.starts[s + 1]!);

/** Volume about the shell's own first corner, and its box. */
function measure({ vertices, triangles }: TriangleMesh, shells: Shells, s: number): void {
  const first = 3 * triangles[shells.members[shells.starts[s]!]!]!;
  const px = vertices[first]!;
  const py = vertices[first + 1]!;
  const pz = vertices[first + 2]!;
  const box = shells.boxes.subarray(6 * s, 6 * s + 6);
  box.set([px, py, pz, px, py, pz]);
  let six = 0;
  for (let m = shells.starts[s]!; m < shells.starts[s + 1]!; m++) {
    const t = shells.members[m]!;
    const a = 3 * triangles[t]!;
    const b = 3 * triangles[t + 1]!;
    const c = 3 * triangles[t + 2]!;
    for (let axis = 0; axis < 3; axis++) {
      const p = vertices[a + axis]!;
      const q = vertices[b + axis]!;
      const r = vertices[c + axis]!;
      if (p < box[axis]!) box[axis] = p;
      if (q < box[axis]!) box[axis] = q;
      if (r < box[axis]!) box[axis] = r;
      if (p > box[axis + 3]!) box[axis + 3] = p;
      if (q > box[axis + 3]!) box[axis + 3] = q;
      if (r > box[axis + 3]!) box[axis + 3] = r;
    }
    const ax = vertices[a]! - px;
    const ay = vertices[a + 1]! - py;
    const az = vertices[a + 2]! - pz;
    const bx = vertices[b]! - px;
    const by = vertices[b + 1]! - py;
    const bz = vertices[b + 2]! - pz;
    const cx = vertices[c]! - px;
    const cy = vertices[c + 1]! - py;
    const cz = vertices[c + 2]! - pz;
    six += ax * (by * cz - bz * cy) + ay * (bz * cx - bx * cz) + az * (bx * cy - by * cx);
  }
  shells.volumes[s] = six / 6;
}
