import { LARGEST_EXPONENT } from '../units/dimension.ts';
import { compoundUnit, nearestUnitName } from '../units/parse-unit.ts';
import { TextError } from '../units/text-error.ts';
import type { Unit, UnitPower } from '../units/unit.ts';
import { findUnit } from '../units/unit-table.ts';
import type { NumberAst } from './ast.ts';
import { type Cursor, isSymbol, peek, take } from './cursor.ts';
import { ExpressionError, syntaxError } from './expression-error.ts';
import type { Token } from './tokenizer.ts';

/** A number with the longest unit that follows it; the cursor is on the number. */
export function parseNumber(cursor: Cursor): NumberAst {
  const number = peek(cursor);
  cursor.at++;
  const unit = parseUnitAfterNumber(cursor, number);
  return {
    kind: 'number',
    text: number.text,
    unit,
    start: number.start,
    end: cursor.tokens[cursor.at - 1]!.end,
  };
}

function parseUnitAfterNumber(cursor: Cursor, number: Token): Unit | undefined {
  const next = peek(cursor);
  if (next.kind === 'name' && findUnit(next.text) === undefined) throw nameAfterNumber(number, next);
  const powers: UnitPower[] = [];
  if (next.kind === 'name') powers.push(takeUnit(cursor, 1));
  for (let sign = operatorBeforeUnit(cursor); sign !== 0; sign = operatorBeforeUnit(cursor)) {
    if (sign > 0 && powers.length === 0) break;
    cursor.at++;
    powers.push(takeUnit(cursor, sign));
  }
  if (powers.length === 0) return undefined;
  const only = powers[0]!;
  if (powers.length === 1 && only.power === 1) return only.unit;
  return compound(powers, { start: next.start, end: cursor.tokens[cursor.at - 1]!.end });
}

/** 1 for `*` and −1 for `/` when a unit follows it, else 0. */
function operatorBeforeUnit(cursor: Cursor): -1 | 0 | 1 {
  const token = peek(cursor);
  const isOperator = isSymbol(token, '*') || isSymbol(token, '/');
  const name = peek(cursor, 1);
  if (!isOperator || name.kind !== 'name' || findUnit(name.text) === undefined) return 0;
  return token.text === '*' ? 1 : -1;
}

function takeUnit(cursor: Cursor, sign: 1 | -1): UnitPower {
  const name = peek(cursor);
  const unit = findUnit(name.text)!;
  cursor.at++;
  return { unit, power: take(cursor, '^') === undefined ? sign : sign * takeWholePower(cursor, name) };
}

function takeWholePower(cursor: Cursor, unit: Token): number {
  const sign = take(cursor, '-') === undefined ? 1 : -1;
  const token = peek(cursor);
  const power = token.kind === 'number' && /^\d+$/.test(token.text) ? Number(token.text) : 0;
  if (power === 0 || power > LARGEST_EXPONENT)
    throw syntaxError(
      `the power of a unit is a whole number from 1 to ${LARGEST_EXPONENT} or its negative`,
      { start: unit.start, end: token.kind === 'end' ? cursor.tokens[cursor.at - 1]!.end : token.end },
      `to raise the whole quantity to a power, put it in parentheses: (3 ${unit.text})^2`,
    );
  cursor.at++;
  return sign * power;
}

/** Compound units met so far, by the names and powers in them. */
const compounds = new Map<string, Unit>();

function compound(powers: readonly UnitPower[], span: { start: number; end: number }): Unit {
  const key = powers.map(({ unit, power }) => `${unit.name}^${power}`).join('*');
  const known = compounds.get(key);
  if (known !== undefined) return known;
  try {
    const unit = compoundUnit(powers, span);
    if (compounds.size >= 1000) compounds.clear();
    compounds.set(key, unit);
    return unit;
  } catch (error) {
    if (error instanceof TextError) throw syntaxError(error.message, error, error.hint);
    throw error;
  }
}

/** `3 boom`: either a mistyped unit or a product without its sign. */
function nameAfterNumber(number: Token, name: Token): ExpressionError {
  const near = nearestUnitName(name.text);
  const hint =
    near === undefined ? `to multiply, write ${number.text} * ${name.text}` : `did you mean ${near}?`;
  return new ExpressionError('EXPRESSION_UNKNOWN_UNIT', `"${name.text}" is not a unit`, name, hint);
}
