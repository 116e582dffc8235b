import { FaultList, InputError } from '../errors.ts';
import { IDENTITY, type Matrix3, type Symmetric3 } from '../linalg/symmetric3.ts';
import type { Vector3 } from '../linalg/vector3.ts';
import { findPart } from '../model/part-paths.ts';
import type { Project } from '../model/read-project.ts';
import { openScope } from './part-tree.ts';
import { turnOf } from './placing.ts';
import { evaluate, evaluateVector, type Run } from './scope.ts';

/** A tensor as someone gives it, conventions declared and not yet applied; SI. */
export interface GivenTensor {
  readonly mass: number | null;
  readonly centre: Vector3 | null;
  /** xx yy zz xy xz yz as written, products of the declared sign [kg·m²]. */
  readonly inertia: Symmetric3;
  /** The point it is declared to be about: the body's own centre, the origin of its axes, or a point [m]. */
  readonly about: 'centre' | 'origin' | Vector3;
  readonly products: 'negative' | 'positive';
  /** Rotation of the part's axes into its parent's, where its place in an assembly turns it. */
  readonly turn?: Matrix3;
  /** Half a unit of the last digit of each element [kg·m²]; zeros where the digits are exact. */
  readonly halfUnits: Symmetric3;
}

/**
 * The numbers of a `body` as its file writes them, also where no body can have them: nothing is judged, placed or moved.
 *
 * @returns null where the path is not a body of the top file
 * @throws InputError where a quantity has no value
 */
export function givenTensor(project: Project, path: string, state: string): GivenTensor | null {
  const found = findPart(project.root.parts, path);
  if ('unknown' in found || found.part.shape.kind !== 'body') return null;
  const { body } = found.part.shape;
  const run: Run = {
    source: project.source,
    faults: new FaultList(),
    warnings: [],
    meshes: new Map(),
    meshInputs: new Map(),
    withoutMaturity: [],
  };
  const scope = openScope(project.root, state, new Map(), run, '', null);
  const { about, six, products, halfUnits } = body.inertia;
  const turn = turnOf(found.part.placing.rotate, scope);
  const given: GivenTensor = {
    mass: evaluate(body.mass, scope),
    centre: body.centre ? evaluateVector(body.centre, scope) : [0, 0, 0],
    inertia: six.map((q) => evaluate(q, scope)) as unknown as Symmetric3,
    about: typeof about === 'string' ? about : evaluateVector(about, scope),
    products: products ?? 'negative',
    ...(turn === IDENTITY ? {} : { turn }),
    halfUnits: [...halfUnits] as unknown as Symmetric3,
  };
  if (run.faults.faults.length > 0) throw new InputError(run.faults.faults);
  return given;
}
