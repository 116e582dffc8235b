import { TextError } from '../units/text-error.ts';

/**
 * What is wrong with an expression, with offsets in its text. Codes: EXPRESSION_SYNTAX, EXPRESSION_TOO_LONG,
 * EXPRESSION_UNKNOWN_NAME, EXPRESSION_UNKNOWN_UNIT, EXPRESSION_UNIT_WITHOUT_NUMBER, EXPRESSION_WRONG_DIMENSION,
 * EXPRESSION_NOT_FINITE and PARAMETER_CIRCLE.
 */
export class ExpressionError extends TextError {
  override readonly name = 'ExpressionError';
}

/** A part of an expression's text: UTF-16 offsets, end past the last character. */
export interface Span {
  readonly start: number;
  readonly end: number;
}

export const syntaxError = (message: string, span: Span, hint?: string): ExpressionError =>
  new ExpressionError('EXPRESSION_SYNTAX', message, span, hint);
