import type { Vector3 } from '../linalg/vector3.ts';
import { checkHoles, checkOutline } from './check-outlines.ts';
import { ANGLE, aroundPoints, DIAMETER, defineSolid, HEIGHT, number } from './define-solid.ts';
import type { Outline, SayLength, SolidDimensions, SolidFault, SolidKind } from './dimensions.ts';
import { extrusion } from './extrusion.ts';
import { sweptExtent } from './swept-extent.ts';
import { revolve, torus } from './turned.ts';
import { halfOf } from './twins.ts';

const outline = (dims: SolidDimensions): Outline => dims.outline as Outline;
const holes = (dims: SolidDimensions): readonly Outline[] => dims.holes as readonly Outline[];
const profile = (dims: SolidDimensions): Outline => dims.profile as Outline;

function checkTorus(dims: SolidDimensions, say: SayLength): SolidFault | null {
  if (number(dims.section) <= number(dims.diameter)) return null;
  return {
    code: 'SOLID_TORUS_SELF_CUTS',
    message: `section ${say(number(dims.section))} is more than the ring's diameter ${say(number(dims.diameter))}, so the ring would cut itself.`,
    hint: 'diameter is that of the circle through the centre of the section',
    key: dims.section_radius === undefined ? 'section' : 'section_radius',
  };
}

function checkProfile(dims: SolidDimensions, say: SayLength): SolidFault | null {
  const wrong = profile(dims).findIndex((point) => point[0] < 0);
  if (wrong >= 0)
    return {
      code: 'SOLID_PROFILE_NEGATIVE_RADIUS',
      message: `point ${wrong + 1} of profile has radius ${say(profile(dims)[wrong]![0])}; a profile lies on one side of the axis, r ≥ 0.`,
      key: 'profile',
    };
  return checkOutline('profile', profile(dims), say);
}

const inSpace = (points: Outline, z: number): Vector3[] => points.map(([x, y]) => [x, y, z]);

/** Shorter side of a plane figure's bounding box [m]. */
function narrow(points: Outline): number {
  const { min, max } = aroundPoints(inSpace(points, 0));
  return Math.min(max[0] - min[0], max[1] - min[1]);
}

/** Solids made by moving a plane figure. */
export const DRAWN_KINDS: readonly SolidKind[] = [
  defineSolid('torus', 'solid', {
    about: 'ring of round section, whole or part of a turn',
    origin: 'centre',
    round: true,
    keys: [
      { ...DIAMETER, about: 'diameter of the circle through the centre of the section' },
      {
        name: 'section',
        kind: 'length',
        about: 'diameter of the section',
        twins: [halfOf('section_radius', 'half the section')],
      },
      ANGLE,
    ],
    make: (d) => torus(number(d.diameter), number(d.section), number(d.angle)),
    extent: (d) => {
      const ring = number(d.diameter) / 2;
      const r = number(d.section) / 2;
      return sweptExtent(ring - r, ring + r, -r, r, number(d.angle));
    },
    check: checkTorus,
  }),
  defineSolid('extrusion', 'solid', {
    about: 'plane outline with holes, drawn out along z',
    origin: 'z = 0, rising; x and y those of the outline',
    keys: [
      { name: 'outline', kind: 'points2', about: 'corners [x, y] in order', count: { min: 3 } },
      { name: 'holes', kind: 'outlines', about: 'outlines taken out', default: [] },
      HEIGHT,
    ],
    make: (d) => extrusion(outline(d), holes(d), number(d.height)),
    extent: (d) => aroundPoints([...inSpace(outline(d), 0), ...inSpace(outline(d), number(d.height))]),
    smallest: (d) => Math.min(number(d.height), narrow(outline(d))),
    check: (d, say) =>
      checkOutline('outline', outline(d), say) ?? checkHoles('holes', outline(d), holes(d), say),
  }),
  defineSolid('revolve', 'solid', {
    about: 'closed profile turned about z, whole or part of a turn',
    origin: 'its own axes, on the axis of turning',
    round: true,
    keys: [
      { name: 'profile', kind: 'points2', about: 'corners [r, z] in order, r ≥ 0', count: { min: 3 } },
      { ...ANGLE, about: 'angle about z from the xz half-plane, counter-clockwise' },
    ],
    make: (d) => revolve(profile(d), number(d.angle)),
    extent: (d) => {
      const { min, max } = aroundPoints(inSpace(profile(d), 0));
      return sweptExtent(min[0], max[0], min[1], max[1], number(d.angle));
    },
    smallest: (d) => narrow(profile(d)),
    check: checkProfile,
  }),
];
