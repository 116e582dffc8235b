/** How a key of a solid is written: text, a quantity, two or three quantities in a list, lists of corners, or one of a few words. */
export type KeyShape =
  | 'text'
  | 'quantity'
  | 'pair'
  | 'triple'
  | 'pairs'
  | 'triples'
  | 'outlines'
  | 'faces'
  | 'fill';

/** Every key a solid may have, how it is written and what it says. */
export const SOLID_KEY_SHAPES = {
  diameter: ['quantity', 'the full diameter'],
  radius: ['quantity', 'half of the diameter; write one of the two'],
  top_diameter: ['quantity', 'the full diameter at the top'],
  top_radius: ['quantity', 'half of the top diameter; write one of the two'],
  bore: ['quantity', 'the inner diameter'],
  bore_radius: ['quantity', 'half of the bore; write one of the two'],
  section: ['quantity', "the diameter of the ring's tube"],
  section_radius: ['quantity', 'half of the section; write one of the two'],
  wall: ['quantity', 'the thickness of the wall, inwards from the diameter'],
  length: ['quantity', 'the full length along z'],
  height: ['quantity', 'the height from the base along z'],
  angle: ['quantity', 'how far it turns about z; 360 deg where left out'],
  thickness: ['quantity', 'the thickness of a thin solid or of the skin of a mesh'],
  box_size: ['triple', 'the full sizes along x, y and z'],
  flat_size: ['pair', 'the full sizes along x and y'],
  base: ['pair', 'the full sizes of the base along x and y'],
  outline: ['pairs', 'corners [x, y]; closes by itself'],
  holes: ['outlines', 'outlines of holes'],
  profile: ['pairs', 'closed outline of corners [r, z] with r at least 0'],
  vertices: ['triples', 'corners [x, y, z]'],
  faces: ['faces', 'corner numbers from 0, outward by the right-hand rule'],
  file: ['text', 'an STL or OBJ file, relative to this file'],
  unit: ['text', 'the unit of the numbers in the mesh file, such as mm'],
  fill: ['fill', 'solid, or shell with a thickness'],
  weld: ['text', 'how corners are joined; exact where left out'],
} as const satisfies Record<string, readonly [KeyShape, string]>;

/** A key of SOLID_KEY_SHAPES; `box_size` and `flat_size` are both written `size`. */
export type SolidKey = keyof typeof SOLID_KEY_SHAPES;

/** What one solid is made of. */
export interface SolidKeys {
  /** What it is and where its own origin lies. */
  about: string;
  /** One key of each group is needed, and only one; judged where solids are made. */
  needs: readonly (readonly SolidKey[])[];
  /** Keys that the schema itself demands, of a solid that is read from a file and not made. */
  must?: readonly SolidKey[];
  /** Keys that may be left out. */
  may?: readonly SolidKey[];
}

const DIAMETER = ['diameter', 'radius'] as const;
const TOP_DIAMETER = ['top_diameter', 'top_radius'] as const;
const SECTION = ['section', 'section_radius'] as const;
const WALL = ['wall', 'bore', 'bore_radius'] as const;

/** Every solid that is a mapping of keys; `solid: particle` has none. */
export const SOLIDS = {
  rod: { about: 'slender, along z; origin at the centre', needs: [['length']] },
  box: { about: 'origin at the centre', needs: [['box_size']] },
  cylinder: { about: 'about z; origin at the centre', needs: [DIAMETER, ['length']] },
  tube: { about: 'about z; origin at the centre', needs: [DIAMETER, WALL, ['length']] },
  elliptical_cylinder: { about: 'along z; origin at the centre', needs: [['flat_size'], ['length']] },
  half_cylinder: {
    about: 'the half with y at least 0; origin on the axis, mid-length',
    needs: [DIAMETER, ['length']],
  },
  sphere: { about: 'origin at the centre', needs: [DIAMETER] },
  hollow_sphere: { about: 'origin at the centre', needs: [DIAMETER, WALL] },
  hemisphere: { about: 'origin at the centre of the base', needs: [DIAMETER] },
  spherical_cap: {
    about: 'diameter of the whole sphere; origin at the centre of the base',
    needs: [DIAMETER, ['height']],
  },
  ellipsoid: { about: 'origin at the centre', needs: [['box_size']] },
  torus: {
    about: 'diameter of the centre circle; origin at the centre',
    needs: [DIAMETER, SECTION],
    may: ['angle'],
  },
  cone: { about: 'origin at the centre of the base', needs: [DIAMETER, ['height']] },
  frustum: { about: 'origin at the centre of the base', needs: [DIAMETER, TOP_DIAMETER, ['height']] },
  paraboloid: { about: 'apex up; origin at the centre of the base', needs: [DIAMETER, ['height']] },
  pyramid: { about: 'origin at the centre of the base', needs: [['base'], ['height']] },
  wedge: { about: 'right triangular prism; right-angle edge along z at the origin', needs: [['box_size']] },
  tetrahedron: { about: 'four corners in its own axes', needs: [['vertices']] },
  extrusion: { about: 'an outline raised from z = 0', needs: [['outline'], ['height']], may: ['holes'] },
  revolve: { about: 'a profile turned about z', needs: [['profile']], may: ['angle'] },
  polyhedron: { about: 'corners and planar faces in its own axes', needs: [['vertices'], ['faces']] },
  mesh: {
    about: 'a closed mesh in its own axes',
    needs: [],
    must: ['file', 'unit'],
    may: ['fill', 'thickness', 'weld'],
  },
  ring: { about: 'thin circle about z; origin at the centre', needs: [DIAMETER] },
  disk: { about: 'thin; origin at the centre', needs: [DIAMETER], may: ['thickness'] },
  plate: { about: 'thin rectangle; origin at the centre', needs: [['flat_size']], may: ['thickness'] },
  triangle_plate: { about: 'thin triangle of three corners', needs: [['vertices']], may: ['thickness'] },
  spherical_shell: { about: 'thin; origin at the centre', needs: [DIAMETER], may: ['thickness'] },
  hemispherical_shell: {
    about: 'thin, open; origin at the centre of the base',
    needs: [DIAMETER],
    may: ['thickness'],
  },
  cylindrical_shell: {
    about: 'thin, open ends; origin at the centre',
    needs: [DIAMETER, ['length']],
    may: ['thickness'],
  },
  conical_shell: {
    about: 'thin, open; origin at the centre of the base',
    needs: [DIAMETER, ['height']],
    may: ['thickness'],
  },
} as const satisfies Record<string, SolidKeys>;

/** The name of a solid that has keys. */
export type SolidName = keyof typeof SOLIDS;

/** The name a key is written with in a file. */
export function writtenKey(key: SolidKey): string {
  return key === 'box_size' || key === 'flat_size' ? 'size' : key;
}

/** How many corners a solid's `vertices` has, where that is fixed. */
export const VERTEX_COUNT: Partial<Record<SolidName, number>> = { tetrahedron: 4, triangle_plate: 3 };
