import { type Symmetric3, trace } from '../linalg/symmetric3.ts';
import type { Vector3 } from '../linalg/vector3.ts';

/**
 * The ten mass moments of a body in central form, the only shape in which the core carries mass.
 *
 * `secondMoments` is Q = ∫ (r − c)(r − c)ᵀ dm about the body's own centre c, **not** the inertia tensor:
 * its xy element is +∫ x y dm. The inertia tensor is derived at the end (`inertiaAboutCentre`) and its products
 * are the tensor's own elements, I_xy = −∫ x y dm ("products negative").
 */
export interface Body {
  /** [kg]; a solid of unit density carries its volume [m³] (a thin one its area [m²], a line its length [m]) here. */
  readonly mass: number;
  /** Centre of mass, in the axes the context names [m]. */
  readonly centre: Vector3;
  /** Central second moments in the same axes [kg·m²]: xx, yy, zz, xy, xz, yz of Q. */
  readonly secondMoments: Symmetric3;
}

/**
 * Inertia tensor about the centre of mass, J = tr(Q) 1 − Q.
 *
 * @returns six elements in the body's axes [kg·m²], products negative (I_xy = −∫ x y dm)
 */
export function inertiaAboutCentre(body: Body): Symmetric3 {
  const q = body.secondMoments;
  return [q[1] + q[2], q[0] + q[2], q[0] + q[1], 0 - q[3], 0 - q[4], 0 - q[5]];
}

/**
 * Central second moments of an inertia tensor about the centre, Q = ½ tr(J) 1 − J.
 *
 * @param inertia about the centre of mass [kg·m²], products negative
 * @returns Q [kg·m²]; positive semidefinite exactly when a body can have that tensor
 */
export function secondMomentsFromInertia(inertia: Symmetric3): Symmetric3 {
  const half = trace(inertia) / 2;
  return [
    half - inertia[0],
    half - inertia[1],
    half - inertia[2],
    0 - inertia[3],
    0 - inertia[4],
    0 - inertia[5],
  ];
}

/**
 * Inertia tensor about any point: the central tensor plus m (|d|² 1 − d dᵀ), d from that point to the centre
 * (Huygens–Steiner, parallel-axis theorem).
 *
 * @param point in the body's axes [m]
 * @returns six elements [kg·m²], products negative
 */
export function inertiaAboutPoint(body: Body, point: Vector3): Symmetric3 {
  const j = inertiaAboutCentre(body);
  const m = body.mass;
  const x = body.centre[0] - point[0];
  const y = body.centre[1] - point[1];
  const z = body.centre[2] - point[2];
  return [
    j[0] + m * (y * y + z * z),
    j[1] + m * (x * x + z * z),
    j[2] + m * (x * x + y * y),
    j[3] - m * x * y,
    j[4] - m * x * z,
    j[5] - m * y * z,
  ];
}

/** The same body with its mass (and so its moments) multiplied by k; the centre stays. */
export const scaleBody = (body: Body, k: number): Body =>
  k === 1
    ? body
    : {
        mass: body.mass * k,
        centre: body.centre,
        secondMoments: body.secondMoments.map((q) => q * k) as unknown as Symmetric3,
      };
