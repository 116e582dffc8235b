import type { Dimension } from '../units/dimension.ts';
import type { Comparison } from './ast.ts';
import type { Span } from './expression-error.ts';
import type { BinaryOperation, UnaryOperation } from './operations.ts';

// A checked tree is in SI, with every name resolved to a slot of the parameter vector and every constant part folded.
//
// Values come from it by `compileNode` (compile.ts): each node becomes a closure over its operands' closures.
// Exact derivatives come from the same tree in the same way, when uncertainty asks for them: a second walk that turns
// each node into a function of (parameters, base, slot) giving a dual number, the value and its derivative by that slot,
// by the rule of each operation in operations.ts. Constants have derivative 0, a parameter 1 in its own slot. A
// choice takes the branch taken; min, max and abs the side taken; floor, ceil and round give 0. The nodes hold all that
// this needs: what is to be written is one table of rules beside operations.ts.

interface CheckedBase extends Span {
  readonly dimension: Dimension;
}
export interface ConstantNode extends CheckedBase {
  readonly kind: 'constant';
  readonly value: number;
}
export interface ParameterNode extends CheckedBase {
  readonly kind: 'parameter';
  readonly slot: number;
}
export interface UnaryNode extends CheckedBase {
  readonly kind: 'unary';
  readonly operation: UnaryOperation;
  readonly operand: CheckedNode;
}
export interface BinaryNode extends CheckedBase {
  readonly kind: 'binary';
  readonly operation: BinaryOperation;
  readonly left: CheckedNode;
  readonly right: CheckedNode;
}
/** `if`: the one branch that the comparison picks is evaluated. */
export interface ChoiceNode extends CheckedBase {
  readonly kind: 'choice';
  readonly comparison: Comparison;
  readonly left: CheckedNode;
  readonly right: CheckedNode;
  readonly whenTrue: CheckedNode;
  readonly whenFalse: CheckedNode;
}
export type CheckedNode = ConstantNode | ParameterNode | UnaryNode | BinaryNode | ChoiceNode;
