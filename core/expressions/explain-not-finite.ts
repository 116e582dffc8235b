import { ANGLE } from '../units/dimension.ts';
import type { CheckedNode } from './checked.ts';
import { compileNode } from './compile.ts';
import { ExpressionError } from './expression-error.ts';
import { COMPARE } from './operations.ts';

/**
 * Finds the part of an expression whose value is first not finite, its own parts being finite, and says why.
 *
 * @returns an EXPRESSION_NOT_FINITE with that part's place, to throw or report; undefined when every part is finite
 */
export function explainNotFinite(
  root: CheckedNode,
  parameters: ArrayLike<number>,
  base = 0,
): ExpressionError | undefined {
  const valueAt = (node: CheckedNode): number => compileNode(node)(parameters, base);
  const find = (node: CheckedNode): ExpressionError | undefined => {
    for (const part of partsEvaluated(node, valueAt)) {
      const fault = find(part);
      if (fault !== undefined) return fault;
    }
    return Number.isFinite(valueAt(node)) ? undefined : notFinite(node, valueAt);
  };
  return find(root);
}

function partsEvaluated(node: CheckedNode, valueAt: (node: CheckedNode) => number): CheckedNode[] {
  if (node.kind === 'unary') return [node.operand];
  if (node.kind === 'binary') return [node.left, node.right];
  if (node.kind !== 'choice') return [];
  const holds = COMPARE[node.comparison](valueAt(node.left), valueAt(node.right));
  return [node.left, node.right, holds ? node.whenTrue : node.whenFalse];
}

function notFinite(node: CheckedNode, valueAt: (node: CheckedNode) => number): ExpressionError {
  return new ExpressionError('EXPRESSION_NOT_FINITE', reason(node, valueAt), node);
}

function reason(node: CheckedNode, valueAt: (node: CheckedNode) => number): string {
  if (node.kind === 'parameter') return 'this has no finite value';
  if (node.kind === 'unary') {
    if (node.operation === 'sqrt') return 'this is the square root of a negative number';
    if (node.operation === 'tan') return 'the tangent of a right angle has no finite value';
    if (node.dimension === ANGLE && node.operation !== 'negate')
      return `${node.operation} needs a number from -1 to 1, and this is ${valueAt(node.operand)}`;
  }
  if (node.kind === 'binary') {
    if (node.operation === 'divide' && valueAt(node.right) === 0) return 'this divides by zero';
    if (node.operation === 'power') {
      const base = valueAt(node.left);
      if (base === 0) return 'zero has no negative power';
      if (base < 0 && !Number.isInteger(valueAt(node.right))) return 'a negative number has no broken power';
    }
  }
  return 'this is larger than any number the machine can hold';
}
