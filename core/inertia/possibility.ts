import { eigenSymmetric3 } from '../linalg/eigen-symmetric3.ts';
import type { Symmetric3 } from '../linalg/symmetric3.ts';
import { trace } from '../linalg/symmetric3.ts';
import { type Body, inertiaAboutCentre, secondMomentsFromInertia } from './body.ts';

/** The result of asking whether any body can have a tensor. */
export interface Possibility {
  readonly possible: boolean;
  /** Principal moments, ascending [kg·m²]. */
  readonly moments: readonly number[];
  /** How far the two smaller moments fall short of the largest, c − (a + b) [kg·m²]; negative where they suffice. */
  readonly shortfall: number;
  /** The same as a share of the tensor's trace. */
  readonly shortfallOfTrace: number;
  /** The rule that failed, or null. */
  readonly rule: 'negative moment' | 'triangle inequality' | null;
}

/**
 * Rounding that a computed total may carry: eps × trace × a small factor for the depth of the sum. A sum of n
 * bodies on a balanced tree loses at most a few ulp a level, and 64 levels would be more bodies than fit in memory.
 */
export const COMPUTED_ROUNDING = 256 * Number.EPSILON;

/**
 * Whether a body can have this tensor: its central second moments Q = ½ tr(J) 1 − J must be positive
 * semidefinite, which is the triangle inequality a + b ≥ c of the principal moments and holds both together
 * (Wensing, Kim & Slotine 2018, linear matrix inequalities for physically consistent inertial parameters).
 * A smallest eigenvalue of Q of −e is a shortfall of 2e in a + b − c.
 *
 * @param inertia about the centre of mass [kg·m²], products negative
 * @param allowance how far an eigenvalue of Q may be below zero: the rounding of the digits given [kg·m²]
 */
export function judgeTensor(inertia: Symmetric3, allowance = 0): Possibility {
  return judgeSecondMoments(secondMomentsFromInertia(inertia), inertia, allowance);
}

/** The same for a body that the core carries, whose Q is known without cancellation. */
export function judgeBody(body: Body, allowance = 0): Possibility {
  return judgeSecondMoments(body.secondMoments, inertiaAboutCentre(body), allowance);
}

function judgeSecondMoments(q: Symmetric3, inertia: Symmetric3, allowance: number): Possibility {
  const size = Math.abs(trace(inertia));
  const moments = eigenSymmetric3(inertia).values;
  const smallest = eigenSymmetric3(q).values[0];
  // A tensor of zero trace and non-zero elements is impossible at any tolerance: its own size is the scale then.
  const scale = Math.max(size, ...inertia.map(Math.abs));
  const possible = smallest >= -(allowance + COMPUTED_ROUNDING * scale);
  const shortfall = -2 * smallest;
  const rule = possible ? null : moments[0] < 0 ? 'negative moment' : 'triangle inequality';
  return { possible, moments, shortfall, shortfallOfTrace: scale === 0 ? 0 : shortfall / scale, rule };
}
