import { unitScale } from '../units/convert.ts';
import { shiftDecimal } from '../units/decimal-text.ts';
import { PLAIN } from '../units/dimension.ts';
import { aDimension } from '../units/dimension-names.ts';
import type { FileUnits } from '../units/file-units.ts';
import { literalValue } from '../units/literal-value.ts';
import { PLAIN_UNIT, type Unit } from '../units/unit.ts';
import { findUnit } from '../units/unit-table.ts';
import type { Ast } from './ast.ts';
import { binaryNode, constantNode } from './build-checked.ts';
import { checkExpression } from './check.ts';
import type { CheckedNode } from './checked.ts';
import { compileNode, slotsRead } from './compile.ts';
import { described, mendingHint, wrongDimension } from './dimension-faults.ts';
import { explainNotFinite } from './explain-not-finite.ts';
import { ConstantExpression, type Expression } from './expression.ts';
import { ExpressionError } from './expression-error.ts';
import type { Lookup } from './lookup.ts';
import { parseExpression } from './parser.ts';

/** The unit that a bare number takes in a field, which also gives the kind that the field wants. */
export type FieldUnit = Unit;

/** Most texts in a large machine: a number, or a number with one unit. They need no tree. */
const BARE_NUMBER = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/;
const NUMBER_AND_UNIT = /^([+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?) *([A-Za-z/][^()]*)$/;
const LONGEST_SIMPLE = 100;

/** Compound units met after a number, by their text; what follows a number means the same after any other. */
const unitTexts = new Map<string, Unit>();

/**
 * Reads, checks and compiles an expression. A bare number, or an expression of plain numbers, takes the field's unit;
 * a literal is then the double nearest to its SI value.
 *
 * @param field the unit of bare numbers and the kind wanted; null where any kind will do (a parameter)
 * @param units the file's, for hints
 * @throws ExpressionError of every code but PARAMETER_CIRCLE
 */
export function compileExpression(
  text: string,
  field: FieldUnit | null,
  lookup: Lookup,
  units: FileUnits,
): Expression {
  if (text.length > LONGEST_SIMPLE) return compileAst(parseExpression(text), field, lookup, units);
  if (BARE_NUMBER.test(text)) return compileNumber(text, field ?? PLAIN_UNIT);
  const pair = NUMBER_AND_UNIT.exec(text);
  if (pair === null) return compileAst(parseExpression(text), field, lookup, units);
  const [, number, unitText] = pair as unknown as [string, string, string];
  const unit = findUnit(unitText) ?? unitTexts.get(unitText);
  if (unit !== undefined && (field === null || field.dimension === unit.dimension))
    return compileNumber(number, unit);
  const ast = parseExpression(text);
  if (ast.kind === 'number' && ast.unit !== undefined) rememberUnit(unitText, ast.unit);
  return compileAst(ast, field, lookup, units);
}

function rememberUnit(text: string, unit: Unit): void {
  if (unitTexts.size >= 1000) unitTexts.clear();
  unitTexts.set(text, unit);
}

function compileNumber(text: string, unit: Unit): Expression {
  const value = signedLiteral(text, unit);
  if (!Number.isFinite(value)) throw tooLarge(text.length);
  return new ConstantExpression(value, unit.dimension);
}

function signedLiteral(text: string, unit: Unit): number {
  if (unit.decimalExponent !== undefined) return shiftDecimal(text, unit.decimalExponent);
  if (text.startsWith('-')) return -literalValue(text.slice(1), unit);
  return literalValue(text.startsWith('+') ? text.slice(1) : text, unit);
}

const tooLarge = (length: number): ExpressionError =>
  new ExpressionError('EXPRESSION_NOT_FINITE', 'this is larger than any number the machine can hold', {
    start: 0,
    end: length,
  });

/** As `compileExpression`, for a text already read. */
export function compileAst(ast: Ast, field: FieldUnit | null, lookup: Lookup, units: FileUnits): Expression {
  const checked = checkExpression(ast, lookup, units);
  const root = field === null ? checked : inField(ast, checked, field, units);
  const isPercentage = unsigned(ast).kind === 'percent';
  const reads = slotsRead(root);
  if (reads.length === 0) {
    const value = compileNode(root)([], 0);
    if (!Number.isFinite(value)) throw explainNotFinite(root, [])!;
    return new ConstantExpression(value, root.dimension, isPercentage);
  }
  const run = compileNode(root);
  const evaluate = (parameters: ArrayLike<number>, base = 0): number => run(parameters, base);
  return { dimension: root.dimension, constant: undefined, reads, isPercentage, root, evaluate };
}

/** The tree with the field's unit given to a plain number. */
function inField(ast: Ast, checked: CheckedNode, field: FieldUnit, units: FileUnits): CheckedNode {
  const wanted = field.dimension;
  if (checked.dimension !== PLAIN || wanted === PLAIN) {
    if (checked.dimension === wanted) return checked;
    throw wrongDimension(
      `expected ${aDimension(wanted)}, and ${described(ast, checked.dimension)}`,
      ast,
      mendingHint(ast, checked.dimension, wanted, units),
    );
  }
  const literal = literalInField(ast, field);
  if (literal !== undefined) return constantNode(literal, wanted, ast);
  const { divide, by } = unitScale(field);
  return binaryNode(divide ? 'divide' : 'multiply', checked, constantNode(by, PLAIN, ast), wanted, ast);
}

/** The exact value of a bare literal, signs before it included; undefined for anything else. */
function literalInField(ast: Ast, field: FieldUnit): number | undefined {
  if (ast.kind === 'negate') {
    const inner = literalInField(ast.operand, field);
    return inner === undefined ? undefined : -inner;
  }
  return ast.kind === 'number' && ast.unit === undefined ? literalValue(ast.text, field) : undefined;
}

const unsigned = (ast: Ast): Ast => (ast.kind === 'negate' ? unsigned(ast.operand) : ast);
