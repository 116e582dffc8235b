import { fromRows, type Symmetric3 } from '../linalg/symmetric3.ts';
import type { Vector3 } from '../linalg/vector3.ts';
import type { PartBody } from '../record/record.ts';

/** What the contributions of all parts have in common. */
export interface Means {
  /** Mean of the two total masses [kg]. */
  readonly mass: number;
  /** h, mean of the two total centres, body axes [m]. */
  readonly centre: Vector3;
  /** d, centre of B less centre of A, body axes [m]. */
  readonly step: Vector3;
}

/** Three causes of one part's contribution, in the shape of the quantity. */
export interface Causes<T> {
  mass: T;
  place: T;
  shapeAndTurn: T;
}

interface Side {
  mass: number;
  centre: Vector3;
  inertia: Symmetric3;
}

const bodyOf = (part: PartBody): Side => ({
  mass: part.mass,
  centre: [part.centre[0]!, part.centre[1]!, part.centre[2]!],
  inertia: fromRows(part.inertia),
});

const SIX = [0, 1, 2, 3, 4, 5] as const;
const six = (f: (k: (typeof SIX)[number]) => number): Symmetric3 => SIX.map(f) as unknown as Symmetric3;
const three = (f: (k: 0 | 1 | 2) => number): Vector3 => [f(0), f(1), f(2)];

/**
 * One part on both sides: its mass, place and central tensor per unit mass. A part that is missing or weighs nothing
 * on one side takes its own figures there, so all of its contribution is mass.
 */
interface Pair {
  /** [kg], mean and change. */
  massMean: number;
  massChange: number;
  centres: readonly [Vector3, Vector3];
  /** Per unit mass [m²]. */
  shapes: readonly [Symmetric3, Symmetric3];
}

function pairOf(a: PartBody | null, b: PartBody | null): Pair | null {
  const sides = [a && a.mass !== 0 ? bodyOf(a) : null, b && b.mass !== 0 ? bodyOf(b) : null] as const;
  const first = sides[0] ?? sides[1];
  const second = sides[1] ?? sides[0];
  if (!first || !second) return null;
  const m0 = sides[0]?.mass ?? 0;
  const m1 = sides[1]?.mass ?? 0;
  return {
    massMean: (m0 + m1) / 2,
    massChange: m1 - m0,
    centres: [first.centre, second.centre],
    shapes: [
      six((k) => first.inertia[k] / first.mass),
      first === second
        ? six((k) => first.inertia[k] / first.mass)
        : six((k) => second.inertia[k] / second.mass),
    ],
  };
}

/** K(p) = |p|² 1 − p pᵀ [m²], p in body axes. */
export function pointShape([x, y, z]: Vector3): Symmetric3 {
  return [y * y + z * z, x * x + z * z, x * x + y * y, -x * y, -x * z, -y * z];
}

/** K(p) − K(q) in factors, so that it is exactly zero for p = q and loses no digits for neighbours. */
function pointShapeChange(p: Vector3, q: Vector3): Symmetric3 {
  const s = three((k) => p[k] + q[k]);
  const t = three((k) => p[k] - q[k]);
  const square = three((k) => s[k] * t[k]);
  const product = (i: 0 | 1 | 2, j: 0 | 1 | 2) => -(s[i] * t[j] + s[j] * t[i]) / 2;
  return [
    square[1] + square[2],
    square[0] + square[2],
    square[0] + square[1],
    product(0, 1),
    product(0, 2),
    product(1, 2),
  ];
}

/**
 * A part's contribution to the change of the centre of mass, (ΔS − c̄ Δm) / m̄, by cause [m].
 *
 * @param a the part in A, body axes; null where it is missing
 */
export function splitCentre(a: PartBody | null, b: PartBody | null, means: Means): Causes<Vector3> {
  const pair = pairOf(a, b);
  if (!pair) return { mass: [0, 0, 0], place: [0, 0, 0], shapeAndTurn: [0, 0, 0] };
  const [c0, c1] = pair.centres;
  return {
    mass: three((k) => (((c0[k] + c1[k]) / 2 - means.centre[k]) * pair.massChange) / means.mass + 0),
    place: three((k) => (pair.massMean * (c1[k] - c0[k])) / means.mass + 0),
    shapeAndTurn: [0, 0, 0],
  };
}

/**
 * A part's contribution to the change of the central inertia tensor, Δ(Jᵢ about h) − Δmᵢ K(d/2), by cause.
 *
 * @param a the part in A, inertia about its own centre in body axes, products negative; null where it is missing
 * @returns six elements each [kg·m²], products negative
 */
export function splitTensor(a: PartBody | null, b: PartBody | null, means: Means): Causes<Symmetric3> {
  const pair = pairOf(a, b);
  const none: Symmetric3 = [0, 0, 0, 0, 0, 0];
  if (!pair) return { mass: none, place: none, shapeAndTurn: none };
  const [p0, p1] = pair.centres.map((c) => three((k) => c[k] - means.centre[k])) as [Vector3, Vector3];
  const [s0, s1] = pair.shapes;
  const half = pointShape(three((k) => means.step[k] / 2));
  const k0 = pointShape(p0);
  const k1 = pointShape(p1);
  const placeChange = pointShapeChange(p1, p0);
  return {
    mass: six((k) => pair.massChange * ((s0[k] + k0[k] + (s1[k] + k1[k])) / 2 - half[k]) + 0),
    place: six((k) => pair.massMean * placeChange[k] + 0),
    shapeAndTurn: six((k) => pair.massMean * (s1[k] - s0[k]) + 0),
  };
}
