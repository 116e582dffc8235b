/** Columns that a text takes in a terminal: none for marks that combine, two for wide writing and pictures. */
export function textWidth(text: string): number {
  if (/^[\x20-\x7e]*$/.test(text)) return text.length;
  let width = 0;
  for (const c of text) width += charWidth(c);
  return width;
}

const COMBINES = /^[\p{Mn}\p{Me}]$/u;
const PICTURE = /^\p{Emoji_Presentation}$/u;
const WIDE: readonly (readonly [number, number])[] = [
  [0x1100, 0x115f],
  [0x2e80, 0x303e],
  [0x3041, 0x4dbf],
  [0x4e00, 0xa4cf],
  [0xa960, 0xa97f],
  [0xac00, 0xd7a3],
  [0xf900, 0xfaff],
  [0xfe10, 0xfe19],
  [0xfe30, 0xfe6f],
  [0xff00, 0xff60],
  [0xffe0, 0xffe6],
  [0x16fe0, 0x18aff],
  [0x1b000, 0x1b2ff],
  [0x1f200, 0x1f2ff],
  [0x20000, 0x3fffd],
];

function charWidth(c: string): number {
  const code = c.codePointAt(0)!;
  if (code < 0x300) return 1;
  if (COMBINES.test(c)) return 0;
  return PICTURE.test(c) || WIDE.some(([from, to]) => code >= from && code <= to) ? 2 : 1;
}

export const padEnd = (text: string, width: number) =>
  text + ' '.repeat(Math.max(0, width - textWidth(text)));
export const padStart = (text: string, width: number) =>
  ' '.repeat(Math.max(0, width - textWidth(text))) + text;

/**
 * Lines no wider than `width`, the first no wider than `firstWidth`, broken at spaces, and inside a word only where it
 * alone is wider.
 */
export function wrap(text: string, width: number, firstWidth = width): string[] {
  const lines: string[] = [];
  const room = () => (lines.length === 0 ? firstWidth : width);
  let line: string | undefined;
  for (const word of text.split(' ')) {
    if (line !== undefined && textWidth(line) + 1 + textWidth(word) <= room()) {
      line += ` ${word}`;
      continue;
    }
    if (line !== undefined) lines.push(line);
    line = word;
    while (textWidth(line) > room()) {
      const [head, tail]: [string, string] = splitAt(line, room());
      lines.push(head);
      line = tail;
    }
  }
  lines.push(line ?? '');
  return lines;
}

function splitAt(text: string, width: number): [string, string] {
  let taken = '';
  let used = 0;
  for (const c of text) {
    const w = charWidth(c);
    if (used + w > width && taken !== '') break;
    taken += c;
    used += w;
  }
  return [taken, text.slice(taken.length)];
}
