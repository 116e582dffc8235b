import { findContainers } from './nesting.ts';
import type { Shells } from './shells.ts';
import type { TriangleMesh } from './volume-body.ts';

/** Which way each shell should look, and what that makes of it. */
export interface Orientation {
  /** Shells that were turned over, by number; empty for a mesh that is as it should be. */
  readonly turned: ReadonlySet<number>;
  /** Shells turned inward inside another: voids. */
  readonly voids: number;
  /** Shells turned outward inside the material of another: their common volume counts twice. */
  readonly nested: number;
}

/**
 * Judges each shell by itself. One turned inward is a void where it lies in material, that is inside more outward shells
 * than inward ones; anywhere else it is inside out and is turned, with all that lies inside it.
 */
export function orientShells(mesh: TriangleMesh, shells: Shells): Orientation {
  const turned = new Set<number>();
  if (shells.count === 1) {
    if (shells.volumes[0]! < 0) turned.add(0);
    return { turned, voids: 0, nested: 0 };
  }
  const containers = findContainers(mesh, shells);
  const order = Array.from({ length: shells.count }, (_, s) => s);
  order.sort((a, b) => containers[a]!.length - containers[b]!.length || a - b);
  const sign = (s: number) => (shells.volumes[s]! < 0 !== turned.has(s) ? -1 : 1);
  let voids = 0;
  let nested = 0;
  for (const s of order) {
    const around = containers[s]!;
    const host = around.reduce(
      (deepest, c) => (deepest < 0 || containers[c]!.length > containers[deepest]!.length ? c : deepest),
      -1,
    );
    if (host >= 0 && turned.has(host)) turned.add(s);
    const material = around.reduce((sum, c) => sum + sign(c), 0);
    if (sign(s) < 0 && material < 1) {
      if (turned.has(s)) turned.delete(s);
      else turned.add(s);
    }
    if (sign(s) < 0) voids++;
    else if (material > 0) nested++;
  }
  return { turned, voids, nested };
}

/** The mesh with some shells' triangles reversed; the same mesh where there are none. */
export function turnShells<T extends TriangleMesh>(mesh: T, shells: Shells, turned: ReadonlySet<number>): T {
  if (turned.size === 0) return mesh;
  const triangles = mesh.triangles.slice();
  for (let t = 0; t < shells.of.length; t++) {
    if (!turned.has(shells.of[t]!)) continue;
    triangles[3 * t + 1] = mesh.triangles[3 * t + 2]!;
    triangles[3 * t + 2] = mesh.triangles[3 * t + 1]!;
  }
  return { ...mesh, triangles };
}
