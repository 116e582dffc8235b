import { cross, dot, norm, subtract, type Vector3 } from '../linalg/vector3.ts';
import type { SayLength, SolidFault } from './dimensions.ts';
import { insideOut } from './face-orientation.ts';
import { polyhedronBody } from './polyhedron.ts';

type Face = readonly number[];

/**
 * Faces are flat, meet two and two along their edges, and look outward (inner shells inward).
 *
 * @returns SOLID_FACE_TOO_FEW, SOLID_FACE_INDEX, SOLID_FACE_NOT_PLANAR, SOLID_NOT_CLOSED, SOLID_FACE_INVERTED,
 * SOLID_DEGENERATE or null; the message names the first face at fault, counting from 1 as in the list
 */
export function checkPolyhedron(
  vertices: readonly Vector3[],
  faces: readonly Face[],
  say: SayLength,
): SolidFault | null {
  return (
    checkIndices(vertices, faces) ??
    checkPlanes(vertices, faces, say) ??
    checkClosed(faces) ??
    checkOutward(vertices, faces)
  );
}

/** "face 3 (0, 4, 5)". */
const sayFace = (face: Face, i: number): string => `face ${i + 1} (${face.join(', ')})`;

function checkIndices(vertices: readonly Vector3[], faces: readonly Face[]): SolidFault | null {
  for (let i = 0; i < faces.length; i++) {
    const face = faces[i]!;
    if (new Set(face).size < 3 || new Set(face).size < face.length)
      return {
        code: 'SOLID_FACE_TOO_FEW',
        message: `${sayFace(face, i)} needs three or more vertices, each of them once.`,
        key: 'faces',
      };
    const wrong = face.find((v) => !Number.isInteger(v) || v < 0 || v >= vertices.length);
    if (wrong !== undefined)
      return {
        code: 'SOLID_FACE_INDEX',
        message: `${sayFace(face, i)} names vertex ${wrong}; vertices are numbered 0 to ${vertices.length - 1}.`,
        key: 'faces',
      };
  }
  return null;
}

/**
 * How far a corner may lie off its face's plane, per size of the body: corners typed with seven digits are off by up to
 * 1e-7, and a face bent by that changes the volume by no more. A double's own rounding is far below.
 */
export const PLANARITY = 1e-6;

function checkPlanes(
  vertices: readonly Vector3[],
  faces: readonly Face[],
  say: SayLength,
): SolidFault | null {
  const size = spread(vertices);
  for (let i = 0; i < faces.length; i++) {
    const face = faces[i]!;
    const origin = vertices[face[0]!]!;
    const normal = areaVector(vertices, face);
    const length = norm(normal);
    if (!(length > 16 * Number.EPSILON * size * size))
      return {
        code: 'SOLID_DEGENERATE',
        message: `${sayFace(face, i)} has no area: its vertices lie on a line.`,
        key: 'faces',
      };
    for (const v of face) {
      const off = Math.abs(dot(subtract(vertices[v]!, origin), normal)) / length;
      if (off > PLANARITY * size)
        return {
          code: 'SOLID_FACE_NOT_PLANAR',
          message: `${sayFace(face, i)} is not flat: vertex ${v} lies ${say(off)} off its plane.`,
          hint: 'correct the vertex, or split the face into triangles',
          key: 'faces',
        };
    }
  }
  return null;
}

/** Twice the face's area along its normal (L. Newell's sum), from its first corner. */
function areaVector(vertices: readonly Vector3[], face: Face): Vector3 {
  const origin = vertices[face[0]!]!;
  let [x, y, z] = [0, 0, 0];
  for (let i = 2; i < face.length; i++) {
    const n = cross(subtract(vertices[face[i - 1]!]!, origin), subtract(vertices[face[i]!]!, origin));
    x += n[0];
    y += n[1];
    z += n[2];
  }
  return [x, y, z];
}

function spread(vertices: readonly Vector3[]): number {
  let size = 0;
  for (let axis = 0; axis < 3; axis++) {
    const along = vertices.map((v) => v[axis]!);
    size = Math.max(size, along.reduce((a, b) => Math.max(a, b)) - along.reduce((a, b) => Math.min(a, b)));
  }
  return size;
}

function checkClosed(faces: readonly Face[]): SolidFault | null {
  const uses = new Map<string, { face: number; forward: boolean }[]>();
  faces.forEach((face, i) => {
    face.forEach((from, k) => {
      const to = face[(k + 1) % face.length]!;
      const name = from < to ? `${from} ${to}` : `${to} ${from}`;
      uses.set(name, [...(uses.get(name) ?? []), { face: i, forward: from < to }]);
    });
  });
  for (const [name, users] of uses) {
    // Two faces that disagree are told apart later, as an inverted face.
    const forward = users.filter((user) => user.forward).length;
    if (users.length === 2 || 2 * forward === users.length) continue;
    const i = users[users.length - 1]!.face;
    const [from, to] = name.split(' ');
    return {
      code: 'SOLID_NOT_CLOSED',
      message: `the polyhedron is not closed: the edge between vertices ${from} and ${to} belongs to ${users.length === 1 ? `${sayFace(faces[i]!, i)} alone` : `${users.length} faces, ${forward} of them running it from ${from} to ${to}`}.`,
      hint: 'each edge needs a face on either side',
      key: 'faces',
    };
  }
  return null;
}

function checkOutward(vertices: readonly Vector3[], faces: readonly Face[]): SolidFault | null {
  const inverted = insideOut(vertices, faces);
  if (inverted.length > 0) {
    const named = inverted.slice(0, 4).map((i) => sayFace(faces[i]!, i));
    const more = inverted.length > 4 ? ` and ${inverted.length - 4} more` : '';
    const i = inverted[0]!;
    return {
      code: 'SOLID_FACE_INVERTED',
      message: `${named.join(', ')}${more} ${inverted.length === 1 ? 'looks' : 'look'} inward; vertices go counter-clockwise seen from outside.`,
      hint: `write face ${i + 1} as [${[...faces[i]!].reverse().join(', ')}]`,
      key: 'faces',
    };
  }
  const size = spread(vertices);
  if (polyhedronBody(vertices, faces).mass > 64 * Number.EPSILON * size * size * size) return null;
  return { code: 'SOLID_DEGENERATE', message: 'the polyhedron encloses no volume.', key: 'vertices' };
}
