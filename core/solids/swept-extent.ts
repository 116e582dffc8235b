import { cos, sin } from '../math/index.ts';
import { aroundPoints } from './define-solid.ts';
import type { Extent } from './dimensions.ts';

/** Box of what lies between two radii and two heights, swept about z from +x through an angle [m, rad]. */
export function sweptExtent(inner: number, outer: number, from: number, to: number, angle: number): Extent {
  const corners: [number, number, number][] = [];
  const add = (at: number) => {
    for (const r of [inner, outer])
      corners.push([r * cos(at), r * sin(at), from], [r * cos(at), r * sin(at), to]);
  };
  add(0);
  add(angle);
  // Between its ends an arc reaches furthest along an axis at a quarter turn.
  for (let quarter = 1; quarter < 4; quarter++)
    if ((quarter * Math.PI) / 2 < angle) add((quarter * Math.PI) / 2);
  return aroundPoints(corners);
}
