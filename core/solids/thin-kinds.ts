import type { Vector3 } from '../linalg/vector3.ts';
import { checkTriangle, longestEdge } from './check-simplex.ts';
import {
  around,
  aroundPoints,
  DIAMETER,
  defineSolid,
  HEIGHT,
  LENGTH,
  number,
  numbers,
} from './define-solid.ts';
import type { SolidDimensions, SolidKind } from './dimensions.ts';
import { particle, ring, rod } from './lines.ts';
import {
  conicalShell,
  cylindricalShell,
  disk,
  hemisphericalShell,
  plate,
  sphericalShell,
  trianglePlate,
} from './thin.ts';

const half = (dims: SolidDimensions): number => number(dims.diameter) / 2;
const vertices = (dims: SolidDimensions): readonly Vector3[] => dims.vertices as readonly Vector3[];
const flat = (r: number) => around(r, r, 0, 0);

/** Bodies without a section: mass only. */
export const LINE_KINDS: readonly SolidKind[] = [
  defineSolid('particle', 'line', {
    about: 'mass in a point',
    origin: 'itself',
    round: true,
    keys: [],
    make: particle,
    extent: () => flat(0),
  }),
  defineSolid('rod', 'line', {
    about: 'slender straight rod along z',
    origin: 'centre',
    round: true,
    keys: [LENGTH],
    make: (d) => rod(number(d.length)),
    extent: (d) => around(0, 0, -number(d.length) / 2, number(d.length) / 2),
  }),
  defineSolid('ring', 'line', {
    about: 'thin hoop in z = 0',
    origin: 'centre',
    round: true,
    keys: [DIAMETER],
    make: (d) => ring(number(d.diameter)),
    extent: (d) => flat(half(d)),
  }),
];

/** Surfaces: mass, or thickness with a density. */
export const THIN_KINDS: readonly SolidKind[] = [
  defineSolid('disk', 'thin', {
    about: 'thin round disk in z = 0',
    origin: 'centre',
    round: true,
    keys: [DIAMETER],
    make: (d) => disk(number(d.diameter)),
    extent: (d) => flat(half(d)),
  }),
  defineSolid('plate', 'thin', {
    about: 'thin rectangular plate in z = 0',
    origin: 'centre',
    keys: [{ name: 'size', kind: 'size2', about: 'lengths along x and y' }],
    make: (d) => plate(numbers(d.size)[0], numbers(d.size)[1]),
    extent: (d) => around(numbers(d.size)[0] / 2, numbers(d.size)[1] / 2, 0, 0),
  }),
  defineSolid('triangle_plate', 'thin', {
    about: 'thin triangular plate of three vertices',
    origin: 'its own axes',
    keys: [{ name: 'vertices', kind: 'points3', about: 'three corners', count: { min: 3, max: 3 } }],
    make: (d) => trianglePlate(vertices(d)[0]!, vertices(d)[1]!, vertices(d)[2]!),
    extent: (d) => aroundPoints(vertices(d)),
    smallest: (d) => {
      const v = vertices(d);
      return (2 * trianglePlate(v[0]!, v[1]!, v[2]!).mass) / longestEdge(v);
    },
    check: (d) => checkTriangle(vertices(d)),
  }),
  defineSolid('spherical_shell', 'thin', {
    about: 'thin sphere',
    origin: 'centre',
    round: true,
    keys: [DIAMETER],
    make: (d) => sphericalShell(number(d.diameter)),
    extent: (d) => around(half(d), half(d), -half(d), half(d)),
  }),
  defineSolid('hemispherical_shell', 'thin', {
    about: 'thin half sphere, open below',
    origin: 'centre of the base, body on +z',
    round: true,
    keys: [DIAMETER],
    make: (d) => hemisphericalShell(number(d.diameter)),
    extent: (d) => around(half(d), half(d), 0, half(d)),
  }),
  defineSolid('cylindrical_shell', 'thin', {
    about: 'thin round tube with open ends',
    origin: 'centre',
    round: true,
    keys: [DIAMETER, LENGTH],
    make: (d) => cylindricalShell(number(d.diameter), number(d.length)),
    extent: (d) => around(half(d), half(d), -number(d.length) / 2, number(d.length) / 2),
  }),
  defineSolid('conical_shell', 'thin', {
    about: 'thin cone, open below, apex up',
    origin: 'centre of the base, body on +z',
    round: true,
    keys: [{ ...DIAMETER, about: 'diameter of the rim' }, HEIGHT],
    make: (d) => conicalShell(number(d.diameter), number(d.height)),
    extent: (d) => around(half(d), half(d), 0, number(d.height)),
  }),
];
