import { fromRows, type Symmetric3 } from '../linalg/symmetric3.ts';
import type { Vector3 } from '../linalg/vector3.ts';
import type { RollUpRecord, Totals } from '../record/record.ts';
import { weigh } from './axis-weights.ts';
import { conventionChanges, inputChanges, limitChanges, parameterChanges } from './context-changes.ts';
import { matchParts, type PartPair } from './match-parts.ts';
import { partChange } from './part-change.ts';
import { type PrincipalQuantity, principalChange } from './principal-change.ts';
import { CENTRE_NAMES, INERTIA_NAMES, quantityChange, quantityChanges } from './quantity-changes.ts';
import { type Means, splitCentre, splitTensor } from './split-part.ts';
import { sum } from './sum.ts';
import type { Difference, PartChange, SideLabel, Split } from './types.ts';

/**
 * What moved from record A to record B, and which part moved it by how much and why: a difference without remainder.
 *
 * Every change of mass, centre, central tensor and principal moment is the sum of the parts' contributions up to
 * rounding (`remainder`); a part that did not change contributes exactly zero; swapping A and B flips every sign.
 * Means and changes are taken as in Means of split-part.ts, so no cross term is left over:
 * centre (ΔS − c̄ Δm) / m̄; tensor Δ(Jᵢ about h) − Δm K(d/2); principal moments v₀ᵀ ΔJᵢ v₁ / (v₀·v₁).
 *
 * @param on which masses: as they are, or with the growth allowance
 * @returns plain data, SI, body axes, products negative. Where one side has no mass only the mass is attributed
 */
export function difference(a: RollUpRecord, b: RollUpRecord, on: 'basic' | 'predicted'): Difference {
  const quantities = quantityChanges(a[on], b[on]);
  const both = bothTotals(a[on], b[on]);
  const found = both && principalOf(a[on], b[on], both);
  for (const { name, a: before, b: after } of found?.quantities ?? [])
    quantities.push(quantityChange(name, 'kg*m^2', before, after, true));
  const parts = matchParts(a.parts, b.parts, on).map((pair) => {
    const change = partChange(pair, on);
    if (change.status !== 'unchanged' && change.status !== 'renamed')
      change.contributions = contributionsOf(pair, on, both, found?.quantities ?? []);
    return change;
  });
  for (const quantity of quantities) {
    if (quantity.change === null || !isAttributed(quantity.name)) continue;
    quantity.remainder = quantity.change - sum(termsOf(parts, quantity.name)) + 0;
  }
  return {
    schema: 'steelyard-difference/1',
    on,
    a: labelOf(a),
    b: labelOf(b),
    quantities,
    principal: found?.principal ?? null,
    parts,
    parameters: parameterChanges(a.parameters, b.parameters),
    limits: limitChanges(a.limits, b.limits),
    inputs: inputChanges(a.inputs, b.inputs),
    conventions: conventionChanges(a, b),
  };
}

/** Whether a change of this quantity is attributed to parts. */
export const isAttributed = (name: string): boolean => /^(mass$|centre\.|inertia\.|principal\.)/.test(name);

interface BothTotals {
  means: Means;
  tensors: readonly [Symmetric3, Symmetric3];
}

/** Null where one side has no centre. */
function bothTotals(a: Totals, b: Totals): BothTotals | null {
  if (!a.centre || !b.centre || !a.inertia || !b.inertia) return null;
  const three = (f: (k: 0 | 1 | 2) => number): Vector3 => [f(0), f(1), f(2)];
  const [p, q] = [a.centre, b.centre];
  return {
    means: {
      mass: (a.mass + b.mass) / 2,
      centre: three((k) => (p[k]! + q[k]!) / 2),
      step: three((k) => q[k]! - p[k]!),
    },
    tensors: [fromRows(a.inertia.aboutCentre), fromRows(b.inertia.aboutCentre)],
  };
}

function principalOf(a: Totals, b: Totals, { tensors }: BothTotals) {
  if (!a.principal || !b.principal) return null;
  return principalChange(
    { tensor: tensors[0], record: a.principal },
    { tensor: tensors[1], record: b.principal },
  );
}

function contributionsOf(
  { a, b }: PartPair,
  on: 'basic' | 'predicted',
  both: BothTotals | null,
  principal: readonly PrincipalQuantity[],
): Record<string, Split> {
  const [p, q] = [a?.[on] ?? null, b?.[on] ?? null];
  const out: Record<string, Split> = {
    mass: { mass: (q?.mass ?? 0) - (p?.mass ?? 0) + 0, place: 0, shapeAndTurn: 0 },
  };
  if (!both) return out;
  const centre = splitCentre(p, q, both.means);
  CENTRE_NAMES.forEach((name, k) => {
    out[name] = { mass: centre.mass[k]!, place: centre.place[k]!, shapeAndTurn: 0 };
  });
  const tensor = splitTensor(p, q, both.means);
  INERTIA_NAMES.forEach((name, k) => {
    out[name] = { mass: tensor.mass[k]!, place: tensor.place[k]!, shapeAndTurn: tensor.shapeAndTurn[k]! };
  });
  for (const { name, weights } of principal)
    out[name] = {
      mass: weigh(weights, tensor.mass),
      place: weigh(weights, tensor.place),
      shapeAndTurn: weigh(weights, tensor.shapeAndTurn),
    };
  return out;
}

function* termsOf(parts: readonly PartChange[], name: string): Iterable<number> {
  for (const { contributions } of parts) {
    const split = contributions[name];
    if (split) yield* [split.mass, split.place, split.shapeAndTurn];
  }
}

function labelOf(record: RollUpRecord): SideLabel {
  const { assembly, state, stamp, conventions, provenance } = record;
  return {
    assembly,
    state,
    stamp,
    coreVersion: conventions.coreVersion,
    commit: provenance.commit ?? null,
    branch: provenance.branch ?? null,
    at: provenance.at,
  };
}
