import type { Unit } from '../units/unit.ts';
import type { Span } from './expression-error.ts';
import type { FunctionName } from './vocabulary.ts';

export type BinaryOperator = '+' | '-' | '*' | '/' | '^';
export type Comparison = '<' | '<=' | '>' | '>=' | '==' | '!=';

export interface NumberAst extends Span {
  readonly kind: 'number';
  /** The unsigned decimal as written. */
  readonly text: string;
  /** Undefined for a bare number. */
  readonly unit: Unit | undefined;
}
export interface NameAst extends Span {
  readonly kind: 'name';
  /** A parameter or a dotted quantity; "pi" too. */
  readonly name: string;
}
export interface NegateAst extends Span {
  readonly kind: 'negate';
  readonly operand: Ast;
}
export interface PercentAst extends Span {
  readonly kind: 'percent';
  readonly operand: Ast;
}
export interface BinaryAst extends Span {
  readonly kind: 'binary';
  readonly operator: BinaryOperator;
  readonly left: Ast;
  readonly right: Ast;
}
export interface CompareAst extends Span {
  readonly kind: 'compare';
  readonly operator: Comparison;
  readonly left: Ast;
  readonly right: Ast;
}
export interface CallAst extends Span {
  readonly kind: 'call';
  readonly name: FunctionName;
  readonly arguments: readonly Ast[];
}

/** An expression as written, parentheses and unary plus dropped. Spans are offsets in its text and include
 * a part's own parentheses, but for a name's. */
export type Ast = NumberAst | NameAst | NegateAst | PercentAst | BinaryAst | CompareAst | CallAst;

/** The nodes one step down, in the order of the text. */
export function childrenOf(ast: Ast): readonly Ast[] {
  switch (ast.kind) {
    case 'number':
    case 'name':
      return [];
    case 'negate':
    case 'percent':
      return [ast.operand];
    case 'binary':
    case 'compare':
      return [ast.left, ast.right];
    case 'call':
      return ast.arguments;
  }
}
