import type { Vector3 } from '../linalg/vector3.ts';
import { atan2 } from '../math/index.ts';
import type { TriangleMesh } from './volume-body.ts';

/**
 * How often a closed mesh winds around a point: 1 inside a shell turned outward, −1 inside one turned inward, 0 outside.
 * The sum of the triangles' solid angles over 4π (A. van Oosterom and J. Strackee, IEEE Trans. Biomed. Eng. 30(2), 1983);
 * no ray is cast, so none can graze an edge. A point on the surface itself gives a half.
 *
 * @param of which triangles to sum (starting places in `triangles`); all where left out
 */
export function windingAround(mesh: TriangleMesh, point: Vector3, of?: Uint32Array): number {
  const count = of ? of.length : mesh.triangles.length / 3;
  let sum = 0;
  for (let i = 0; i < count; i++) sum += halfSolidAngle(mesh, of ? of[i]! : 3 * i, point);
  return sum / (2 * Math.PI);
}

function halfSolidAngle({ vertices, triangles }: TriangleMesh, t: number, point: Vector3): number {
  const i = 3 * triangles[t]!;
  const j = 3 * triangles[t + 1]!;
  const k = 3 * triangles[t + 2]!;
  const ax = vertices[i]! - point[0];
  const ay = vertices[i + 1]! - point[1];
  const az = vertices[i + 2]! - point[2];
  const bx = vertices[j]! - point[0];
  const by = vertices[j + 1]! - point[1];
  const bz = vertices[j + 2]! - point[2];
  const cx = vertices[k]! - point[0];
  const cy = vertices[k + 1]! - point[1];
  const cz = vertices[k + 2]! - point[2];
  const a = Math.sqrt(ax * ax + ay * ay + az * az);
  const b = Math.sqrt(bx * bx + by * by + bz * bz);
  const c = Math.sqrt(cx * cx + cy * cy + cz * cz);
  const volume = ax * (by * cz - bz * cy) + ay * (bz * cx - bx * cz) + az * (bx * cy - by * cx);
  const spread =
    a * b * c +
    (ax * bx + ay * by + az * bz) * c +
    (ax * cx + ay * cy + az * cz) * b +
    (bx * cx + by * cy + bz * cz) * a;
  return volume === 0 && spread === 0 ? 0 : atan2(volume, spread);
}
