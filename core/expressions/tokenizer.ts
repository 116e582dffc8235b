import { ExpressionError, type Span, syntaxError } from './expression-error.ts';
import { composedName } from './vocabulary.ts';

export interface Token extends Span {
  readonly kind: 'number' | 'name' | 'symbol' | 'end';
  /** As written; names in Unicode's composed form. */
  readonly text: string;
}

/** Longest text of one expression, in UTF-16 code units. */
export const LONGEST_TEXT = 2000;

const NUMBER = String.raw`(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?`;
const WORD = String.raw`[\p{L}_][\p{L}\p{M}\p{Nd}_]*`;
const SYMBOL = `<=|>=|==|!=|[-+*/^%(),<>]`;
const TOKEN = new RegExp(String.raw`\s*(?:(${NUMBER})|(${WORD}(?:\.${WORD})*)|(${SYMBOL}))`, 'uy');
const BLANK = /\s*/y;

/**
 * Cuts a text into numbers, names (dotted ones are one token) and symbols; the last token is the end.
 *
 * @throws ExpressionError EXPRESSION_TOO_LONG, EXPRESSION_SYNTAX
 */
export function tokenize(text: string): Token[] {
  if (text.length > LONGEST_TEXT)
    throw new ExpressionError(
      'EXPRESSION_TOO_LONG',
      `an expression has at most ${LONGEST_TEXT} characters; this one has ${text.length}`,
      { start: LONGEST_TEXT, end: text.length },
      'give parts of it names among the parameters',
    );
  const tokens: Token[] = [];
  let at = 0;
  for (;;) {
    TOKEN.lastIndex = at;
    const match = TOKEN.exec(text);
    if (match === null) break;
    at = TOKEN.lastIndex;
    tokens.push(tokenOf(match, at));
  }
  BLANK.lastIndex = at;
  BLANK.exec(text);
  if (BLANK.lastIndex < text.length) throw strayCharacter(text, BLANK.lastIndex);
  tokens.push({ kind: 'end', text: '', start: text.trimEnd().length, end: text.length });
  return tokens;
}

function tokenOf(match: RegExpExecArray, end: number): Token {
  const [, number, name, symbol] = match;
  if (number !== undefined) return { kind: 'number', text: number, start: end - number.length, end };
  if (name !== undefined) return { kind: 'name', text: composedName(name), start: end - name.length, end };
  return { kind: 'symbol', text: symbol!, start: end - symbol!.length, end };
}

/** Characters people type for something the language writes otherwise. */
const INSTEAD = new Map([
  ['−', '-'],
  ['–', '-'],
  ['×', '*'],
  ['·', '*'],
  ['⋅', '*'],
  ['÷', '/'],
  ['²', '^2'],
  ['³', '^3'],
  ['√', 'sqrt( )'],
  ['°', 'deg'],
  ['≤', '<='],
  ['≥', '>='],
  ['≠', '!='],
  ['=', '=='],
  ['[', '('],
  ['{', '('],
  [']', ')'],
  ['}', ')'],
]);

function strayCharacter(text: string, start: number): ExpressionError {
  const character = String.fromCodePoint(text.codePointAt(start)!);
  const instead = INSTEAD.get(character);
  const span = { start, end: start + character.length };
  const hint = instead === undefined ? undefined : `write ${instead}`;
  return syntaxError(`"${character}" has no meaning in an expression`, span, hint);
}
