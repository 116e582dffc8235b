/** What stands for the report's own marks where a terminal has ASCII alone. */
const ASCII: Readonly<Record<string, string>> = {
  '−': '-',
  '·': '*',
  '×': 'x',
  '∫': 'int ',
  '°': 'deg',
  '²': '^2',
  '³': '^3',
  '⁻': '^-',
  '—': '-',
  '…': '...',
  '√': 'sqrt ',
  '≤': '<=',
  '≥': '>=',
  Δ: 'change ',
  '─': '-',
  '━': '=',
  '│': '|',
  '┌': '[',
  '┐': ']',
  '└': '[',
  '┘': ']',
  '├': '|',
  '┤': '|',
  '△': '^',
  '▼': 'v',
  '○': 'o',
  '✕': 'x',
  '◐': '~',
  '→': '->',
  '’': "'",
};

const RAISED = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** A line of the report in ASCII alone; what has no likeness, a name in another writing, stands as `\u{8239}`. */
export function toAscii(text: string): string {
  return text
    .replace(
      /⁻?[⁰¹²³⁴⁵⁶⁷⁸⁹]+/gu,
      (power) => `^${[...power].map((c) => (c === '⁻' ? '-' : RAISED.indexOf(c))).join('')}`,
    )
    .replace(/ · /g, ', ')
    .replace(/[^\n\x20-\x7e]/gu, (c) => ASCII[c] ?? `\\u{${c.codePointAt(0)!.toString(16)}}`);
}
