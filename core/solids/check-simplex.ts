import { norm, subtract, type Vector3 } from '../linalg/vector3.ts';
import { tetrahedron } from './blocks.ts';
import type { SolidFault } from './dimensions.ts';
import { trianglePlate } from './thin.ts';

/** Volumes and areas below this many eps of the longest edge's cube or square are the rounding of the coordinates. */
const SLACK = 16 * Number.EPSILON;

/** @returns SOLID_DEGENERATE where four vertices lie in a plane, or null */
export function checkTetrahedron(v: readonly Vector3[]): SolidFault | null {
  const size = longestEdge(v);
  if (tetrahedron(v[0]!, v[1]!, v[2]!, v[3]!).mass > SLACK * size * size * size) return null;
  return {
    code: 'SOLID_DEGENERATE',
    message: 'the tetrahedron has no volume: its four vertices lie in a plane.',
    key: 'vertices',
  };
}

/** @returns SOLID_DEGENERATE where three vertices lie on a line, or null */
export function checkTriangle(v: readonly Vector3[]): SolidFault | null {
  const size = longestEdge(v);
  if (trianglePlate(v[0]!, v[1]!, v[2]!).mass > SLACK * size * size) return null;
  return {
    code: 'SOLID_DEGENERATE',
    message: 'the triangle has no area: its three vertices lie on a line.',
    key: 'vertices',
  };
}

/** [m] */
export function longestEdge(points: readonly Vector3[]): number {
  let longest = 0;
  for (const a of points) for (const b of points) longest = Math.max(longest, norm(subtract(a, b)));
  return longest;
}
