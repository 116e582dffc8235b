import type { RawMesh } from './triangle-sink.ts';

/**
 * Joins vertices closer than a tolerance: each goes to the first earlier one within it (first come, so the result depends on
 * the file alone). Triangles that collapse are dropped and counted.
 *
 * @param tolerance in the unit of the coordinates; zero or less joins nothing
 */
export function weldNear(mesh: RawMesh, tolerance: number): RawMesh {
  if (!(tolerance > 0)) return mesh;
  const { vertices, triangles } = mesh;
  const count = vertices.length / 3;
  const kept = new Map<string, number[]>();
  const target = new Uint32Array(count);
  const out: number[] = [];
  for (let i = 0; i < count; i++) {
    const x = vertices[3 * i]!;
    const y = vertices[3 * i + 1]!;
    const z = vertices[3 * i + 2]!;
    const found = nearest(kept, out, x, y, z, tolerance);
    if (found >= 0) {
      target[i] = found;
      continue;
    }
    target[i] = out.length / 3;
    const name = cell(x / tolerance, y / tolerance, z / tolerance);
    const list = kept.get(name);
    if (list) list.push(target[i]!);
    else kept.set(name, [target[i]!]);
    out.push(x, y, z);
  }
  const welded = new Uint32Array(triangles.length);
  let used = 0;
  for (let t = 0; t < triangles.length; t += 3) {
    const a = target[triangles[t]!]!;
    const b = target[triangles[t + 1]!]!;
    const c = target[triangles[t + 2]!]!;
    if (a === b || b === c || a === c) continue;
    welded[used++] = a;
    welded[used++] = b;
    welded[used++] = c;
  }
  return {
    vertices: Float64Array.from(out),
    triangles: welded.slice(0, used),
    dropped: mesh.dropped + (triangles.length - used) / 3,
  };
}

const cell = (x: number, y: number, z: number): string =>
  `${Math.floor(x)} ${Math.floor(y)} ${Math.floor(z)}`;

/** The first kept vertex within the tolerance, among the 27 cells around; −1 where there is none. */
function nearest(
  kept: ReadonlyMap<string, readonly number[]>,
  out: readonly number[],
  x: number,
  y: number,
  z: number,
  tolerance: number,
): number {
  let first = -1;
  for (let i = -1; i <= 1; i++)
    for (let j = -1; j <= 1; j++)
      for (let k = -1; k <= 1; k++)
        for (const v of kept.get(cell(x / tolerance + i, y / tolerance + j, z / tolerance + k)) ?? []) {
          const dx = out[3 * v]! - x;
          const dy = out[3 * v + 1]! - y;
          const dz = out[3 * v + 2]! - z;
          if (dx * dx + dy * dy + dz * dz <= tolerance * tolerance && (first < 0 || v < first)) first = v;
        }
  return first;
}
