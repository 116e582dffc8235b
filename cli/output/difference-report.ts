import type { Difference, SideLabel } from '../../core/difference/index.ts';
import { displayUnits } from '../../core/figures/index.ts';
import type { RollUpRecord } from '../../core/record/record.ts';
import { type DifferenceOptions, differenceTables } from './difference-tables.ts';
import { createInk } from './ink.ts';
import type { TerminalOptions } from './run-report.ts';
import { Sheet } from './sheet.ts';

export interface DifferenceReportOptions extends TerminalOptions, DifferenceOptions {
  /** `file`, `si` or names such as `mm,g,deg`. */
  units?: string;
}

/**
 * What moved between two records, for the terminal.
 *
 * @param later the record of side B, in whose units figures are shown
 */
export function renderDifference(
  d: Difference,
  later: Pick<RollUpRecord, 'conventions'>,
  options: DifferenceReportOptions,
): string {
  const ink = createInk({ colour: options.colour ?? false, unicode: options.unicode ?? true });
  const sheet = new Sheet(ink, Math.max(40, options.width ?? 80));
  sheet.say(headline(d), { paint: ink.strong, hang: 2 });
  for (const line of sideLines(d)) sheet.say(line, { hang: 2 });
  sheet.say(CONVENTIONS(d), { hang: 2 });
  for (const table of differenceTables(d, displayUnits(later, options.units), options)) {
    sheet.head(table.title, table.qualifier);
    sheet.table(
      table.columns,
      table.rows.map((row) =>
        row.map((text) => ({ text, ...(text === 'now outside' ? { paint: ink.outside } : {}) })),
      ),
      table.totals > 0 ? { totals: table.totals } : {},
    );
    for (const note of table.notes) sheet.say(note, { paint: ink.soft });
  }
  return sheet.text();
}

export function headline(d: Difference): string {
  const same = d.a.assembly === d.b.assembly && d.a.state === d.b.state;
  const name = ({ assembly, state }: SideLabel) => `${assembly}, ${state}`;
  const changed = d.parts.filter((p) => p.status !== 'unchanged').length;
  const what =
    d.a.stamp === d.b.stamp ? 'nothing moved: one stamp' : `${changed} of ${d.parts.length} parts differ`;
  return `${same ? name(d.b) : `${name(d.a)} → ${name(d.b)}`}: ${what}`;
}

export const sideLines = (d: Difference): string[] =>
  (['a', 'b'] as const).map((key) => {
    const { commit, branch, stamp } = d[key];
    const from = commit ? `${commit.slice(0, 7)}${branch ? ` on ${branch}` : ''}` : 'not in git';
    return `${key.toUpperCase()} ${from} · stamp ${stamp.slice(0, 12)}`;
  });

export const CONVENTIONS = (d: Difference): string =>
  `${d.on} masses · body axes · products negative, I_xy = −∫xy dm · change = B − A`;
