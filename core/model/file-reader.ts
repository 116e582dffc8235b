import type { Places } from '../document/index.ts';
import type { Fault, FaultList } from '../errors.ts';
import { compileExpression, type Expression, ExpressionError, type Lookup } from '../expressions/index.ts';
import { type Dimension, type FileUnits, PLAIN_UNIT, type Unit, unitFor } from '../units/index.ts';
import type { Quantity, Uncertainty, Vector3Quantity } from './model.ts';
import { pathOf, type Where, within } from './where.ts';

/** A quantity as the document holds it: text, or a mapping with its value and uncertainty. */
export type QuantityDocument =
  | string
  | { value?: string; u?: string; tol?: string; min?: string; max?: string };

/**
 * What reading one file needs at hand: its units, the names an expression may use, and where faults go.
 * A quantity that cannot be read adds its fault and comes back as zero, so that all faults are found in one go.
 */
export class FileReader {
  readonly path: string;
  readonly places: Places;
  readonly faults: FaultList;
  readonly units: FileUnits;
  lookup: Lookup = () => undefined;

  constructor(path: string, places: Places, faults: FaultList, units: FileUnits) {
    this.path = path;
    this.places = places;
    this.faults = faults;
    this.units = units;
  }

  fault(where: Where | null, fault: Omit<Fault, 'at'>): void {
    this.faults.add({ ...fault, at: this.places.placeOf(pathOf(where)) });
  }

  /** A fault of a key itself, not of what it holds. */
  keyFault(where: Where, fault: Omit<Fault, 'at'>): void {
    this.faults.add({ ...fault, ...this.places.markOfKey(pathOf(where)) });
  }

  /** The unit a bare number of some kind takes in this file. */
  unitOf(kind: Dimension): Unit {
    return unitFor(kind, this.units);
  }

  /** Compiles an expression; `field` null leaves its dimension free. */
  expression(text: string, field: Unit | null, where: Where): Expression {
    try {
      return compileExpression(text, field, this.lookup, this.units);
    } catch (error) {
      if (!(error instanceof ExpressionError)) throw error;
      this.expressionFault(error, where);
      return compileExpression('0', field ?? PLAIN_UNIT, this.lookup, this.units);
    }
  }

  expressionFault(error: ExpressionError, where: Where): void {
    const length = Math.max(1, error.end - error.start);
    this.faults.add({
      code: error.code,
      message: error.message,
      at: this.places.placeInScalar(pathOf(where), error.start, length),
      length,
      ...(error.hint ? { hint: error.hint } : {}),
    });
  }

  quantity(given: QuantityDocument, field: Unit | null, where: Where): Quantity {
    if (typeof given === 'string')
      return { expression: this.expression(given, field, where), where, uncertainty: null };
    const inValue = within(where, 'value');
    const expression = this.expression(given.value ?? '0', field, inValue);
    return { expression, where: inValue, uncertainty: this.uncertainty(given, field, where) };
  }

  vector3(given: readonly QuantityDocument[], field: Unit, where: Where): Vector3Quantity {
    return given.map((g, i) => this.quantity(g, field, within(where, i))) as unknown as Vector3Quantity;
  }

  /** `u` and `tol`: a percentage is relative to the value, anything else is in the value's kind. */
  uncertainty(given: { u?: string; tol?: string }, field: Unit | null, where: Where): Uncertainty | null {
    const kind = given.u !== undefined ? 'u' : given.tol !== undefined ? 'tol' : null;
    if (kind === null) return null;
    const text = given[kind]!;
    const at = within(where, kind);
    const free = this.expression(text, null, at);
    const relative = free.isPercentage;
    const expression = relative ? free : this.expression(text, field, at);
    if (expression.constant !== undefined && !(expression.constant >= 0))
      this.fault(within(where, kind), {
        code: 'MODEL_UNCERTAINTY_NEGATIVE',
        message: `expected ${kind} to be zero or more, found ${text}`,
        hint: 'u is a standard uncertainty and tol a half-width; write their size without a sign',
      });
    return { kind, relative, expression };
  }
}
