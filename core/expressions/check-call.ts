import { ANGLE, type Dimension, PLAIN, productDimension } from '../units/dimension.ts';
import { aDimension } from '../units/dimension-names.ts';
import type { Ast, CallAst } from './ast.ts';
import { binaryNode, unaryNode } from './build-checked.ts';
import type { CheckContext } from './check-context.ts';
import type { CheckedNode } from './checked.ts';
import { described, mendingHint, wrongDimension } from './dimension-faults.ts';
import { sameDimension } from './same-dimension.ts';
import type { FunctionName } from './vocabulary.ts';

/** A call of any function but `if`: its arguments' kinds, and that of its result. */
export function checkCall(
  ast: CallAst,
  name: Exclude<FunctionName, 'if'>,
  context: CheckContext,
): CheckedNode {
  const parts = ast.arguments.map((argument) => context.check(argument));
  switch (name) {
    case 'sin':
    case 'cos':
    case 'tan':
      need(name, ANGLE, ast.arguments[0]!, parts[0]!, context);
      return unaryNode(name, parts[0]!, PLAIN, ast);
    case 'asin':
    case 'acos':
    case 'atan':
      need(name, PLAIN, ast.arguments[0]!, parts[0]!, context);
      return unaryNode(name, parts[0]!, ANGLE, ast);
    case 'floor':
    case 'ceil':
    case 'round':
      need(name, PLAIN, ast.arguments[0]!, parts[0]!, context);
      return unaryNode(name, parts[0]!, PLAIN, ast);
    case 'abs':
      return unaryNode(name, parts[0]!, parts[0]!.dimension, ast);
    case 'sqrt':
      return checkSquareRoot(ast, parts[0]!);
    case 'min':
    case 'max':
    case 'hypot':
      return sameDimension(name, ast.arguments, parts, context).reduce((a, b) =>
        binaryNode(name, a, b, a.dimension, ast),
      );
    case 'atan2': {
      const [y, x] = sameDimension(name, ast.arguments, parts, context);
      return binaryNode(name, y!, x!, ANGLE, ast);
    }
  }
}

function need(name: string, wanted: Dimension, ast: Ast, part: CheckedNode, { units }: CheckContext): void {
  if (part.dimension === wanted) return;
  throw wrongDimension(
    `${name} needs ${aDimension(wanted)}, and ${described(ast, part.dimension)}`,
    ast,
    mendingHint(ast, part.dimension, wanted, units),
  );
}

function checkSquareRoot(ast: CallAst, part: CheckedNode): CheckedNode {
  const dimension = productDimension(PLAIN, part.dimension, 0.5);
  if (dimension === undefined)
    throw wrongDimension(
      `the units of a square root have even powers, and ${described(ast.arguments[0]!, part.dimension)}`,
      ast,
    );
  return unaryNode('sqrt', part, dimension, ast);
}
