import type { Dimension } from '../units/dimension.ts';
import type { Comparison } from './ast.ts';
import type { CheckedNode, ConstantNode } from './checked.ts';
import type { Span } from './expression-error.ts';
import { BINARY, type BinaryOperation, COMPARE, UNARY, type UnaryOperation } from './operations.ts';

// Builders of checked nodes. They fold constants, except where the value is not finite: such a node stays, so that the
// fault names the smallest part at fault.

export const constantNode = (value: number, dimension: Dimension, span: Span): ConstantNode => ({
  kind: 'constant',
  value,
  dimension,
  start: span.start,
  end: span.end,
});

export function unaryNode(
  operation: UnaryOperation,
  operand: CheckedNode,
  dimension: Dimension,
  span: Span,
): CheckedNode {
  if (operand.kind === 'constant') {
    const value = UNARY[operation](operand.value);
    if (Number.isFinite(value)) return constantNode(value, dimension, span);
  }
  return { kind: 'unary', operation, operand, dimension, start: span.start, end: span.end };
}

export function binaryNode(
  operation: BinaryOperation,
  left: CheckedNode,
  right: CheckedNode,
  dimension: Dimension,
  span: Span,
): CheckedNode {
  if (left.kind === 'constant' && right.kind === 'constant') {
    const value = BINARY[operation](left.value, right.value);
    if (Number.isFinite(value)) return constantNode(value, dimension, span);
  }
  return { kind: 'binary', operation, left, right, dimension, start: span.start, end: span.end };
}

export function choiceNode(
  comparison: Comparison,
  [left, right]: readonly [CheckedNode, CheckedNode],
  [whenTrue, whenFalse]: readonly [CheckedNode, CheckedNode],
  span: Span,
): CheckedNode {
  if (left.kind === 'constant' && right.kind === 'constant')
    return COMPARE[comparison](left.value, right.value) ? whenTrue : whenFalse;
  const dimension = whenTrue.dimension;
  return {
    kind: 'choice',
    comparison,
    left,
    right,
    whenTrue,
    whenFalse,
    dimension,
    start: span.start,
    end: span.end,
  };
}
