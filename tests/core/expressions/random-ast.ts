import fc from 'fast-check';
import type { Ast } from '../../../core/expressions/index.ts';
import { parseUnit } from '../../../core/units/index.ts';

const span = { start: 0, end: 0 };
const operators = fc.constantFrom('+', '-', '*', '/', '^');
const comparisons = fc.constantFrom('<', '<=', '>', '>=', '==', '!=');
const numberText = fc.constantFrom('0', '1', '2', '.5', '12.', '3.25', '1e-5', '7E2');
const unit = fc.option(
  fc.constantFrom('mm', 'kg/m^3', '1/s', 'g*mm^2', 'deg', 'in', '1/mm/s', 'lbf*s^2/ft').map(parseUnit),
  { nil: undefined },
);

/** Trees that the grammar can write, dimensions aside. */
export const randomAst: fc.Arbitrary<Ast> = fc.letrec<{ tree: Ast }>((tie) => ({
  tree: fc.oneof(
    { depthSize: 'small', withCrossShrink: true },
    fc
      .record({ kind: fc.constant('number' as const), text: numberText, unit })
      .map((node): Ast => ({ ...node, ...span })),
    fc
      .constantFrom('boom', 'wall', 'pi', 'centre.x', '_a1')
      .map((name): Ast => ({ kind: 'name', name, ...span })),
    tie('tree').map((operand): Ast => ({ kind: 'negate', operand, ...span })),
    tie('tree').map((operand): Ast => ({ kind: 'percent', operand, ...span })),
    fc
      .tuple(operators, tie('tree'), tie('tree'))
      .map(([operator, left, right]): Ast => ({ kind: 'binary', operator, left, right, ...span })),
    fc
      .tuple(comparisons, tie('tree'), tie('tree'))
      .map(([operator, left, right]): Ast => ({ kind: 'compare', operator, left, right, ...span })),
    fc
      .tuple(fc.constantFrom('min', 'hypot', 'max'), fc.array(tie('tree'), { minLength: 2, maxLength: 3 }))
      .map(([name, list]): Ast => ({ kind: 'call', name, arguments: list, ...span })),
    tie('tree').map((argument): Ast => ({ kind: 'call', name: 'sqrt', arguments: [argument], ...span })),
  ),
})).tree;

/** A tree with its places taken out. */
export function withoutPlaces(value: unknown): unknown {
  return JSON.parse(
    JSON.stringify(value, (key, part) =>
      key === 'start' || key === 'end' ? undefined : unitName(key, part),
    ),
  );
}

const unitName = (key: string, part: unknown): unknown =>
  key === 'unit' ? (part as { name: string } | undefined)?.name : part;
