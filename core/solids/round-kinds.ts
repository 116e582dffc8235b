import { cone, frustum, paraboloid } from './cones.ts';
import { cylinder, ellipticalCylinder, halfCylinder, tube } from './cylinders.ts';
import { around, DIAMETER, defineSolid, HEIGHT, LENGTH, number, numbers } from './define-solid.ts';
import type { SayLength, SolidDimensions, SolidFault, SolidKey, SolidKind } from './dimensions.ts';
import { ellipsoid, hemisphere, hollowSphere, sphere, sphericalCap } from './spheres.ts';
import { BORE, halfOf } from './twins.ts';

const CENTRE = 'centre';
const BASE = 'centre of the base, body on +z';
const WALL: SolidKey = { name: 'wall', kind: 'length', about: 'thickness of the wall', twins: BORE };

/** Half a key's size. */
const half = (dims: SolidDimensions, name = 'diameter'): number => number(dims[name]) / 2;

/** A wall thicker than the radius, or a bore wider than the body; a wall equal to the radius is a full body. */
function checkWall(dims: SolidDimensions, say: SayLength): SolidFault | null {
  const bore = BORE.find((twin) => dims[twin.name] !== undefined);
  const radius = half(dims);
  const wall = number(dims.wall);
  if (bore && wall <= 0)
    return {
      code: 'SOLID_BORE_TOO_LARGE',
      message: `${bore.name} ${say(number(dims[bore.name]))} leaves no wall in a diameter of ${say(number(dims.diameter))}.`,
      hint: 'give a bore smaller than the diameter, or the wall itself',
      key: bore.name,
    };
  if (bore || wall <= radius) return null;
  return {
    code: 'SOLID_WALL_TOO_THICK',
    message: `wall ${say(wall)} is more than the radius ${say(radius)}.`,
    hint: 'a wall equal to the radius makes it solid; it cannot be more',
    key: 'wall',
  };
}

function checkCap(dims: SolidDimensions, say: SayLength): SolidFault | null {
  if (number(dims.height) <= number(dims.diameter)) return null;
  return {
    code: 'SOLID_CAP_TOO_HIGH',
    message: `height ${say(number(dims.height))} is more than the sphere's diameter ${say(number(dims.diameter))}.`,
    hint: 'diameter is that of the sphere the cap is cut from',
    key: 'height',
  };
}

/** Widest radius of a cap: the sphere's own past the half, that of the cut before. */
function capRadius(dims: SolidDimensions): number {
  const h = number(dims.height);
  const d = number(dims.diameter);
  return h >= d / 2 ? d / 2 : Math.sqrt(h * (d - h));
}

const upright = (r: number, dims: SolidDimensions) => around(r, r, 0, number(dims.height));
const level = (x: number, y: number, dims: SolidDimensions) =>
  around(x, y, -half(dims, 'length'), half(dims, 'length'));

/** Solids with a round or elliptical section. */
export const ROUND_KINDS: readonly SolidKind[] = [
  defineSolid('cylinder', 'solid', {
    about: 'full round rod',
    origin: CENTRE,
    round: true,
    keys: [DIAMETER, LENGTH],
    make: (d) => cylinder(number(d.diameter), number(d.length)),
    extent: (d) => level(half(d), half(d), d),
  }),
  defineSolid('tube', 'solid', {
    about: 'round tube',
    origin: CENTRE,
    round: true,
    keys: [DIAMETER, WALL, LENGTH],
    make: (d) => tube(number(d.diameter), number(d.wall), number(d.length)),
    extent: (d) => level(half(d), half(d), d),
    check: checkWall,
  }),
  defineSolid('elliptical_cylinder', 'solid', {
    about: 'rod of elliptical section',
    origin: CENTRE,
    keys: [{ name: 'size', kind: 'size2', about: 'full axes along x and y' }, LENGTH],
    make: (d) => ellipticalCylinder(numbers(d.size)[0], numbers(d.size)[1], number(d.length)),
    extent: (d) => level(numbers(d.size)[0] / 2, numbers(d.size)[1] / 2, d),
  }),
  defineSolid('half_cylinder', 'solid', {
    about: 'the half y ≥ 0 of a round rod',
    origin: 'on the axis, at mid-length',
    keys: [DIAMETER, LENGTH],
    make: (d) => halfCylinder(number(d.diameter), number(d.length)),
    extent: (d) => ({
      min: [-half(d), 0, -half(d, 'length')],
      max: [half(d), half(d), half(d, 'length')],
    }),
  }),
  defineSolid('sphere', 'solid', {
    about: 'full sphere',
    origin: CENTRE,
    round: true,
    keys: [DIAMETER],
    make: (d) => sphere(number(d.diameter)),
    extent: (d) => around(half(d), half(d), -half(d), half(d)),
  }),
  defineSolid('hollow_sphere', 'solid', {
    about: 'sphere with a concentric hollow',
    origin: CENTRE,
    round: true,
    keys: [DIAMETER, WALL],
    make: (d) => hollowSphere(number(d.diameter), number(d.wall)),
    extent: (d) => around(half(d), half(d), -half(d), half(d)),
    check: checkWall,
  }),
  defineSolid('hemisphere', 'solid', {
    about: 'half a sphere on its flat face',
    origin: BASE,
    round: true,
    keys: [DIAMETER],
    make: (d) => hemisphere(number(d.diameter)),
    extent: (d) => around(half(d), half(d), 0, half(d)),
  }),
  defineSolid('spherical_cap', 'solid', {
    about: 'piece of a sphere cut off by a plane',
    origin: BASE,
    round: true,
    keys: [
      { ...DIAMETER, about: 'diameter of the sphere' },
      { ...HEIGHT, about: 'height above the cut' },
    ],
    make: (d) => sphericalCap(number(d.diameter), number(d.height)),
    extent: (d) => upright(capRadius(d), d),
    check: checkCap,
  }),
  defineSolid('ellipsoid', 'solid', {
    about: 'full ellipsoid',
    origin: CENTRE,
    keys: [{ name: 'size', kind: 'size3', about: 'full axes along x, y and z' }],
    make: (d) => ellipsoid(numbers(d.size)[0], numbers(d.size)[1], numbers(d.size)[2]),
    extent: (d) => {
      const [x, y, z] = numbers(d.size);
      return around(x / 2, y / 2, -z / 2, z / 2);
    },
  }),
  defineSolid('cone', 'solid', {
    about: 'full round cone, apex up',
    origin: BASE,
    round: true,
    keys: [{ ...DIAMETER, about: 'diameter of the base' }, HEIGHT],
    make: (d) => cone(number(d.diameter), number(d.height)),
    extent: (d) => upright(half(d), d),
  }),
  defineSolid('frustum', 'solid', {
    about: 'cone cut parallel to its base',
    origin: BASE,
    round: true,
    keys: [
      { ...DIAMETER, about: 'diameter of the base' },
      {
        name: 'top_diameter',
        kind: 'length',
        about: 'diameter of the top; zero for a cone',
        twins: [halfOf('top_radius', 'half the top diameter')],
        mayBeZero: true,
      },
      HEIGHT,
    ],
    make: (d) => frustum(number(d.diameter), number(d.top_diameter), number(d.height)),
    extent: (d) => upright(Math.max(half(d), half(d, 'top_diameter')), d),
    smallest: (d) => Math.min(number(d.diameter), number(d.height)),
  }),
  defineSolid('paraboloid', 'solid', {
    about: 'paraboloid of revolution, base down, apex up',
    origin: BASE,
    round: true,
    keys: [{ ...DIAMETER, about: 'diameter of the base' }, HEIGHT],
    make: (d) => paraboloid(number(d.diameter), number(d.height)),
    extent: (d) => upright(half(d), d),
  }),
];
