import type { Symmetric3 } from '../linalg/symmetric3.ts';
import { dot, type Vector3 } from '../linalg/vector3.ts';

/**
 * The weights G with which any part C of a change of tensor counts in the change of matched principal moments: G : C.
 *
 * For one pair of axes v₀, v₁ that is v₀ᵀ C v₁ / (v₀·v₁). For a free plane V₀, V₁ (two columns each) it is
 * tr(M⁻¹ V₀ᵀ C V₁) with M = V₀ᵀ V₁, which is the change of the sum of the plane's moments without remainder,
 * (J₁V₁ = V₁Λ₁ and V₀ᵀJ₀ = Λ₀V₀ᵀ give tr Λ₁ − tr Λ₀), whichever axes are taken in either plane. For all three
 * axes it is the trace. Made symmetric, so that swapping the sides changes no bit of it.
 *
 * @param from axes in A, unit, body axes; signs do not matter
 * @param to the matched axes in B
 * @returns six weights, those of the products doubled: Σ Gₖ Cₖ over xx yy zz xy xz yz
 */
export function axisWeights(from: readonly Vector3[], to: readonly Vector3[]): Symmetric3 {
  if (from.length === 3) return [1, 1, 1, 0, 0, 0];
  const inverse = from.length === 1 ? [[1 / dot(from[0]!, to[0]!)]] : inverseOfTwo(from, to);
  const element = (i: 0 | 1 | 2, j: 0 | 1 | 2): number => {
    const term = (p: number, q: number) => to[p]![i] * from[q]![j] * inverse[p]![q]!;
    return from.length === 1 ? term(0, 0) : term(0, 0) + term(1, 1) + (term(0, 1) + term(1, 0));
  };
  return [
    element(0, 0),
    element(1, 1),
    element(2, 2),
    element(0, 1) + element(1, 0),
    element(0, 2) + element(2, 0),
    element(1, 2) + element(2, 1),
  ];
}

/** M⁻¹ of M = V₀ᵀ V₁; the determinant is the cosine between the planes' normals, clear of zero once matched. */
function inverseOfTwo(from: readonly Vector3[], to: readonly Vector3[]): number[][] {
  const m = (p: number, q: number) => dot(from[p]!, to[q]!);
  const determinant = m(0, 0) * m(1, 1) - m(0, 1) * m(1, 0);
  return [
    [m(1, 1) / determinant, -m(0, 1) / determinant],
    [-m(1, 0) / determinant, m(0, 0) / determinant],
  ];
}

/** Σ Gₖ Cₖ, with + 0 so that nothing is never −0. */
export const weigh = (g: Symmetric3, c: Symmetric3): number =>
  g[0] * c[0] + g[1] * c[1] + g[2] * c[2] + g[3] * c[3] + g[4] * c[4] + g[5] * c[5] + 0;
