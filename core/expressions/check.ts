import { shiftDecimal } from '../units/decimal-text.ts';
import { PLAIN, productDimension } from '../units/dimension.ts';
import type { FileUnits } from '../units/file-units.ts';
import { literalValue } from '../units/literal-value.ts';
import { PLAIN_UNIT } from '../units/unit.ts';
import type { Ast, BinaryAst, CallAst, CompareAst, NameAst, NumberAst, PercentAst } from './ast.ts';
import { binaryNode, choiceNode, constantNode, unaryNode } from './build-checked.ts';
import { checkCall } from './check-call.ts';
import type { CheckContext } from './check-context.ts';
import { checkPower } from './check-power.ts';
import type { CheckedNode } from './checked.ts';
import { described, wrongDimension } from './dimension-faults.ts';
import { type Lookup, unknownName } from './lookup.ts';
import { sameDimension } from './same-dimension.ts';

/**
 * Checks names and dimensions and gives the tree in SI, constants folded.
 *
 * @param units the file's, for hints alone
 * @throws ExpressionError EXPRESSION_UNKNOWN_NAME, EXPRESSION_WRONG_DIMENSION
 */
export function checkExpression(ast: Ast, lookup: Lookup, units: FileUnits): CheckedNode {
  const context: CheckContext = { lookup, units, check: (part) => checkPart(part, context) };
  return checkPart(ast, context);
}

function checkPart(ast: Ast, context: CheckContext): CheckedNode {
  switch (ast.kind) {
    case 'number':
      return checkNumber(ast);
    case 'name':
      return checkName(ast, context);
    case 'negate': {
      const operand = context.check(ast.operand);
      return unaryNode('negate', operand, operand.dimension, ast);
    }
    case 'percent':
      return checkPercent(ast, context);
    case 'binary':
      return checkBinary(ast, context);
    case 'compare':
      throw wrongDimension(
        'a comparison is true or false, and a number is wanted here',
        ast,
        'a comparison stands first in if(condition, value when true, value when false)',
      );
    case 'call':
      return ast.name === 'if' ? checkIf(ast, context) : checkCall(ast, ast.name, context);
  }
}

function checkNumber(ast: NumberAst): CheckedNode {
  const unit = ast.unit ?? PLAIN_UNIT;
  return constantNode(literalValue(ast.text, unit), unit.dimension, ast);
}

function checkName(ast: NameAst, { lookup }: CheckContext): CheckedNode {
  if (ast.name === 'pi') return constantNode(Math.PI, PLAIN, ast);
  const symbol = lookup(ast.name);
  if (symbol === undefined) throw unknownName(ast, lookup);
  return {
    kind: 'parameter',
    slot: symbol.slot,
    dimension: symbol.dimension,
    start: ast.start,
    end: ast.end,
  };
}

function checkPercent(ast: PercentAst, context: CheckContext): CheckedNode {
  const { operand } = ast;
  const checked = context.check(operand);
  if (checked.dimension !== PLAIN)
    throw wrongDimension(
      `a percentage is of a plain number, and ${described(operand, checked.dimension)}`,
      ast,
    );
  if (operand.kind === 'number') return constantNode(shiftDecimal(operand.text, -2), PLAIN, ast);
  return binaryNode('divide', checked, constantNode(100, PLAIN, ast), PLAIN, ast);
}

function checkBinary(ast: BinaryAst, context: CheckContext): CheckedNode {
  if (ast.operator === '^') return checkPower(ast, context);
  const left = context.check(ast.left);
  const right = context.check(ast.right);
  if (ast.operator === '+' || ast.operator === '-') {
    const [a, b] = sameDimension(`"${ast.operator}"`, [ast.left, ast.right], [left, right], context);
    return binaryNode(ast.operator === '+' ? 'add' : 'subtract', a!, b!, a!.dimension, ast);
  }
  const dimension = productDimension(left.dimension, right.dimension, ast.operator === '*' ? 1 : -1);
  if (dimension === undefined) throw wrongDimension('the powers of the units go past 100', ast);
  return binaryNode(ast.operator === '*' ? 'multiply' : 'divide', left, right, dimension, ast);
}

function checkIf(ast: CallAst, context: CheckContext): CheckedNode {
  const [condition, whenTrue, whenFalse] = ast.arguments as [Ast, Ast, Ast];
  if (condition.kind !== 'compare')
    throw wrongDimension('the condition of if is a comparison', condition, 'compare with < <= > >= == or !=');
  const compared = checkCompare(condition, context);
  const parts = [context.check(whenTrue), context.check(whenFalse)];
  const [a, b] = sameDimension('if', [whenTrue, whenFalse], parts, context);
  return choiceNode(condition.operator, compared, [a!, b!], ast);
}

function checkCompare(ast: CompareAst, context: CheckContext): [CheckedNode, CheckedNode] {
  const parts = [context.check(ast.left), context.check(ast.right)];
  const [a, b] = sameDimension(`"${ast.operator}"`, [ast.left, ast.right], parts, context);
  return [a!, b!];
}
