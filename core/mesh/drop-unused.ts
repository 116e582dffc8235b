import type { RawMesh } from './triangle-sink.ts';

/** The mesh without vertices that no triangle names: they would widen its box. The same mesh where there are none. */
export function dropUnused(mesh: RawMesh): RawMesh {
  const count = mesh.vertices.length / 3;
  const renumbered = new Int32Array(count).fill(-1);
  let used = 0;
  for (const v of mesh.triangles) if (renumbered[v]! < 0) renumbered[v] = used++;
  if (used === count) return mesh;
  const vertices = new Float64Array(3 * used);
  for (let v = 0; v < count; v++)
    if (renumbered[v]! >= 0) vertices.set(mesh.vertices.subarray(3 * v, 3 * v + 3), 3 * renumbered[v]!);
  return { ...mesh, vertices, triangles: mesh.triangles.map((v) => renumbered[v]!) };
}
