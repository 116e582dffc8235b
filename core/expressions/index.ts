export type { Ast, BinaryOperator, Comparison } from './ast.ts';
export { checkExpression } from './check.ts';
export type { CheckedNode } from './checked.ts';
export { compileNode, type Evaluate, operandsOf, slotsRead } from './compile.ts';
export { compileAst, compileExpression, type FieldUnit } from './compile-expression.ts';
export { explainNotFinite } from './explain-not-finite.ts';
export { ConstantExpression, type Expression } from './expression.ts';
export { ExpressionError, type Span } from './expression-error.ts';
export { type Lookup, lookupIn, type SymbolInfo } from './lookup.ts';
export { type NameUse, namesIn } from './names-in.ts';
export { type NamedExpression, orderParameters, ParameterCircle } from './order-parameters.ts';
export { parseExpression } from './parser.ts';
export { printExpression } from './print.ts';
export {
  composedName,
  FUNCTION_NAMES,
  isParameterName,
  isReservedName,
  QUANTITY_NAMES,
} from './vocabulary.ts';
