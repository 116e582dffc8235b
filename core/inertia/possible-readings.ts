import type { Symmetric3 } from '../linalg/symmetric3.ts';
import type { Vector3 } from '../linalg/vector3.ts';
import { judgeTensor } from './possibility.ts';

/** A vendor's tensor as it stands in the file, for asking what else it might have meant. */
export interface ImpossibleTensor {
  readonly mass: number;
  /** From the part's origin [m]. */
  readonly centre: Vector3;
  /** As declared, about the declared point, converted to products negative [kg·m²]. */
  readonly inertia: Symmetric3;
  /** The declared point, in the part's axes [m]. */
  readonly about: Vector3;
  readonly allowance: number;
}

/** Six numbers written in another order than they were read: position of xx yy zz xy xz yz in what was given. */
const ORDERS: readonly { name: string; slots: readonly number[] }[] = [
  { name: 'xx xy xz yy yz zz (rows of the upper triangle)', slots: [0, 3, 5, 1, 2, 4] },
  { name: 'xx xy yy xz yz zz (rows of the lower triangle)', slots: [0, 2, 5, 1, 3, 4] },
  { name: 'xx yy zz yz xz xy (products counted by the axis left out)', slots: [0, 1, 2, 5, 4, 3] },
  { name: 'xx yy zz xy yz xz', slots: [0, 1, 2, 3, 5, 4] },
];

/** J about the centre from J about a point: take away m (|d|² 1 − d dᵀ). */
export function moveToCentre(inertia: Symmetric3, mass: number, fromPointToCentre: Vector3): Symmetric3 {
  const [x, y, z] = fromPointToCentre;
  return [
    inertia[0] - mass * (y * y + z * z),
    inertia[1] - mass * (x * x + z * z),
    inertia[2] - mass * (x * x + y * y),
    inertia[3] + mass * x * y,
    inertia[4] + mass * x * z,
    inertia[5] + mass * y * z,
  ];
}

const negateProducts = (j: Symmetric3): Symmetric3 => [j[0], j[1], j[2], -j[3], -j[4], -j[5]];
const reorder = (j: Symmetric3, slots: readonly number[]): Symmetric3 =>
  slots.map((k) => j[k]!) as unknown as Symmetric3;

/**
 * Which other single reading of an impossible tensor would be possible: the other sign of products, another
 * reference point, another order of the elements. Never applied, only named in the message.
 *
 * @returns phrases such as "with the products' sign the other way"; empty when none helps
 */
export function possibleReadings(given: ImpossibleTensor): string[] {
  const shift: Vector3 = [
    given.centre[0] - given.about[0],
    given.centre[1] - given.about[1],
    given.centre[2] - given.about[2],
  ];
  const possible = (j: Symmetric3, d: Vector3) =>
    judgeTensor(moveToCentre(j, given.mass, d), given.allowance).possible;
  const readings: string[] = [];
  if (possible(negateProducts(given.inertia), shift)) readings.push("with the products' sign the other way");
  const still: Vector3 = [0, 0, 0];
  if (shift.some((x) => x !== 0) && possible(given.inertia, still)) readings.push('about the centre');
  if (
    given.about.some((x) => x !== 0) &&
    given.centre.some((x) => x !== 0) &&
    possible(given.inertia, given.centre)
  )
    readings.push("about the part's origin");
  if (
    shift.every((x) => x === 0) &&
    given.centre.some((x) => x !== 0) &&
    possible(given.inertia, given.centre)
  )
    readings.push("about the part's origin");
  for (const order of ORDERS)
    if (possible(reorder(given.inertia, order.slots), shift))
      readings.push(`with the six elements read in the order ${order.name}`);
  return [...new Set(readings)];
}
