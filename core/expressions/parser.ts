import { findUnit } from '../units/unit-table.ts';
import type { Ast, BinaryOperator, Comparison } from './ast.ts';
import { type Cursor, isSymbol, nested, peek, startOf, take, takeOneOf, valueExpected } from './cursor.ts';
import { ExpressionError, syntaxError } from './expression-error.ts';
import { parseNumber } from './parse-number.ts';
import { checkCount, leftOver, unknownFunction } from './parser-faults.ts';
import type { Token } from './tokenizer.ts';
import { isFunctionName } from './vocabulary.ts';

// The grammar. Blanks may stand between any two tokens.
//
//   expression = sum [ ("<" | "<=" | ">" | ">=" | "==" | "!=") sum ]
//   sum        = product { ("+" | "-") product }
//   product    = signed { ("*" | "/") signed }
//   signed     = ("-" | "+") signed | power
//   power      = percent [ "^" signed ]                      -- right-associative; -2^2 is -(2^2), 2^-2 is 2^(-2)
//   percent    = value [ "%" ]
//   value      = NUMBER [ unit ] | NAME | FUNCTION "(" expression { "," expression } ")" | "(" expression ")"
//   unit       = [ "/" ] UNIT [ "^" whole ] { ("*" | "/") UNIT [ "^" whole ] }
//   whole      = [ "-" ] DIGITS
//   NAME       = word { "." word }     word = a letter or "_", then letters, digits, "_"
//
// A unit is taken as far as it goes: `*` and `/` belong to it when a UNIT follows. A comparison gives a truth value,
// which only the first argument of `if` takes (the dimension check sees to that).

/**
 * Reads an expression.
 *
 * @throws ExpressionError EXPRESSION_SYNTAX, EXPRESSION_TOO_LONG, EXPRESSION_UNKNOWN_UNIT, EXPRESSION_UNKNOWN_NAME (of a
 *   function), EXPRESSION_UNIT_WITHOUT_NUMBER
 */
export function parseExpression(text: string): Ast {
  const known = parsed.get(text);
  if (known !== undefined) return known;
  const cursor = startOf(text);
  const ast = parseComparison(cursor);
  if (peek(cursor).kind !== 'end') throw leftOver(cursor);
  if (parsed.size >= 5000) parsed.clear();
  parsed.set(text, ast);
  return ast;
}

/** Trees are immutable, and machines repeat themselves: the trees of the last texts, by text. */
const parsed = new Map<string, Ast>();

const COMPARISONS: readonly Comparison[] = ['<', '<=', '>', '>=', '==', '!='];

function parseComparison(cursor: Cursor): Ast {
  const left = parseSum(cursor);
  const operator = takeOneOf(cursor, COMPARISONS);
  if (operator === undefined) return left;
  const right = parseSum(cursor);
  const next = peek(cursor);
  if ((COMPARISONS as readonly string[]).includes(next.text))
    throw syntaxError('comparisons do not chain', next, 'write if(a < b, if(b < c, …), …)');
  return { kind: 'compare', operator, left, right, start: left.start, end: right.end };
}

function parseSum(cursor: Cursor): Ast {
  return parseLeftToRight(cursor, ['+', '-'], parseProduct);
}

function parseProduct(cursor: Cursor): Ast {
  return parseLeftToRight(cursor, ['*', '/'], parseSigned);
}

function parseLeftToRight(
  cursor: Cursor,
  operators: readonly BinaryOperator[],
  rule: (c: Cursor) => Ast,
): Ast {
  let left = rule(cursor);
  for (let op = takeOneOf(cursor, operators); op !== undefined; op = takeOneOf(cursor, operators)) {
    const right = rule(cursor);
    left = { kind: 'binary', operator: op, left, right, start: left.start, end: right.end };
  }
  return left;
}

function parseSigned(cursor: Cursor): Ast {
  const sign = peek(cursor);
  if (!isSymbol(sign, '-') && !isSymbol(sign, '+')) return parsePower(cursor);
  cursor.at++;
  const operand = nested(cursor, sign, parseSigned);
  if (sign.text === '+') return widened(operand, sign.start, operand.end);
  return { kind: 'negate', operand, start: sign.start, end: operand.end };
}

function parsePower(cursor: Cursor): Ast {
  const left = parsePercent(cursor);
  const sign = take(cursor, '^');
  if (sign === undefined) return left;
  const right = nested(cursor, sign, parseSigned);
  return { kind: 'binary', operator: '^', left, right, start: left.start, end: right.end };
}

function parsePercent(cursor: Cursor): Ast {
  const operand = parseValue(cursor);
  const sign = take(cursor, '%');
  return sign === undefined ? operand : { kind: 'percent', operand, start: operand.start, end: sign.end };
}

function parseValue(cursor: Cursor): Ast {
  const token = peek(cursor);
  if (token.kind === 'number') return parseNumber(cursor);
  if (token.kind === 'name') return isSymbol(peek(cursor, 1), '(') ? parseCall(cursor) : parseName(cursor);
  if (!isSymbol(token, '(')) throw valueExpected(cursor);
  cursor.at++;
  const inner = nested(cursor, token, parseComparison);
  const end = closeParenthesis(cursor, token);
  return widened(inner, token.start, end);
}

/** A part with the parentheses or the plus that it was written with; the place of a name stays the name's. */
const widened = (ast: Ast, start: number, end: number): Ast =>
  ast.kind === 'name' ? ast : { ...ast, start, end };

function parseName(cursor: Cursor): Ast {
  const token = peek(cursor);
  if (findUnit(token.text) !== undefined)
    throw new ExpressionError(
      'EXPRESSION_UNIT_WITHOUT_NUMBER',
      `"${token.text}" is a unit and needs a number before it`,
      token,
      `write 1 ${token.text}`,
    );
  if (isFunctionName(token.text))
    throw syntaxError(
      `"${token.text}" is a function and needs its arguments`,
      token,
      `write ${token.text}( … )`,
    );
  cursor.at++;
  return { kind: 'name', name: token.text, start: token.start, end: token.end };
}

function parseCall(cursor: Cursor): Ast {
  const token = peek(cursor);
  const name = token.text;
  if (!isFunctionName(name)) throw unknownFunction(token);
  cursor.at++;
  const open = peek(cursor);
  cursor.at++;
  const list: Ast[] = [];
  if (!isSymbol(peek(cursor), ')'))
    do list.push(nested(cursor, open, parseComparison));
    while (take(cursor, ',') !== undefined);
  const end = closeParenthesis(cursor, open);
  checkCount(name, list.length, { start: token.start, end });
  return { kind: 'call', name, arguments: list, start: token.start, end };
}

/** Takes `)` and gives its end. */
function closeParenthesis(cursor: Cursor, open: Token): number {
  const close = take(cursor, ')');
  if (close !== undefined) return close.end;
  if (peek(cursor).kind === 'end')
    throw syntaxError('this parenthesis is not closed', open, 'write the missing )');
  throw leftOver(cursor);
}
