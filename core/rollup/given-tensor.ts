import { compose, IN_PLACE, type Placement } from '../inertia/placement.ts';
import type { Symmetric3 } from '../linalg/symmetric3.ts';
import type { Vector3 } from '../linalg/vector3.ts';
import { findPart, type Step } from '../model/part-paths.ts';
import type { Project } from '../model/read-project.ts';
import { copiesOf } from './copies.ts';
import { includedScope, openScope } from './part-tree.ts';
import { ORIGIN, placementOf, repeatsOf } from './placing.ts';
import { checkState, newRun } from './roll-up.ts';
import { evaluate, evaluateVector, type Scope } from './scope.ts';

/** A tensor as someone gives it, conventions declared and not yet applied; SI. */
export interface GivenTensor {
  readonly mass: number | null;
  readonly centre: Vector3 | null;
  /** xx yy zz xy xz yz as written, products of the declared sign [kg·m²]. */
  readonly inertia: Symmetric3;
  /** The point it is declared to be about: the body's own centre, the origin of its axes, or a point [m]. */
  readonly about: 'centre' | 'origin' | Vector3;
  readonly products: 'negative' | 'positive';
  /**
   * The axes of its numbers: those of an assembly, those of a part (with where the assembly puts them), or not known.
   */
  readonly axes: 'assembly' | 'unknown' | Placement;
  /** Half a unit of the last digit of each element [kg·m²]; zeros where the digits are exact. */
  readonly halfUnits: Symmetric3;
}

/**
 * The numbers of a `body` as its file writes them, also where no body can have them: nothing is judged or moved.
 *
 * @param set values from outside for the top file's parameters, by slot [SI]
 * @returns null where the path is not a body, or names a copy that there is not
 * @throws InputError where a quantity has no value, and MODEL_UNKNOWN_STATE
 */
export function givenTensor(
  project: Project,
  path: string,
  state: string,
  set: ReadonlyMap<number, number> = new Map(),
): GivenTensor | null {
  const found = findPart(project.root.parts, path);
  if ('unknown' in found || found.part.shape.kind !== 'body') return null;
  checkState(project, state);
  const run = newRun(project.source, {});
  const top = openScope(project.root, state, set, run, '', null);
  const standing = standingOf(found.way, top);
  if (!standing) return null;
  const { scope, placement } = standing;
  const { body } = found.part.shape;
  const { about, six, products, halfUnits } = body.inertia;
  const given: GivenTensor = {
    mass: evaluate(body.mass, scope),
    centre: body.centre ? evaluateVector(body.centre, scope) : ORIGIN,
    inertia: six.map((q) => evaluate(q, scope)) as unknown as Symmetric3,
    about: typeof about === 'string' ? about : evaluateVector(about, scope),
    products: products ?? 'negative',
    axes: placement,
    halfUnits: [...halfUnits] as unknown as Symmetric3,
  };
  run.faults.check();
  return given;
}

/**
 * Where the last part of a way down the tree stands in body axes, and the scope of its own file; the first copy where
 * none is named, null where the one named does not exist.
 */
function standingOf(way: readonly Step[], top: Scope): { placement: Placement; scope: Scope } | null {
  let placement = IN_PLACE;
  let scope = top;
  let path = '';
  for (const { part, copy } of way) {
    path += path === '' ? part.name : `/${part.name}`;
    const { shape, placing } = part;
    const centre =
      shape.kind === 'body' && shape.body.centre ? evaluateVector(shape.body.centre, scope) : ORIGIN;
    const anchor = placing.anchor === 'centroid' ? centre : ORIGIN;
    const standing = copiesOf(repeatsOf(placing.repeat, scope))[(copy ?? 1) - 1];
    if (!standing) return null;
    placement = compose(placement, compose(standing, placementOf(placing, anchor, scope)));
    if (shape.kind === 'include') {
      scope = includedScope(part, shape, path, scope);
      path = '';
    }
  }
  return { placement, scope };
}
