import type { Dimension } from '../units/dimension.ts';
import type { CheckedNode } from './checked.ts';

/** A checked expression, ready to evaluate. */
export interface Expression {
  readonly dimension: Dimension;
  /** The value in SI when it depends on no parameter; always finite. */
  readonly constant: number | undefined;
  /** Slots of the parameters it may read, ascending. */
  readonly reads: readonly number[];
  /** Whether it was written as a percentage (`2 %`), which in `u`, `tol` and `growth` is relative. */
  readonly isPercentage: boolean;
  /** The tree behind it, for faults and derivatives; undefined for a constant. */
  readonly root: CheckedNode | undefined;
  /** The value in SI from the parameters at `base` (0 where left out) on; not finite when the arithmetic is not. */
  evaluate(parameters: ArrayLike<number>, base?: number): number;
}

const NONE: readonly number[] = Object.freeze([]);

/** An expression that is one number. */
export class ConstantExpression implements Expression {
  readonly dimension: Dimension;
  readonly constant: number;
  readonly isPercentage: boolean;

  constructor(constant: number, dimension: Dimension, isPercentage = false) {
    this.constant = constant + 0; // never −0
    this.dimension = dimension;
    this.isPercentage = isPercentage;
  }
  get reads(): readonly number[] {
    return NONE;
  }
  get root(): undefined {
    return undefined;
  }
  evaluate(_parameters?: ArrayLike<number>, _base?: number): number {
    return this.constant;
  }
}
