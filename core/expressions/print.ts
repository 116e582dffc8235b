import { withUnit } from '../units/format-quantity.ts';
import type { Ast, BinaryOperator } from './ast.ts';

/** How tightly each rule of the grammar binds. */
const COMPARE = 0;
const SUM = 1;
const PRODUCT = 2;
const SIGNED = 3;
const POWER = 4;
const PERCENT = 5;
const VALUE = 6;

const RULE: Record<BinaryOperator, number> = { '+': SUM, '-': SUM, '*': PRODUCT, '/': PRODUCT, '^': POWER };

/** An expression as text with no more parentheses than needed; reading it gives the same tree, spans apart. */
export function printExpression(ast: Ast): string {
  switch (ast.kind) {
    case 'number':
      return ast.unit === undefined ? ast.text : withUnit(ast.text, ast.unit);
    case 'name':
      return ast.name;
    case 'negate':
      return `-${within(ast.operand, SIGNED)}`;
    case 'percent':
      return `${within(ast.operand, VALUE)} %`;
    case 'compare':
      return `${within(ast.left, SUM)} ${ast.operator} ${within(ast.right, SUM)}`;
    case 'call':
      return `${ast.name}(${ast.arguments.map(printExpression).join(', ')})`;
    case 'binary':
      return printBinary(ast.operator, ast.left, ast.right);
  }
}

function printBinary(operator: BinaryOperator, left: Ast, right: Ast): string {
  const rule = RULE[operator];
  if (operator !== '^') return `${within(left, rule)} ${operator} ${within(right, rule + 1)}`;
  // `3 mm^2` would be square millimetres.
  const base =
    left.kind === 'number' && left.unit !== undefined ? `(${printExpression(left)})` : within(left, PERCENT);
  return `${base}^${within(right, SIGNED)}`;
}

/** The text of a part, in parentheses when it binds more loosely than its place asks. */
function within(ast: Ast, rule: number): string {
  const text = printExpression(ast);
  return ruleOf(ast) < rule ? `(${text})` : text;
}

function ruleOf(ast: Ast): number {
  if (ast.kind === 'binary') return RULE[ast.operator];
  if (ast.kind === 'compare') return COMPARE;
  if (ast.kind === 'negate') return SIGNED;
  return ast.kind === 'percent' ? PERCENT : VALUE;
}
