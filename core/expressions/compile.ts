import type { BinaryNode, CheckedNode, ChoiceNode } from './checked.ts';
import { BINARY, COMPARE, UNARY } from './operations.ts';

/** A value in SI from the parameters at `base` on. Allocates nothing. */
export type Evaluate = (parameters: ArrayLike<number>, base: number) => number;

/** The closure that computes a checked node. */
export function compileNode(node: CheckedNode): Evaluate {
  switch (node.kind) {
    case 'constant': {
      const { value } = node;
      return () => value;
    }
    case 'parameter': {
      const { slot } = node;
      return (p, base) => p[base + slot]!;
    }
    case 'unary': {
      const apply = UNARY[node.operation];
      const operand = compileNode(node.operand);
      return (p, base) => apply(operand(p, base));
    }
    case 'binary':
      return compileBinary(node);
    case 'choice':
      return compileChoice(node);
  }
}

/** The four rules of arithmetic get closures of their own, the rest go through the table. */
function compileBinary(node: BinaryNode): Evaluate {
  const left = compileNode(node.left);
  const right = compileNode(node.right);
  const constant = node.right.kind === 'constant' ? node.right.value : undefined;
  switch (node.operation) {
    case 'add':
      return constant === undefined ? (p, b) => left(p, b) + right(p, b) : (p, b) => left(p, b) + constant;
    case 'subtract':
      return constant === undefined ? (p, b) => left(p, b) - right(p, b) : (p, b) => left(p, b) - constant;
    case 'multiply':
      return constant === undefined ? (p, b) => left(p, b) * right(p, b) : (p, b) => left(p, b) * constant;
    case 'divide':
      return constant === undefined ? (p, b) => left(p, b) / right(p, b) : (p, b) => left(p, b) / constant;
    default: {
      const apply = BINARY[node.operation];
      return (p, b) => apply(left(p, b), right(p, b));
    }
  }
}

function compileChoice(node: ChoiceNode): Evaluate {
  const holds = COMPARE[node.comparison];
  const left = compileNode(node.left);
  const right = compileNode(node.right);
  const whenTrue = compileNode(node.whenTrue);
  const whenFalse = compileNode(node.whenFalse);
  return (p, b) => {
    const x = left(p, b);
    const y = right(p, b);
    if (Number.isNaN(x) || Number.isNaN(y)) return Number.NaN; // nothing holds of what has no value
    return holds(x, y) ? whenTrue(p, b) : whenFalse(p, b);
  };
}

/** The slots a node may read, ascending, each once. */
export function slotsRead(node: CheckedNode): number[] {
  const slots = new Set<number>();
  const visit = (part: CheckedNode): void => {
    if (part.kind === 'parameter') slots.add(part.slot);
    for (const operand of operandsOf(part)) visit(operand);
  };
  visit(node);
  return [...slots].sort((a, b) => a - b);
}

/** The nodes one step down, in the order of evaluation. */
export function operandsOf(node: CheckedNode): readonly CheckedNode[] {
  switch (node.kind) {
    case 'constant':
    case 'parameter':
      return [];
    case 'unary':
      return [node.operand];
    case 'binary':
      return [node.left, node.right];
    case 'choice':
      return [node.left, node.right, node.whenTrue, node.whenFalse];
  }
}
