import { type Fault, type FaultList, InputError, type Warning } from '../errors.ts';
import { explainNotFinite } from '../expressions/index.ts';
import type { Vector3 } from '../linalg/vector3.ts';
import type { FileModel, Quantity, StateModel, Vector3Quantity } from '../model/model.ts';
import type { ProjectSource } from '../model/source.ts';
import { pathOf, type Where } from '../model/where.ts';
import { formatQuantity, unitFor } from '../units/index.ts';
import type { MeshReading } from './read-mesh-part.ts';

/** What one roll-up gathers as it walks the tree. */
export interface Run {
  readonly source: ProjectSource;
  readonly faults: FaultList;
  readonly warnings: Warning[];
  /** Meshes by path, unit, fill and weld, each read once a process. */
  readonly meshes: Map<string, MeshReading>;
  /** SHA-256 and size of every mesh file read, by path. */
  readonly meshInputs: Map<string, { sha256: string; bytes: number }>;
  /** Parts without maturity under a growth table, gathered into one warning. */
  readonly withoutMaturity: { path: string; at: { file: string; line: number } }[];
}

/** One file at one set of parameter values: the values its parts are evaluated with. */
export interface Scope {
  readonly run: Run;
  readonly file: FileModel;
  readonly state: StateModel;
  /** By slot, SI. */
  readonly values: Float64Array;
  /** Growth allowances in force, evaluated; the including file's where this one has none. */
  readonly growth: GrowthTables | null;
  /** Paths of parts, in this file, that the state or a state of an including file leaves out. */
  readonly omit: ReadonlySet<string>;
  /** Path of the part that includes this file, with a slash at the end; empty for the top file. */
  readonly prefix: string;
}

export type GrowthTables = ReadonlyMap<string | null, ReadonlyMap<string, number>>;

/** Adds a fault at a place of the scope's file. */
export function faultAt(scope: Scope, where: Where | null, fault: Omit<Fault, 'at'>): void {
  scope.run.faults.add({ ...fault, at: scope.file.places.placeOf(pathOf(where)) });
}

/** Evaluates a quantity [SI]; not finite is a fault. */
export function evaluate(quantity: Quantity, scope: Scope): number {
  const value = quantity.expression.evaluate(scope.values);
  if (Number.isFinite(value)) return value + 0;
  const { root } = quantity.expression;
  const why = root && explainNotFinite(root, scope.values);
  const { places } = scope.file;
  const path = pathOf(quantity.where);
  const length = why ? Math.max(1, why.end - why.start) : 1;
  scope.run.faults.add({
    code: 'EXPRESSION_NOT_FINITE',
    message: `${why?.message ?? 'expected a finite number, found one too large'}, in state '${scope.state.name}'`,
    at: why ? places.placeInScalar(path, why.start, length) : places.placeOf(path),
    length,
    hint:
      why?.hint ?? 'look for a division by zero, a root of a negative number or a power that grows too large',
  });
  scope.run.faults.check();
  throw new InputError(scope.run.faults.faults);
}

export const evaluateVector = (v: Vector3Quantity, scope: Scope): Vector3 => [
  evaluate(v[0], scope),
  evaluate(v[1], scope),
  evaluate(v[2], scope),
];

/** A value in the unit that the scope's file writes for it, for messages. */
export const say = (value: number, quantity: Quantity, scope: Scope): string =>
  formatQuantity(value, unitFor(quantity.expression.dimension, scope.file.units));
