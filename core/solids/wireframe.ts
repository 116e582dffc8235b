import type { Vector3 } from '../linalg/vector3.ts';
import { cos, sin } from '../math/index.ts';
import type { Outline, SolidDimensions } from './dimensions.ts';
import { solidByName } from './registry.ts';

/** Points joined in order; closed ones repeat their first point [m]. */
export type Polyline = readonly Vector3[];

const SIDES = 32;
const number = (dims: SolidDimensions, key: string): number => dims[key] as number;
const list = (dims: SolidDimensions, key: string): readonly number[] => dims[key] as readonly number[];

/**
 * Coarse lines that show a solid from any side, in its local axes: edges of flat faces, round ones as 32-gons.
 *
 * @param name of a solid in the registry
 * @param dims checked, twins resolved
 * @returns polylines [m]; none for a particle, nor for a name that is not a solid's
 */
export function wireframe(name: string, dims: SolidDimensions): Polyline[] {
  const draw = DRAWERS[name];
  return draw && solidByName(name) ? draw(dims) : [];
}

type Drawer = (dims: SolidDimensions) => Polyline[];

/** An elliptical arc about z at a height, from +x through an angle. */
function arc(x: number, y: number, z: number, angle = 2 * Math.PI): Polyline {
  const steps = Math.max(2, Math.ceil((SIDES * angle) / (2 * Math.PI)));
  return Array.from({ length: steps + 1 }, (_, i) => {
    const at = (angle * i) / steps;
    return [x * cos(at), y * sin(at), z];
  });
}

/** Half outlines (r, z) in the four half planes of x and y, and the circles given: a body of revolution, perhaps flattened. */
function turned(profile: Outline, circles: Outline, x = 1, y = 1): Polyline[] {
  const meridians = [0, 1, 2, 3].map((quarter) => {
    const c = cos((quarter * Math.PI) / 2);
    const s = sin((quarter * Math.PI) / 2);
    return profile.map(([r, z]): Vector3 => [x * r * c, y * r * s, z]);
  });
  return [...meridians, ...circles.filter(([r]) => r > 0).map(([r, z]) => arc(x * r, y * r, z))];
}

/** Points of a circle's arc in the (r, z) plane between two angles from +r. */
const bow = (radius: number, height: number, z: number, from: number, to: number): Outline =>
  Array.from({ length: 17 }, (_, i) => {
    const at = from + ((to - from) * i) / 16;
    return [Math.max(0, radius * cos(at)), z + height * sin(at)];
  });

const closed = <T>(points: readonly T[]): T[] => [...points, points[0]!];

/** Edges between two levels of the same outline. */
function prism(outline: Outline, from: number, to: number): Polyline[] {
  const level = (z: number) => closed(outline.map(([x, y]): Vector3 => [x, y, z]));
  return [
    level(from),
    level(to),
    ...outline.map(
      ([x, y]): Polyline => [
        [x, y, from],
        [x, y, to],
      ],
    ),
  ];
}

const rectangle = (x: number, y: number): Outline => [
  [-x / 2, -y / 2],
  [x / 2, -y / 2],
  [x / 2, y / 2],
  [-x / 2, y / 2],
];

function barrel(r: number, length: number, x = 1, y = 1): Polyline[] {
  const ends: Outline = [
    [r, -length / 2],
    [r, length / 2],
  ];
  return turned(ends, ends, x, y);
}

const globe = (d: number): Polyline[] =>
  turned(bow(d / 2, d / 2, 0, -Math.PI / 2, Math.PI / 2), [[d / 2, 0]]);

const dome = (d: number): Polyline[] => turned(bow(d / 2, d / 2, 0, 0, Math.PI / 2), [[d / 2, 0]]);

function cap(d: number, h: number): Polyline[] {
  // From the cut, h below the pole, along the sphere: heights above the sphere's lowest point are d − h to d.
  const profile = Array.from({ length: 17 }, (_, i): readonly [number, number] => {
    const z = h * sin((i * Math.PI) / 32);
    const below = h - z;
    return [Math.sqrt(Math.max(0, below * (d - below))), z];
  });
  const widest: Outline = h > d / 2 ? [[d / 2, h - d / 2]] : [];
  return turned(profile, [profile[0]!, ...widest]);
}

function taper(d: number, top: number, h: number): Polyline[] {
  const side: Outline = [
    [d / 2, 0],
    [top / 2, h],
  ];
  return turned(side, side);
}

/** A plane figure in the half plane at several angles, and the arcs of its corners. */
function swept(profile: Outline, corners: Outline, angle: number): Polyline[] {
  const full = angle >= 2 * Math.PI;
  const count = full ? 4 : 1 + Math.max(1, Math.ceil((2 * angle) / Math.PI));
  const sections = Array.from({ length: count }, (_, i) => {
    const at = full ? (i * Math.PI) / 2 : (angle * i) / (count - 1);
    return closed(profile).map(([r, z]): Vector3 => [r * cos(at), r * sin(at), z]);
  });
  return [...sections, ...corners.filter(([r]) => r > 0).map(([r, z]) => arc(r, r, z, angle))];
}

function ringOf(d: number, section: number, angle: number): Polyline[] {
  const circle = arc(section / 2, section / 2, 0)
    .slice(0, -1)
    .map(([x, y]): readonly [number, number] => [Math.max(0, d / 2 + x), y]);
  return swept(circle, [circle[0]!, circle[8]!, circle[16]!, circle[24]!], angle);
}

function halfRod(d: number, length: number): Polyline[] {
  const outline = arc(d / 2, d / 2, 0, Math.PI).map(([x, y]): readonly [number, number] => [x, y]);
  const level = (z: number) => closed(outline.map(([x, y]): Vector3 => [x, y, z]));
  const edges = [outline[0]!, outline[8]!, outline[16]!];
  return [
    level(-length / 2),
    level(length / 2),
    ...edges.map(
      ([x, y]): Polyline => [
        [x, y, -length / 2],
        [x, y, length / 2],
      ],
    ),
  ];
}

function pyramidOf([x, y]: readonly number[], h: number): Polyline[] {
  const base = rectangle(x!, y!).map(([u, v]): Vector3 => [u, v, 0]);
  return [closed(base), ...base.map((corner): Polyline => [corner, [0, 0, h]])];
}

/** Each edge of a set of faces once. */
function edgesOf(vertices: readonly Vector3[], faces: readonly (readonly number[])[]): Polyline[] {
  const drawn = new Set<string>();
  const lines: Polyline[] = [];
  for (const face of faces)
    face.forEach((from, k) => {
      const to = face[(k + 1) % face.length]!;
      const name = from < to ? `${from} ${to}` : `${to} ${from}`;
      if (drawn.has(name)) return;
      drawn.add(name);
      lines.push([vertices[from]!, vertices[to]!]);
    });
  return lines;
}

const vertices = (dims: SolidDimensions): readonly Vector3[] => dims.vertices as readonly Vector3[];

const paraboloidSide = (d: number, h: number): Outline =>
  Array.from({ length: 17 }, (_, i) => [(d / 2) * (1 - i / 16), h * (1 - (1 - i / 16) * (1 - i / 16))]);

const DRAWERS: Readonly<Record<string, Drawer>> = {
  particle: () => [],
  rod: (d) => [
    [
      [0, 0, -number(d, 'length') / 2],
      [0, 0, number(d, 'length') / 2],
    ],
  ],
  box: (d) => {
    const [x, y, z] = list(d, 'size');
    return prism(rectangle(x!, y!), -z! / 2, z! / 2);
  },
  cylinder: (d) => barrel(number(d, 'diameter') / 2, number(d, 'length')),
  tube: (d) => {
    const r = number(d, 'diameter') / 2;
    const inner = r - number(d, 'wall');
    return [...barrel(r, number(d, 'length')), ...(inner > 0 ? barrel(inner, number(d, 'length')) : [])];
  },
  elliptical_cylinder: (d) => barrel(0.5, number(d, 'length'), list(d, 'size')[0]!, list(d, 'size')[1]!),
  half_cylinder: (d) => halfRod(number(d, 'diameter'), number(d, 'length')),
  sphere: (d) => globe(number(d, 'diameter')),
  hollow_sphere: (d) => globe(number(d, 'diameter')),
  hemisphere: (d) => dome(number(d, 'diameter')),
  spherical_cap: (d) => cap(number(d, 'diameter'), number(d, 'height')),
  ellipsoid: (d) => {
    const [x, y, z] = list(d, 'size');
    return turned(bow(0.5, z! / 2, 0, -Math.PI / 2, Math.PI / 2), [[0.5, 0]], x!, y!);
  },
  torus: (d) => ringOf(number(d, 'diameter'), number(d, 'section'), number(d, 'angle')),
  cone: (d) => taper(number(d, 'diameter'), 0, number(d, 'height')),
  frustum: (d) => taper(number(d, 'diameter'), number(d, 'top_diameter'), number(d, 'height')),
  paraboloid: (d) => {
    const side = paraboloidSide(number(d, 'diameter'), number(d, 'height'));
    return turned(side, [side[0]!]);
  },
  pyramid: (d) => pyramidOf(list(d, 'base'), number(d, 'height')),
  wedge: (d) => {
    const [x, y, z] = list(d, 'size');
    return prism(
      [
        [0, 0],
        [x!, 0],
        [0, y!],
      ],
      0,
      z!,
    );
  },
  tetrahedron: (d) =>
    edgesOf(vertices(d), [
      [0, 1, 2],
      [0, 1, 3],
      [0, 2, 3],
      [1, 2, 3],
    ]),
  extrusion: (d) =>
    [d.outline as Outline, ...(d.holes as readonly Outline[])].flatMap((outline) =>
      prism(outline, 0, number(d, 'height')),
    ),
  revolve: (d) => swept(d.profile as Outline, d.profile as Outline, number(d, 'angle')),
  polyhedron: (d) => edgesOf(vertices(d), d.faces as readonly (readonly number[])[]),
  ring: (d) => [arc(number(d, 'diameter') / 2, number(d, 'diameter') / 2, 0)],
  disk: (d) => [arc(number(d, 'diameter') / 2, number(d, 'diameter') / 2, 0)],
  plate: (d) => [
    closed(rectangle(list(d, 'size')[0]!, list(d, 'size')[1]!).map(([x, y]): Vector3 => [x, y, 0])),
  ],
  triangle_plate: (d) => [closed(vertices(d))],
  spherical_shell: (d) => globe(number(d, 'diameter')),
  hemispherical_shell: (d) => dome(number(d, 'diameter')),
  cylindrical_shell: (d) => barrel(number(d, 'diameter') / 2, number(d, 'length')),
  conical_shell: (d) => taper(number(d, 'diameter'), 0, number(d, 'height')),
};
