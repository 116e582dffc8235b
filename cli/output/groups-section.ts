import { decimalsFor, PLAIN_ROOM, printAddingColumn, scaleFor } from '../../core/figures/index.ts';
import type { GroupTotals } from '../../core/record/record.ts';
import type { ReportContext } from './report-context.ts';

/** Masses by category or basis, each column adding up to its total. */
export function writeGroups(context: ReportContext, title: string, groups: readonly GroupTotals[]): void {
  const { record, sheet, units, digits, on } = context;
  // One group without a name says nothing.
  if (groups.length === 0 || (groups.length === 1 && groups[0]!.name === null)) return;
  const { growth } = record.conventions;
  sheet.head(title, `% of ${on} mass`);
  const scale = scaleFor(units.mass, [record.basic.mass, record.predicted.mass], PLAIN_ROOM);
  const decimals = decimalsFor([record[on].mass / scale.factor], digits);
  const masses = (side: 'basic' | 'predicted') =>
    printAddingColumn(
      groups.map((g) => g[side].mass / scale.factor),
      record[side].mass / scale.factor,
      decimals,
    );
  const sides = growth ? (['basic', 'predicted'] as const) : (['basic'] as const);
  const columns = [
    ...sides.map(masses),
    printAddingColumn(
      groups.map((g) => 100 * g.share[on]),
      100,
      1,
    ),
  ];
  sheet.table(
    [
      { head: '', align: 'left' },
      ...sides.map((side) => ({ head: `${side}\n${scale.head}`, align: 'right' as const })),
      { head: '% of\nmass', align: 'right' },
    ],
    [
      ...groups.map((g, i) => [
        { text: g.name ?? 'none stated' },
        ...columns.map((c) => ({ text: c.figures[i]! })),
      ]),
      [{ text: 'total' }, ...columns.map((c) => ({ text: c.total }))],
    ],
    { totals: 1 },
  );
  for (const note of new Set(columns.map((c) => c.note)))
    if (note) sheet.say(note, { paint: sheet.ink.soft });
}
