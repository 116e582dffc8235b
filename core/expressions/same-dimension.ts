import { type Dimension, PLAIN } from '../units/dimension.ts';
import type { Ast } from './ast.ts';
import type { CheckContext } from './check-context.ts';
import type { CheckedNode } from './checked.ts';
import { described, mendingHint, wrongDimension } from './dimension-faults.ts';

/**
 * The parts, all of one dimension. A bare 0 fits every kind, since zero is zero in every unit.
 *
 * @throws ExpressionError EXPRESSION_WRONG_DIMENSION at the first part that differs; between a plain number and another
 *   kind the plain number is at fault
 */
export function sameDimension(
  who: string,
  asts: readonly Ast[],
  parts: readonly CheckedNode[],
  context: CheckContext,
): CheckedNode[] {
  const free = asts.map(isBareZero);
  const leader = parts.findIndex((part, i) => !free[i] && part.dimension !== PLAIN);
  const first = leader >= 0 ? leader : Math.max(0, free.indexOf(false));
  const wanted: Dimension = parts[first]!.dimension;
  return parts.map((part, i) => {
    if (part.dimension === wanted) return part;
    if (free[i]) return { ...part, dimension: wanted };
    const [a, b] = i < first ? [i, first] : [first, i];
    const pair = `${described(asts[a]!, parts[a]!.dimension)} and ${described(asts[b]!, parts[b]!.dimension)}`;
    const hint = mendingHint(asts[i]!, part.dimension, wanted, context.units);
    throw wrongDimension(`${who} needs values of one kind; ${pair}`, asts[i]!, hint);
  });
}

const isBareZero = (ast: Ast): boolean =>
  ast.kind === 'number' && ast.unit === undefined && Number(ast.text) === 0;
