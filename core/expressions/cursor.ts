import { type ExpressionError, type Span, syntaxError } from './expression-error.ts';
import { type Token, tokenize } from './tokenizer.ts';

/** Deepest nesting of parentheses, calls, signs and powers. */
export const DEEPEST_NESTING = 100;

/** A place among the tokens of a text, moved on by the parser. */
export interface Cursor {
  readonly tokens: readonly Token[];
  at: number;
  depth: number;
}

export const startOf = (text: string): Cursor => ({ tokens: tokenize(text), at: 0, depth: 0 });

/** The token `ahead` places on; the end token past the last. */
export const peek = (cursor: Cursor, ahead = 0): Token =>
  cursor.tokens[Math.min(cursor.at + ahead, cursor.tokens.length - 1)]!;

/** The token before the cursor, if any. */
export const previous = (cursor: Cursor): Token | undefined => cursor.tokens[cursor.at - 1];

export const isSymbol = (token: Token, text: string): boolean =>
  token.kind === 'symbol' && token.text === text;

/** Takes the next token when it is that symbol. */
export function take(cursor: Cursor, symbol: string): Token | undefined {
  const token = peek(cursor);
  if (!isSymbol(token, symbol)) return undefined;
  cursor.at++;
  return token;
}

/** Takes the next token when it is one of those symbols. */
export function takeOneOf<T extends string>(cursor: Cursor, symbols: readonly T[]): T | undefined {
  const token = peek(cursor);
  if (token.kind !== 'symbol' || !(symbols as readonly string[]).includes(token.text)) return undefined;
  cursor.at++;
  return token.text as T;
}

/** Runs a rule one level deeper. @throws ExpressionError EXPRESSION_SYNTAX past DEEPEST_NESTING levels */
export function nested<T>(cursor: Cursor, span: Span, rule: (cursor: Cursor) => T): T {
  if (++cursor.depth > DEEPEST_NESTING)
    throw syntaxError(`an expression nests at most ${DEEPEST_NESTING} levels deep`, span);
  const result = rule(cursor);
  cursor.depth--;
  return result;
}

/** The fault of a token that cannot stand where a value should. */
export function valueExpected(cursor: Cursor): ExpressionError {
  const token = peek(cursor);
  const before = previous(cursor);
  const after = before === undefined ? '' : ` after "${before.text}"`;
  if (token.kind === 'end') {
    const span = { start: before?.start ?? 0, end: before?.end ?? token.end };
    return syntaxError(before === undefined ? 'there is no expression' : `a value is missing${after}`, span);
  }
  const power = before?.text === '*' && token.text === '*';
  return syntaxError(
    `"${token.text}" stands where a value should${after}`,
    token,
    power ? 'a power is written ^' : undefined,
  );
}
