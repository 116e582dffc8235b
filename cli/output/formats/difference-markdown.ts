import type { Difference } from '../../../core/difference/index.ts';
import { displayUnits } from '../../../core/figures/index.ts';
import type { RollUpRecord } from '../../../core/record/record.ts';
import { CONVENTIONS, headline, sideLines } from '../difference-report.ts';
import { type DifferenceTable, differenceTables } from '../difference-tables.ts';
import { text } from './markdown.ts';

const PARTS = 8;

/** What moved, for the page of a build. */
export function formatDifferenceMarkdown(
  d: Difference,
  later: Pick<RollUpRecord, 'conventions'>,
  options: { units?: string; quantity?: string; parts?: number } = {},
): string {
  const tables = differenceTables(d, displayUnits(later, options.units), {
    quantity: options.quantity ?? 'all',
    parts: options.parts ?? PARTS,
  });
  const lines = [`## ${text(headline(d))}`, ''];
  for (const line of [...sideLines(d), CONVENTIONS(d)]) lines.push(`- ${text(line)}`);
  return `${[...lines, ...tables.flatMap(tableLines)].join('\n')}\n`;
}

function tableLines(table: DifferenceTable): string[] {
  const row = (cells: readonly string[]) => `| ${cells.join(' | ')} |`;
  const heads = table.columns.map((c) => text(c.head) || ' ');
  const rules = table.columns.map((c) => (c.align === 'right' ? '---:' : '---'));
  return [
    '',
    `### ${text(table.title)}${table.qualifier ? ` (${text(table.qualifier)})` : ''}`,
    '',
    row(heads),
    row(rules),
    ...table.rows.map((cells) => row(cells.map((cell) => text(cell) || ' '))),
    ...table.notes.flatMap((note) => ['', text(note)]),
  ];
}
