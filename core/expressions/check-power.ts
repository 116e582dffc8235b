import { PLAIN, productDimension } from '../units/dimension.ts';
import { dimensionName } from '../units/dimension-names.ts';
import type { BinaryAst } from './ast.ts';
import { binaryNode } from './build-checked.ts';
import type { CheckContext } from './check-context.ts';
import type { CheckedNode } from './checked.ts';
import { described, mendingHint, quoted, wrongDimension } from './dimension-faults.ts';

/** base ^ exponent: a base with a dimension takes a constant exponent that leaves whole powers of its units. */
export function checkPower(ast: BinaryAst, context: CheckContext): CheckedNode {
  const base = context.check(ast.left);
  const exponent = context.check(ast.right);
  if (exponent.dimension !== PLAIN)
    throw wrongDimension(
      `an exponent is a plain number, and ${described(ast.right, exponent.dimension)}`,
      ast.right,
      mendingHint(ast.right, exponent.dimension, PLAIN, context.units),
    );
  if (base.dimension === PLAIN) return binaryNode('power', base, exponent, PLAIN, ast);
  if (exponent.kind !== 'constant')
    throw wrongDimension(
      `${described(ast.left, base.dimension)}, so its exponent must be a constant`,
      ast.right,
      mendingHint(ast.left, base.dimension, PLAIN, context.units),
    );
  const dimension = productDimension(PLAIN, base.dimension, exponent.value);
  if (dimension === undefined)
    throw wrongDimension(
      `${quoted(ast.left)} to the power ${quoted(ast.right)} has no whole powers of the units of ${dimensionName(base.dimension)}`,
      ast,
    );
  return binaryNode('power', base, exponent, dimension, ast);
}
