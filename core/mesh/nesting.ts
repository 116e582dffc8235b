import type { Vector3 } from '../linalg/vector3.ts';
import { membersOf, type Shells } from './shells.ts';
import type { TriangleMesh } from './volume-body.ts';
import { windingAround } from './winding-number.ts';

/** For each shell, the shells that it lies inside. */
export function findContainers(mesh: TriangleMesh, shells: Shells): number[][] {
  const containers: number[][] = Array.from({ length: shells.count }, () => []);
  const byStart = Array.from({ length: shells.count }, (_, s) => s);
  byStart.sort((a, b) => shells.boxes[6 * a]! - shells.boxes[6 * b]! || a - b);
  for (let k = 0; k < byStart.length; k++) {
    const outer = byStart[k]!;
    // A shell inside another starts no earlier along x; equal starts may come in either order.
    let from = k;
    while (from > 0 && shells.boxes[6 * byStart[from - 1]!] === shells.boxes[6 * outer]) from--;
    for (let j = from; j < byStart.length; j++) {
      const inner = byStart[j]!;
      if (shells.boxes[6 * inner]! > shells.boxes[6 * outer + 3]!) break;
      if (inner !== outer && boxWithin(shells, inner, outer) && isWithin(mesh, shells, inner, outer))
        containers[inner]!.push(outer);
    }
  }
  return containers;
}

function boxWithin({ boxes }: Shells, inner: number, outer: number): boolean {
  for (let axis = 0; axis < 3; axis++) {
    if (boxes[6 * inner + axis]! < boxes[6 * outer + axis]!) return false;
    if (boxes[6 * inner + axis + 3]! > boxes[6 * outer + axis + 3]!) return false;
  }
  return true;
}

/** Corners tried before a shell that touches another everywhere is taken to be outside it. */
const TRIES = 8;
/** A winding number this far from a whole one belongs to a point on the surface. */
const ON_SURFACE = 1e-6;

/** Shells do not cross, so any corner of the inner that is not on the outer's surface decides. */
function isWithin(mesh: TriangleMesh, shells: Shells, inner: number, outer: number): boolean {
  const corners = membersOf(shells, inner);
  const step = Math.max(1, Math.floor(corners.length / TRIES));
  for (let i = 0; i < corners.length; i += step) {
    const winding = windingAround(mesh, vertexAt(mesh, corners[i]!), membersOf(shells, outer));
    const whole = Math.round(winding);
    if (Math.abs(winding - whole) < ON_SURFACE) return whole !== 0;
  }
  return false;
}

function vertexAt({ vertices, triangles }: TriangleMesh, t: number): Vector3 {
  const i = 3 * triangles[t]!;
  return [vertices[i]!, vertices[i + 1]!, vertices[i + 2]!];
}
