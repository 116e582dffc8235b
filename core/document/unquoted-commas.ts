import type { Fault } from '../errors.ts';
import type { Places } from '../yaml/places.ts';
import type { PathStep, YamlValue } from '../yaml/value.ts';
import { shorten } from './words.ts';

/** An expression that its own commas have torn into pieces, as in `[ max(a, b), 0 ]`. */
export interface TornExpression {
  /** The list or mapping that holds the pieces. */
  owner: readonly PathStep[];
  /** The first piece: an item, or a value of a mapping. */
  first: PathStep;
  /** Keys that are pieces themselves, in a mapping. */
  pieces: readonly string[];
  /** The expression as it was meant. */
  whole: string;
}

/** Finds every torn expression in the data. */
export function findTorn(root: YamlValue): TornExpression[] {
  const torn: TornExpression[] = [];
  const seen = new Set<object>();
  const visit = (value: YamlValue, path: PathStep[]) => {
    if (typeof value === 'string' || seen.has(value)) return;
    seen.add(value);
    torn.push(
      ...(Array.isArray(value) ? tornInList(value, path) : tornInMapping(Object.entries(value), path)),
    );
    for (const [key, child] of Object.entries(value))
      visit(child, [...path, Array.isArray(value) ? Number(key) : key]);
  };
  visit(root, []);
  return torn;
}

/** The fault of a torn expression. */
export function tornFault(torn: TornExpression, places: Places): Fault {
  const whole = shorten(torn.whole);
  return {
    code: 'YAML_UNQUOTED_COMMA',
    message: `the comma in ${whole} splits it here, inside [ ] or { }`,
    ...places.markOf([...torn.owner, torn.first]),
    hint: `quote the expression: "${whole}"`,
  };
}

/** How many more parentheses open than close; NaN when one closes that was not opened. */
function openParentheses(text: string, before = 0): number {
  let open = before;
  for (const character of text) {
    if (character === '(') open++;
    else if (character === ')' && --open < 0) return Number.NaN;
  }
  return open;
}

/** Whether a text begins a call or group that it does not close. */
export function isTornOpen(text: string): boolean {
  return openParentheses(text) > 0;
}

function tornInList(items: readonly YamlValue[], owner: readonly PathStep[]): TornExpression[] {
  const torn: TornExpression[] = [];
  for (let i = 0; i < items.length; i++) {
    const piece = items[i]!;
    if (typeof piece !== 'string' || !isTornOpen(piece)) continue;
    const last = closingPiece(piece, items.slice(i + 1));
    if (last < 0) continue;
    const whole = items.slice(i, i + last + 2).join(', ');
    torn.push({ owner, first: i, pieces: [], whole });
    i += last + 1;
  }
  return torn;
}

function tornInMapping(
  entries: readonly [string, YamlValue][],
  owner: readonly PathStep[],
): TornExpression[] {
  const torn: TornExpression[] = [];
  for (const [i, [key, value]] of entries.entries()) {
    if (typeof value !== 'string' || !isTornOpen(value)) continue;
    const after = entries.slice(i + 1);
    const end = after.findIndex(([, text]) => text !== '');
    const pieces = (end < 0 ? after : after.slice(0, end)).map(([name]) => name);
    const last = closingPiece(value, pieces);
    if (last < 0) continue;
    const used = pieces.slice(0, last + 1);
    torn.push({ owner, first: key, pieces: used, whole: [value, ...used].join(', ') });
  }
  return torn;
}

/** The first following piece that closes every parenthesis, else -1. */
function closingPiece(first: string, following: readonly YamlValue[]): number {
  let open = openParentheses(first);
  for (const [i, piece] of following.entries()) {
    if (typeof piece !== 'string') return -1;
    open = openParentheses(piece, open);
    if (Number.isNaN(open)) return -1;
    if (open === 0) return i;
  }
  return -1;
}
