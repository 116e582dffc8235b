import type { Vector3 } from '../linalg/vector3.ts';
import { box, pyramid, tetrahedron, wedge } from './blocks.ts';
import { checkPolyhedron } from './check-polyhedron.ts';
import { checkTetrahedron } from './check-simplex.ts';
import { around, aroundPoints, defineSolid, HEIGHT, number, numbers } from './define-solid.ts';
import type { SolidDimensions, SolidKind } from './dimensions.ts';
import { polyhedronBody } from './polyhedron.ts';

const vertices = (dims: SolidDimensions): readonly Vector3[] => dims.vertices as readonly Vector3[];
const faces = (dims: SolidDimensions) => dims.faces as readonly (readonly number[])[];

/** Solids with flat faces alone. */
export const FLAT_KINDS: readonly SolidKind[] = [
  defineSolid('box', 'solid', {
    about: 'rectangular block',
    origin: 'centre',
    keys: [{ name: 'size', kind: 'size3', about: 'lengths along x, y and z' }],
    make: (d) => box(numbers(d.size)[0], numbers(d.size)[1], numbers(d.size)[2]),
    extent: (d) => {
      const [x, y, z] = numbers(d.size);
      return around(x / 2, y / 2, -z / 2, z / 2);
    },
  }),
  defineSolid('pyramid', 'solid', {
    about: 'right pyramid on a rectangle, apex up',
    origin: 'centre of the base, body on +z',
    keys: [{ name: 'base', kind: 'size2', about: 'lengths of the base along x and y' }, HEIGHT],
    make: (d) => pyramid(numbers(d.base)[0], numbers(d.base)[1], number(d.height)),
    extent: (d) => around(numbers(d.base)[0] / 2, numbers(d.base)[1] / 2, 0, number(d.height)),
  }),
  defineSolid('wedge', 'solid', {
    about: 'right triangular prism',
    origin: 'corner: right-angle edge along z from the origin, legs on +x and +y',
    keys: [{ name: 'size', kind: 'size3', about: 'legs along x and y, length along z' }],
    make: (d) => wedge(numbers(d.size)[0], numbers(d.size)[1], numbers(d.size)[2]),
    extent: (d) => ({ min: [0, 0, 0], max: numbers(d.size) }),
  }),
  defineSolid('tetrahedron', 'solid', {
    about: 'body of four vertices, in any order',
    origin: 'its own axes',
    keys: [{ name: 'vertices', kind: 'points3', about: 'four corners', count: { min: 4, max: 4 } }],
    make: (d) => tetrahedron(vertices(d)[0]!, vertices(d)[1]!, vertices(d)[2]!, vertices(d)[3]!),
    extent: (d) => aroundPoints(vertices(d)),
    smallest: (d) => smallestSide(aroundPoints(vertices(d))),
    check: (d) => checkTetrahedron(vertices(d)),
  }),
  defineSolid('polyhedron', 'solid', {
    about: 'body of flat faces; an inner shell turned inward is a void',
    origin: 'its own axes',
    keys: [
      { name: 'vertices', kind: 'points3', about: 'corners, numbered from 0', count: { min: 4 } },
      {
        name: 'faces',
        kind: 'faces',
        about: 'vertex numbers of each face, counter-clockwise seen from outside',
        count: { min: 4 },
      },
    ],
    make: (d) => polyhedronBody(vertices(d), faces(d)),
    extent: (d) => aroundPoints(vertices(d)),
    smallest: (d) => smallestSide(aroundPoints(vertices(d))),
    check: (d, say) => checkPolyhedron(vertices(d), faces(d), say),
  }),
];

const smallestSide = ({ min, max }: { min: Vector3; max: Vector3 }): number =>
  Math.min(max[0] - min[0], max[1] - min[1], max[2] - min[2]);
