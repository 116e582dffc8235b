import type { Body } from '../inertia/body.ts';
import type { Vector3 } from '../linalg/vector3.ts';
import { addCompensated, BLOCK } from './block-sums.ts';

/** Three coordinates a vertex, three vertex numbers a triangle. */
export interface TriangleMesh {
  /** x, y, z of each vertex [m]. */
  readonly vertices: Float64Array;
  /** Vertex numbers, counter-clockwise seen from outside. */
  readonly triangles: Uint32Array;
}

/**
 * Volume, centroid and central second moments of a closed triangle mesh: the sum over its triangles of signed
 * tetrahedra to one point near the body (B. Mirtich, J. Graphics Tools 1(2), 1996; D. Eberly, Polyhedral mass properties,
 * 2002; F. Tonon, J. Math. Stat. 1(1), 2004). The first pass takes volume and centroid about the centre of the bounding
 * box, the second the second moments about that centroid, so a mesh far from its origin loses only what its coordinates
 * lost. Blocks of triangles join in compensated sums.
 *
 * @returns unit density, the mesh's own axes: mass [m³], negative where the mesh is turned inside out; Q [m⁵] signed alike.
 * A mesh without volume has its pivot for a centre.
 */
export function volumeBody(mesh: TriangleMesh): Body {
  const pivot = boxCentre(mesh.vertices);
  const first = volumeAndFirst(mesh, pivot);
  const volume = first[0]! / 6;
  const four = first[0]! * 4;
  const centre: Vector3 =
    four === 0
      ? pivot
      : [pivot[0] + first[1]! / four, pivot[1] + first[2]! / four, pivot[2] + first[3]! / four];
  const q = secondAbout(mesh, centre);
  return {
    mass: volume,
    centre,
    secondMoments: [q[0]! / 120, q[1]! / 120, q[2]! / 120, q[3]! / 120, q[4]! / 120, q[5]! / 120],
  };
}

/** Centre of the bounding box of all vertices [m]. */
export function boxCentre(vertices: Float64Array): Vector3 {
  let x0 = Infinity;
  let y0 = Infinity;
  let z0 = Infinity;
  let x1 = -Infinity;
  let y1 = -Infinity;
  let z1 = -Infinity;
  for (let i = 0; i < vertices.length; i += 3) {
    const x = vertices[i]!;
    const y = vertices[i + 1]!;
    const z = vertices[i + 2]!;
    if (x < x0) x0 = x;
    if (x > x1) x1 = x;
    if (y < y0) y0 = y;
    if (y > y1) y1 = y;
    if (z < z0) z0 = z;
    if (z > z1) z1 = z;
  }
  return vertices.length === 0 ? [0, 0, 0] : [x0 + (x1 - x0) / 2, y0 + (y1 - y0) / 2, z0 + (z1 - z0) / 2];
}

/** Σ 6V and Σ 6V (a + b + c), that is 24 times the first moments, about the pivot. */
function volumeAndFirst({ vertices, triangles }: TriangleMesh, pivot: Vector3): Float64Array {
  const [px, py, pz] = pivot;
  const sums = new Float64Array(4);
  const lost = new Float64Array(4);
  for (let start = 0; start < triangles.length; start += 3 * BLOCK) {
    const end = Math.min(start + 3 * BLOCK, triangles.length);
    let volume = 0;
    let mx = 0;
    let my = 0;
    let mz = 0;
    for (let t = start; t < end; t += 3) {
      const a = 3 * triangles[t]!;
      const b = 3 * triangles[t + 1]!;
      const c = 3 * triangles[t + 2]!;
      const ax = vertices[a]! - px;
      const ay = vertices[a + 1]! - py;
      const az = vertices[a + 2]! - pz;
      const bx = vertices[b]! - px;
      const by = vertices[b + 1]! - py;
      const bz = vertices[b + 2]! - pz;
      const cx = vertices[c]! - px;
      const cy = vertices[c + 1]! - py;
      const cz = vertices[c + 2]! - pz;
      const v = sixVolumes(ax, ay, az, bx, by, bz, cx, cy, cz);
      volume += v;
      mx += v * (ax + bx + cx);
      my += v * (ay + by + cy);
      mz += v * (az + bz + cz);
    }
    addCompensated(sums, lost, 0, volume);
    addCompensated(sums, lost, 1, mx);
    addCompensated(sums, lost, 2, my);
    addCompensated(sums, lost, 3, mz);
  }
  return sums.map((sum, i) => sum + lost[i]!);
}

/**
 * Σ 6V (a aᵀ + b bᵀ + c cᵀ + s sᵀ), s = a + b + c: 120 times the second moments about `centre`. Order xx, yy, zz, xy, xz, yz.
 */
function secondAbout({ vertices, triangles }: TriangleMesh, centre: Vector3): Float64Array {
  const [px, py, pz] = centre;
  const sums = new Float64Array(6);
  const lost = new Float64Array(6);
  for (let start = 0; start < triangles.length; start += 3 * BLOCK) {
    const end = Math.min(start + 3 * BLOCK, triangles.length);
    let xx = 0;
    let yy = 0;
    let zz = 0;
    let xy = 0;
    let xz = 0;
    let yz = 0;
    for (let t = start; t < end; t += 3) {
      const a = 3 * triangles[t]!;
      const b = 3 * triangles[t + 1]!;
      const c = 3 * triangles[t + 2]!;
      const ax = vertices[a]! - px;
      const ay = vertices[a + 1]! - py;
      const az = vertices[a + 2]! - pz;
      const bx = vertices[b]! - px;
      const by = vertices[b + 1]! - py;
      const bz = vertices[b + 2]! - pz;
      const cx = vertices[c]! - px;
      const cy = vertices[c + 1]! - py;
      const cz = vertices[c + 2]! - pz;
      const v = sixVolumes(ax, ay, az, bx, by, bz, cx, cy, cz);
      const sx = ax + bx + cx;
      const sy = ay + by + cy;
      const sz = az + bz + cz;
      xx += v * (ax * ax + bx * bx + cx * cx + sx * sx);
      yy += v * (ay * ay + by * by + cy * cy + sy * sy);
      zz += v * (az * az + bz * bz + cz * cz + sz * sz);
      xy += v * (ax * ay + bx * by + cx * cy + sx * sy);
      xz += v * (ax * az + bx * bz + cx * cz + sx * sz);
      yz += v * (ay * az + by * bz + cy * cz + sy * sz);
    }
    addCompensated(sums, lost, 0, xx);
    addCompensated(sums, lost, 1, yy);
    addCompensated(sums, lost, 2, zz);
    addCompensated(sums, lost, 3, xy);
    addCompensated(sums, lost, 4, xz);
    addCompensated(sums, lost, 5, yz);
  }
  return sums.map((sum, i) => sum + lost[i]!);
}

/** a · (b × c): six times the signed volume of the tetrahedron from the pivot. Taken by edges, so slivers cancel early. */
function sixVolumes(
  ax: number,
  ay: number,
  az: number,
  bx: number,
  by: number,
  bz: number,
  cx: number,
  cy: number,
  cz: number,
): number {
  const ux = bx - ax;
  const uy = by - ay;
  const uz = bz - az;
  const vx = cx - ax;
  const vy = cy - ay;
  const vz = cz - az;
  return ax * (uy * vz - uz * vy) + ay * (uz * vx - ux * vz) + az * (ux * vy - uy * vx);
}
