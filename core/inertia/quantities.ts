import { transpose } from '../linalg/matrix3.ts';
import { turnSymmetric } from '../linalg/symmetric3.ts';
import { type Body, inertiaAboutCentre, inertiaAboutPoint } from './body.ts';
import { type Placement, pointInLocal } from './placement.ts';
import { principalAxes } from './principal-axes.ts';

/** What a quantity measures, by the name of its SI unit. */
export type QuantityKind = 'mass' | 'length' | 'inertia' | 'angle';

const XYZ = ['x', 'y', 'z'] as const;
const SIX = ['xx', 'yy', 'zz', 'xy', 'xz', 'yz'] as const;
const PRINCIPAL = ['min', 'mid', 'max'] as const;

/** The quantities of a roll-up that a limit may name, in the order of the vector that `quantityVector` fills. */
export const QUANTITIES: readonly { name: string; kind: QuantityKind }[] = [
  { name: 'mass', kind: 'mass' },
  ...XYZ.map((k) => ({ name: `centre.${k}`, kind: 'length' as const })),
  ...SIX.map((k) => ({ name: `inertia.${k}`, kind: 'inertia' as const })),
  ...SIX.map((k) => ({ name: `origin.${k}`, kind: 'inertia' as const })),
  ...PRINCIPAL.map((k) => ({ name: `principal.${k}`, kind: 'inertia' as const })),
  ...XYZ.map((k) => ({ name: `gyration.${k}`, kind: 'length' as const })),
  ...XYZ.map((k) => ({ name: `tilt.${k}`, kind: 'angle' as const })),
];

/**
 * All quantities of one body, SI: mass; centre; inertia about the centre and about the origin of the axes in which
 * the body is given (products negative); principal moments; radii of gyration about those axes through the centre;
 * tilts. NaN where no body exists (no mass), but for the mass itself.
 *
 * @param body null where no mass remains
 * @param mass the net mass in that case [kg]
 */
export function quantityVector(body: Body | null, mass: number): Float64Array {
  const out = new Float64Array(QUANTITIES.length).fill(Number.NaN);
  out[0] = mass;
  if (!body) return out;
  const central = inertiaAboutCentre(body);
  const principal = principalAxes(body);
  const gyration = [0, 1, 2].map((k) => Math.sqrt(Math.max(0, central[k]!) / body.mass));
  out.set([
    body.mass,
    ...body.centre,
    ...central,
    ...inertiaAboutPoint(body, [0, 0, 0]),
    ...principal.moments,
    ...gyration,
    ...principal.tilt,
  ]);
  return out;
}

/** A body in a frame's axes: centre Rᵀ (c − p), Q → Rᵀ Q R, the columns of R being the frame's axes. */
export function bodyInFrame(frame: Placement, body: Body): Body {
  return {
    mass: body.mass,
    centre: pointInLocal(frame, body.centre),
    secondMoments: turnSymmetric(transpose(frame.turn), body.secondMoments),
  };
}
