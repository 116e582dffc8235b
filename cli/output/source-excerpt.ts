import { textWidth } from './text-width.ts';

/** The part of a source line that shows its faulty text, with where the carets stand under it. */
export interface Excerpt {
  readonly text: string;
  readonly indent: number;
  readonly carets: number;
}

const TAB = '    ';
/** Columns of context kept to the left of the fault as long as there is room for the fault itself. */
const CONTEXT = 20;

/**
 * @param column of the faulty text, from 1, in UTF-16 code units
 * @param length of the faulty text in the same units
 * @param room columns there are
 * @param plain makes a text safe to print
 * @param more stands where the line goes on
 */
export function excerptOf(
  source: string,
  column: number,
  length: number,
  room: number,
  plain: (text: string) => string,
  more: string,
): Excerpt {
  const start = Math.min(Math.max(0, column - 1), source.length);
  const end = Math.min(source.length, start + Math.max(1, length));
  // No more of the line can be seen than this, however long it is.
  const from = Math.max(0, start - room);
  const to = Math.min(source.length, start + room);
  const cells = cellsOf(source.slice(from, to), from, plain);
  const index = (offset: number) => {
    const found = cells.findIndex((cell) => cell.to > offset);
    return found < 0 ? cells.length : found;
  };
  const first = index(start);
  const past = Math.max(first + 1, index(end));
  const width = (a: number, b: number) => cells.slice(a, b).reduce((sum, cell) => sum + cell.width, 0);
  let [left, right] = [0, cells.length];
  const headOf = () => (left > 0 || from > 0 ? more : '');
  const tailOf = () => (right < cells.length || to < source.length ? more : '');
  const tooWide = () => headOf().length + width(left, right) + tailOf().length > room;
  while (left < first && width(left, first) > CONTEXT && tooWide()) left++;
  while (right > past && tooWide()) right--;
  while (left < first && tooWide()) left++;
  while (right > first + 1 && tooWide()) right--;
  const shown = cells.slice(left, right).map((cell) => cell.text);
  return {
    text: headOf() + shown.join('') + tailOf(),
    indent: headOf().length + width(left, first),
    carets: Math.max(1, width(first, Math.min(past, right))),
  };
}

interface SourceCell {
  readonly text: string;
  readonly width: number;
  /** Offset past it in the source line. */
  readonly to: number;
}

function cellsOf(source: string, from: number, plain: (text: string) => string): SourceCell[] {
  let to = from;
  return [...source].map((c) => {
    to += c.length;
    const text = c === '\t' ? TAB : plain(c);
    return { text, width: textWidth(text), to };
  });
}
