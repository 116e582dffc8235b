import type { Body } from '../inertia/body.ts';
import type { Vector3 } from '../linalg/vector3.ts';
import { type TriangleMesh, volumeBody } from '../mesh/volume-body.ts';

/**
 * A body bounded by flat faces, in its own axes. Faces may have any number of corners and need not be convex: each is
 * a fan of signed triangles. Inner shells turned inward are voids.
 *
 * @param vertices [m]
 * @param faces 0-based vertex numbers, counter-clockwise seen from outside
 * @returns unit density: mass is the volume [m³], central Q [m⁵]; negative where every face is turned inward
 */
export const polyhedronBody = (vertices: readonly Vector3[], faces: readonly (readonly number[])[]): Body =>
  volumeBody(triangulate(vertices, faces));

/** Faces as fans of triangles from their first corner. */
export function triangulate(
  vertices: readonly Vector3[],
  faces: readonly (readonly number[])[],
): TriangleMesh {
  const flat = new Float64Array(3 * vertices.length);
  for (let i = 0; i < vertices.length; i++) flat.set(vertices[i]!, 3 * i);
  let count = 0;
  for (const face of faces) count += Math.max(0, face.length - 2);
  const triangles = new Uint32Array(3 * count);
  let t = 0;
  for (const face of faces)
    for (let i = 2; i < face.length; i++) {
      triangles[t++] = face[0]!;
      triangles[t++] = face[i - 1]!;
      triangles[t++] = face[i]!;
    }
  return { vertices: flat, triangles };
}
