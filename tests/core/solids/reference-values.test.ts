import { describe, expect, it } from 'vitest';
import { type Body, inertiaAboutCentre, inertiaAboutPoint, scaleBody } from '../../../core/inertia/body.ts';
import { toRows } from '../../../core/linalg/symmetric3.ts';
import type { Vector3 } from '../../../core/linalg/vector3.ts';
import type { SolidDimensions } from '../../../core/solids/dimensions.ts';
import { solidByName } from '../../../core/solids/registry.ts';
import { resolveTwins } from '../../../core/solids/twins.ts';
import { expectClose, nine } from '../../helpers/expect-body.ts';
import { REFERENCE_CASES, referenceCase } from '../../helpers/reference-cases.ts';

// Each row: how a tabled body is written in the file format, and where the table's origin lies in the solid's local axes.
// `turn` names the table's axes in ours where they differ.
interface Row {
  solid: string;
  dims: (d: Record<string, number>) => SolidDimensions;
  /** Position of our origin in the table's axes. */
  origin?: (d: Record<string, number>) => Vector3;
  /** Which of our axes the table's x, y, z are, with a sign each. */
  turn?: readonly [string, string, string];
}

const upright = (d: Record<string, number>): Vector3 => [0, 0, d.h! / 2];
const ROWS: Record<string, Row> = {
  'S-rod': {
    solid: 'rod',
    dims: (d) => ({ length: d.L! }),
    origin: (d) => [d.L! / 2, 0, 0],
    turn: ['z', 'x', 'y'],
  },
  'S-box': {
    solid: 'box',
    dims: (d) => ({ size: [d.a!, d.b!, d.c!] }),
    origin: (d) => [d.a! / 2, d.b! / 2, d.c! / 2],
  },
  'S-cylinder': { solid: 'cylinder', dims: (d) => ({ radius: d.R!, length: d.h! }), origin: upright },
  'S-tube': {
    solid: 'tube',
    dims: (d) => ({ diameter: 2 * d.Ro!, bore_radius: d.Ri!, length: d.h! }),
    origin: upright,
  },
  'S-cylinder-shell': {
    solid: 'cylindrical_shell',
    dims: (d) => ({ radius: d.R!, length: d.h! }),
    origin: upright,
  },
  'S-sphere': { solid: 'sphere', dims: (d) => ({ radius: d.R! }) },
  'S-hollow-sphere': { solid: 'hollow_sphere', dims: (d) => ({ radius: d.Ro!, bore: 2 * d.Ri! }) },
  'S-sphere-shell': { solid: 'spherical_shell', dims: (d) => ({ diameter: 2 * d.R! }) },
  'S-cone': { solid: 'cone', dims: (d) => ({ radius: d.R!, height: d.h! }) },
  'S-cone-shell': { solid: 'conical_shell', dims: (d) => ({ radius: d.R!, height: d.h! }) },
  'S-frustum': {
    solid: 'frustum',
    dims: (d) => ({ radius: d.R1!, top_radius: d.R2!, height: d.h! }),
  },
  'S-ellipsoid': { solid: 'ellipsoid', dims: (d) => ({ size: [2 * d.a!, 2 * d.b!, 2 * d.c!] }) },
  'S-torus': { solid: 'torus', dims: (d) => ({ radius: d.R!, section_radius: d.r! }) },
  'S-hemisphere': { solid: 'hemisphere', dims: (d) => ({ radius: d.R! }) },
  'S-hemisphere-shell': { solid: 'hemispherical_shell', dims: (d) => ({ radius: d.R! }) },
  'S-semi-cylinder': {
    solid: 'half_cylinder',
    dims: (d) => ({ radius: d.R!, length: d.h! }),
    origin: upright,
  },
  'S-wedge': { solid: 'wedge', dims: (d) => ({ size: [d.a!, d.b!, d.c!] }) },
  'S-pyramid': { solid: 'pyramid', dims: (d) => ({ base: [d.a!, d.b!], height: d.h! }) },
  'S-tetrahedron': {
    solid: 'tetrahedron',
    dims: (d) => ({
      vertices: [
        [0, 0, 0],
        [d.s!, 0, 0],
        [d.s! / 2, (Math.sqrt(3) * d.s!) / 2, 0],
        [d.s! / 2, (Math.sqrt(3) * d.s!) / 6, Math.sqrt(2 / 3) * d.s!],
      ],
    }),
  },
  'S-spherical-cap': {
    solid: 'spherical_cap',
    dims: (d) => ({ radius: d.R!, height: d.h! }),
    origin: (d) => [0, 0, d.R! - d.h!],
  },
  'S-elliptic-cylinder': {
    solid: 'elliptical_cylinder',
    dims: (d) => ({ size: [2 * d.a!, 2 * d.b!], length: d.h! }),
    origin: upright,
  },
  // The table has the apex at the origin and opens upward.
  'S-paraboloid': {
    solid: 'paraboloid',
    dims: (d) => ({ radius: d.R!, height: d.h! }),
    origin: (d) => [0, 0, d.h!],
    turn: ['x', 'y', '-z'],
  },
  'S-ring': { solid: 'ring', dims: (d) => ({ radius: d.R! }) },
  'S-disk': { solid: 'disk', dims: (d) => ({ radius: d.R! }) },
  'S-rect-plate': {
    solid: 'plate',
    dims: (d) => ({ size: [d.a!, d.b!] }),
    origin: (d) => [d.a! / 2, d.b! / 2, 0],
  },
  'S-tri-plate': {
    solid: 'triangle_plate',
    dims: (d) => ({
      vertices: [
        [0, 0, 0],
        [d.b!, 0, 0],
        [0, d.h!, 0],
      ],
    }),
  },
};

/** Tabled bodies that the format has no name for. */
const NOT_SOLIDS = ['S-quarter-cylinder', 'S-half-ring'];

function makeSolid(name: string, given: SolidDimensions): Body {
  const solid = solidByName(name)!;
  const dims = resolveTwins(solid, given);
  expect(solid.check(dims)).toBeNull();
  return solid.make(dims);
}

/** The body in the table's axes. */
function inTable(body: Body, row: Row, d: Record<string, number>): Body {
  const axes = (row.turn ?? ['x', 'y', 'z']).map((name) => ({
    axis: 'xyz'.indexOf(name.at(-1)!),
    sign: name.startsWith('-') ? -1 : 1,
  }));
  const origin = row.origin?.(d) ?? [0, 0, 0];
  const rows = toRows(body.secondMoments);
  const q = (i: number, j: number) => axes[i]!.sign * axes[j]!.sign * rows[axes[i]!.axis]![axes[j]!.axis]!;
  return {
    mass: body.mass,
    centre: axes.map(({ axis, sign }, i) => origin[i]! + sign * body.centre[axis]!) as unknown as Vector3,
    secondMoments: [q(0, 0), q(1, 1), q(2, 2), q(0, 1), q(0, 2), q(1, 2)],
  };
}

const density = (inputs: Record<string, number>): number =>
  inputs.density_kg_m3 ?? inputs.areal_density_kg_m2 ?? inputs.line_density_kg_m!;

// Meriam and Kraige, Engineering Mechanics: Dynamics, appendix D.
describe('solids against the handbook table', () => {
  it.each(Object.entries(ROWS))('%s has the tabled mass, centroid and tensor to 1e-12', (id, row) => {
    const { inputs, expected } = referenceCase(id);
    const body = inTable(
      scaleBody(makeSolid(row.solid, row.dims(inputs.dims_m)), density(inputs)),
      row,
      inputs.dims_m,
    );
    expectClose([body.mass], [expected.mass_kg], 1e-12, 'mass');
    expectClose([...body.centre, 1], [...expected.centroid_m, 1], 1e-12, 'centroid, against one metre');
    expectClose(nine(body), expected.I_centroid_kg_m2.flat(), 1e-12, 'tensor');
  });

  it('covers every tabled solid that the format names', () => {
    const tabled = REFERENCE_CASES.filter((one) => one.category === 'solids').map((one) => one.id);
    expect(tabled.filter((id) => !(id in ROWS)).sort()).toEqual(NOT_SOLIDS.sort());
  });

  it('S-quarter-cylinder is a quarter turn of a rectangle, products included', () => {
    const { inputs, expected } = referenceCase('S-quarter-cylinder');
    const { R, h } = inputs.dims_m;
    const profile = [
      [0, 0],
      [R, 0],
      [R, h],
      [0, h],
    ] as const;
    const body = scaleBody(makeSolid('revolve', { profile, angle: Math.PI / 2 }), inputs.density_kg_m3);
    expectClose([body.mass], [expected.mass_kg], 1e-12, 'mass');
    expectClose(body.centre, expected.centroid_m, 1e-12, 'centroid');
    expectClose(nine(body), expected.I_centroid_kg_m2.flat(), 1e-12, 'tensor');
  });
});

describe('solids against worked examples', () => {
  // F. Tonon, J. Math. Stat. 1(1), 2004.
  it('L-tonon: a tetrahedron has the exact tensor, signs of all three products included', () => {
    const { inputs, expected, printed } = referenceCase('L-tonon');
    const body = makeSolid('tetrahedron', { vertices: inputs.vertices_m });
    expectClose([body.mass], [expected.volume_m3], 1e-12, 'volume');
    expectClose(body.centre, expected.centroid_m, 1e-12, 'centroid');
    expectClose(nine(body), expected.I_centroid.flat(), 1e-12, 'tensor');
    const j = inertiaAboutCentre(body);
    const moments = [printed['a=Ixx'], printed['b=Iyy'], printed['c=Izz']];
    expectClose(j.slice(0, 3), moments, 2e-8, 'printed moments');
  });

  // B. Mirtich, J. Graphics Tools 1(2), 1996; D. Eberly 2002.
  it.each(['tetrahedron', 'polyhedron'])('L-corner-tet: as a %s, about origin and centroid', (name) => {
    const { inputs, expected } = referenceCase('L-corner-tet');
    const faces = [
      [0, 2, 1],
      [0, 1, 3],
      [0, 3, 2],
      [1, 2, 3],
    ];
    const body = makeSolid(name, { vertices: inputs.vertices, ...(name === 'polyhedron' && { faces }) });
    expectClose([body.mass], [expected.volume], 1e-12, 'volume');
    expectClose(body.centre, expected.centroid, 1e-12, 'centroid');
    expectClose(nine(body), expected.I_centroid.flat(), 1e-12, 'tensor about the centroid');
    expectClose(
      toRows(inertiaAboutPoint(body, [0, 0, 0])).flat(),
      expected.I_origin.flat(),
      1e-12,
      'tensor about the origin',
    );
  });

  // A constructed case, exact rational arithmetic: a sum about the frame's origin would be wrong by 0.7 %.
  it('L-offset-mesh: a block 2.3 km from its origin keeps its tensor', () => {
    const { inputs, expected } = referenceCase('L-offset-mesh');
    const body = makeSolid('polyhedron', { vertices: inputs.vertices, faces: inputs.triangles });
    expectClose([body.mass], [expected.volume], 1e-10, 'volume');
    expectClose(body.centre, expected.centroid, 1e-15, 'centroid');
    expectClose(nine(body), expected.I_centroid.flat(), 1e-10, 'tensor');
  });

  // Tables of regular polyhedra.
  it('L-icosahedron: has phi²/10 of its mass and squared edge about every axis', () => {
    const { inputs, expected } = referenceCase('L-icosahedron');
    const body = makeSolid('polyhedron', { vertices: inputs.vertices, faces: inputs.triangles });
    const i = expected.I_each_axis;
    expectClose([body.mass], [expected.volume], 1e-12, 'volume');
    expectClose([...body.centre, 1], [0, 0, 0, 1], 1e-12, 'centroid');
    expectClose(nine(body), [i, 0, 0, 0, i, 0, 0, 0, i], 1e-12, 'tensor');
  });

  // J. R. Taylor, Classical Mechanics, examples 10.2 and 10.4.
  it('L-cube-corner: a unit cube about its centre and a corner', () => {
    const { expected } = referenceCase('L-cube-corner');
    const body = makeSolid('box', { size: [1, 1, 1] });
    expectClose(nine(body), expected.I_centre.flat(), 1e-12, 'about the centre');
    const corner = toRows(inertiaAboutPoint(body, [-0.5, -0.5, -0.5])).flat();
    expectClose(corner, expected.I_corner.flat(), 1e-12, 'about the corner');
  });

  // NASA/TM-2015-218675, volume II, appendix B.
  it('L-nesc-brick: has the printed moments to their last digit', () => {
    const { inputs, expected, printed } = referenceCase('L-nesc-brick');
    const size = inputs.dims_in.map((inches: number) => inches / 12);
    const box = makeSolid('box', { size });
    const j = inertiaAboutCentre(scaleBody(box, inputs.mass_slug / box.mass));
    expectClose(j.slice(0, 3), expected.I_slug_ft2, 1e-12, 'moments');
    [printed.Ixx, printed.Iyy, printed.Izz].forEach((value, i) => {
      expect(Math.abs(j[i]! - value)).toBeLessThan(5e-10);
    });
  });

  // NASA Engineering and Safety Center, flight simulation check cases.
  it('L-nesc-cylinder: has the printed moments, its long axis being theirs', () => {
    const { inputs, expected } = referenceCase('L-nesc-cylinder');
    const cylinder = makeSolid('cylinder', { radius: inputs.radius_m, length: inputs.length_m });
    const j = inertiaAboutCentre(scaleBody(cylinder, inputs.mass_kg / cylinder.mass));
    expectClose([j[2], j[0], j[1]], [expected.Ixx, expected.Iyy, expected.Izz], 1e-12, 'moments');
  });
});
