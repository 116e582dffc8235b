import type { Vector3 } from '../linalg/vector3.ts';
import { windingAround } from '../mesh/winding-number.ts';
import { polyhedronBody, triangulate } from './polyhedron.ts';

type Face = readonly number[];

/**
 * Faces of a closed polyhedron that look the wrong way, by their place in the list.
 *
 * Each shell (faces joined along edges) is first turned to agree with itself, starting from any face; then its sign is that
 * of its volume, outward for an outermost shell and inward for one inside another. Faces that were turned on the way to
 * that state are the wrong ones; a void may be given inward only.
 */
export function insideOut(vertices: readonly Vector3[], faces: readonly Face[]): number[] {
  const shells = agreeingShells(faces);
  const wrong: number[] = [];
  for (const shell of shells) {
    const turned = shell.map(({ face, flip }) => (flip ? [...faces[face]!].reverse() : faces[face]!));
    const outward = polyhedronBody(vertices, turned).mass > 0;
    const others = shells.filter((other) => other !== shell);
    const inside = isInside(vertices, faces, vertices[turned[0]![0]!]!, others);
    for (const { face, flip } of shell) if (flip === (outward !== inside)) wrong.push(face);
  }
  return wrong.sort((a, b) => a - b);
}

interface Turned {
  readonly face: number;
  readonly flip: boolean;
}

/** Faces by shell, each with whether it must be reversed to agree with the shell's first face. */
function agreeingShells(faces: readonly Face[]): Turned[][] {
  const users = new Map<string, { face: number; forward: boolean }[]>();
  faces.forEach((face, i) => {
    face.forEach((from, k) => {
      const to = face[(k + 1) % face.length]!;
      const name = from < to ? `${from} ${to}` : `${to} ${from}`;
      const list = users.get(name) ?? [];
      list.push({ face: i, forward: from < to });
      users.set(name, list);
    });
  });
  const neighbours: { face: number; agrees: boolean }[][] = faces.map(() => []);
  for (const list of users.values()) {
    if (list.length !== 2) continue;
    const [a, b] = list as [{ face: number; forward: boolean }, { face: number; forward: boolean }];
    neighbours[a.face]!.push({ face: b.face, agrees: a.forward !== b.forward });
    neighbours[b.face]!.push({ face: a.face, agrees: a.forward !== b.forward });
  }
  const seen = new Set<number>();
  const shells: Turned[][] = [];
  for (let start = 0; start < faces.length; start++) {
    if (seen.has(start)) continue;
    const shell: Turned[] = [{ face: start, flip: false }];
    seen.add(start);
    for (const { face, flip } of shell)
      for (const next of neighbours[face]!) {
        if (seen.has(next.face)) continue;
        seen.add(next.face);
        shell.push({ face: next.face, flip: next.agrees ? flip : !flip });
      }
    shells.push(shell);
  }
  return shells;
}

/** Whether a point lies within an odd number of the other shells. */
function isInside(
  vertices: readonly Vector3[],
  faces: readonly Face[],
  point: Vector3,
  shells: readonly (readonly Turned[])[],
): boolean {
  let inside = false;
  for (const shell of shells) {
    const turned = shell.map(({ face, flip }) => (flip ? [...faces[face]!].reverse() : faces[face]!));
    if (Math.abs(windingAround(triangulate(vertices, turned), point)) > 0.5) inside = !inside;
  }
  return inside;
}
