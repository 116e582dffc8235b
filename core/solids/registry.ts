import type { SolidKind } from './dimensions.ts';
import { DRAWN_KINDS } from './drawn-kinds.ts';
import { FLAT_KINDS } from './flat-kinds.ts';
import { ROUND_KINDS } from './round-kinds.ts';
import { LINE_KINDS, THIN_KINDS } from './thin-kinds.ts';

/** The order in which the file format lists them; a mesh, which needs a file, is not among them. */
const ORDER = [
  'particle',
  'rod',
  'box',
  'cylinder',
  'tube',
  'elliptical_cylinder',
  'half_cylinder',
  'sphere',
  'hollow_sphere',
  'hemisphere',
  'spherical_cap',
  'ellipsoid',
  'torus',
  'cone',
  'frustum',
  'paraboloid',
  'pyramid',
  'wedge',
  'tetrahedron',
  'extrusion',
  'revolve',
  'polyhedron',
  'ring',
  'disk',
  'plate',
  'triangle_plate',
  'spherical_shell',
  'hemispherical_shell',
  'cylindrical_shell',
  'conical_shell',
] as const;

/** Name of a solid in the file format. */
export type SolidName = (typeof ORDER)[number];

const byName = new Map(
  [...LINE_KINDS, ...FLAT_KINDS, ...ROUND_KINDS, ...DRAWN_KINDS, ...THIN_KINDS].map((kind) => [
    kind.name,
    kind,
  ]),
);

/** Every solid as data, in the order of the format: schema, reader and help are made from this. */
export const SOLIDS: readonly SolidKind[] = ORDER.map((name) => byName.get(name)!);

export const SOLID_NAMES: readonly SolidName[] = ORDER;

/** @returns undefined for a name that is not a solid's */
export const solidByName = (name: string): SolidKind | undefined => byName.get(name);
