import { nearestName } from '../nearest-name.ts';
import { findUnit } from '../units/unit-table.ts';
import { type Cursor, peek, previous } from './cursor.ts';
import { ExpressionError, type Span, syntaxError } from './expression-error.ts';
import type { Token } from './tokenizer.ts';
import { argumentCounts, FUNCTION_NAMES, type FunctionName } from './vocabulary.ts';

/** @throws ExpressionError EXPRESSION_SYNTAX when a function does not take that many arguments */
export function checkCount(name: FunctionName, count: number, span: Span): void {
  const { fewest, most } = argumentCounts(name);
  if (count >= fewest && count <= most) return;
  const wanted = most === fewest ? `${fewest}` : `at least ${fewest}`;
  const noun = wanted === '1' ? 'argument' : 'arguments';
  const hint = name === 'if' ? 'write if(condition, value when true, value when false)' : undefined;
  throw syntaxError(`${name} takes ${wanted} ${noun}, not ${count}`, span, hint);
}

/** The fault of a call of something that is no function. */
export function unknownFunction(token: Token): ExpressionError {
  if (findUnit(token.text) !== undefined || token.text === 'pi')
    return syntaxError(`"${token.text}" is not a function`, token, 'to multiply, write *');
  const near = nearestName(token.text, FUNCTION_NAMES);
  const hint = near === undefined ? `the functions are ${FUNCTION_NAMES.join(' ')}` : `did you mean ${near}?`;
  return new ExpressionError('EXPRESSION_UNKNOWN_NAME', `there is no function "${token.text}"`, token, hint);
}

/** The fault of a token after a complete expression. */
export function leftOver(cursor: Cursor): ExpressionError {
  const token = peek(cursor);
  const before = previous(cursor)!.text;
  if (token.text === ',')
    return syntaxError(
      'a comma stands only between arguments of a function',
      token,
      'the decimal mark is a point',
    );
  if (token.text === ')') return syntaxError('this parenthesis was never opened', token);
  if (before === '%')
    return syntaxError(`an operator is missing before "${token.text}"`, token, '% means per cent');
  return syntaxError(
    `an operator is missing before "${token.text}"`,
    token,
    `to multiply, write ${before} * ${token.text}`,
  );
}
