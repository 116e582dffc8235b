import { ANGULAR_SPEED, type Dimension, FREQUENCY, PLAIN } from '../units/dimension.ts';
import { aDimension } from '../units/dimension-names.ts';
import { type FileUnits, unitFor } from '../units/file-units.ts';
import { withUnit } from '../units/format-quantity.ts';
import type { Ast } from './ast.ts';
import { ExpressionError, type Span } from './expression-error.ts';
import { printExpression } from './print.ts';

export const wrongDimension = (message: string, span: Span, hint?: string): ExpressionError =>
  new ExpressionError('EXPRESSION_WRONG_DIMENSION', message, span, hint);

/** The part as written, cut short for a message. */
export function quoted(ast: Ast): string {
  const text = printExpression(ast);
  return text.length <= 40 ? text : `${text.slice(0, 39)}…`;
}

/** "boom is a length" */
export const described = (ast: Ast, dimension: Dimension): string =>
  `${quoted(ast)} is ${aDimension(dimension)}`;

/**
 * How to make a part of one kind into another: a bare number takes the file's unit for that kind; undefined when there is
 * no short way.
 */
export function mendingHint(
  ast: Ast,
  found: Dimension,
  wanted: Dimension,
  units: FileUnits,
): string | undefined {
  if (found === PLAIN) {
    const unit = unitFor(wanted, units);
    const isNumber = ast.kind === 'number' && ast.unit === undefined;
    return isNumber
      ? `write ${withUnit(ast.text, unit)}`
      : `multiply ${quoted(ast)} by ${withUnit('1', unit)}`;
  }
  if (wanted === PLAIN) return `divide ${quoted(ast)} by ${withUnit('1', unitFor(found, units))}`;
  const turning = [found, wanted].every((kind) => kind === FREQUENCY || kind === ANGULAR_SPEED);
  return turning ? 'Hz is 1/s and rpm an angular speed; turns a second are rev/s' : undefined;
}
