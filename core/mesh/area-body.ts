import type { Body } from '../inertia/body.ts';
import { addCompensated, BLOCK } from './block-sums.ts';
import { boxCentre, type TriangleMesh } from './volume-body.ts';

/**
 * Area, centroid and central second moments of a triangle mesh taken as a thin surface: with a, b, c a triangle's
 * vertices from a point and s their sum, ∫ r rᵀ dA = A/12 (a aᵀ + b bᵀ + c cᵀ + s sᵀ), exact for a flat triangle. All terms are
 * positive. Two passes, the second about the centroid.
 *
 * @returns unit area density, the mesh's own axes: mass [m²], Q [m⁴]; open meshes are as good as closed ones
 */
export function areaBody(mesh: TriangleMesh): Body {
  const pivot = boxCentre(mesh.vertices);
  const first = surfaceSums(mesh, pivot[0], pivot[1], pivot[2]);
  const area = first[0]!;
  const at = (i: number) => (area === 0 ? 0 : first[i]! / (3 * area));
  const x = pivot[0] + at(1);
  const y = pivot[1] + at(2);
  const z = pivot[2] + at(3);
  const q = surfaceSums(mesh, x, y, z);
  return {
    mass: area,
    centre: [x, y, z],
    secondMoments: [q[4]! / 12, q[5]! / 12, q[6]! / 12, q[7]! / 12, q[8]! / 12, q[9]! / 12],
  };
}

/** A, 3 × first moments, 12 × second moments (xx, yy, zz, xy, xz, yz) about a point. */
function surfaceSums({ vertices, triangles }: TriangleMesh, px: number, py: number, pz: number) {
  const sums = new Float64Array(10);
  const lost = new Float64Array(10);
  const block = new Float64Array(10);
  for (let start = 0; start < triangles.length; start += 3 * BLOCK) {
    const end = Math.min(start + 3 * BLOCK, triangles.length);
    block.fill(0);
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
      const ux = bx - ax;
      const uy = by - ay;
      const uz = bz - az;
      const vx = cx - ax;
      const vy = cy - ay;
      const vz = cz - az;
      const nx = uy * vz - uz * vy;
      const ny = uz * vx - ux * vz;
      const nz = ux * vy - uy * vx;
      const area = Math.sqrt(nx * nx + ny * ny + nz * nz) / 2;
      const sx = ax + bx + cx;
      const sy = ay + by + cy;
      const sz = az + bz + cz;
      block[0]! += area;
      block[1]! += area * sx;
      block[2]! += area * sy;
      block[3]! += area * sz;
      block[4]! += area * (ax * ax + bx * bx + cx * cx + sx * sx);
      block[5]! += area * (ay * ay + by * by + cy * cy + sy * sy);
      block[6]! += area * (az * az + bz * bz + cz * cz + sz * sz);
      block[7]! += area * (ax * ay + bx * by + cx * cy + sx * sy);
      block[8]! += area * (ax * az + bx * bz + cx * cz + sx * sz);
      block[9]! += area * (ay * az + by * bz + cy * cz + sy * sz);
    }
    for (let i = 0; i < 10; i++) addCompensated(sums, lost, i, block[i]!);
  }
  return sums.map((sum, i) => sum + lost[i]!);
}
