import { decimalsFor, PLAIN_ROOM, printAddingColumn, scaleFor } from '../../core/figures/index.ts';
import type { PartRecord } from '../../core/record/record.ts';
import { place, type ReportContext } from './report-context.ts';
import type { Cell } from './sheet.ts';

export const HEAVIEST = 10;

/** The parts that weigh most, what the others come to, and the total: every column adds up as printed. */
export function writeParts(context: ReportContext, parts: 'heaviest' | 'all' | number): void {
  const { record, sheet, units, digits, on } = context;
  if (record.parts.length === 0) return;
  const shown = chooseParts(record.parts, parts);
  const others = record.parts.filter((p) => !shown.includes(p));
  const part =
    others.length === 0 ? `all ${shown.length}` : `the heaviest ${shown.length} of ${record.parts.length}`;
  sheet.head('Parts', `share of the ${on} total · ${part}`);
  const masses = shown.map((p) => p[on].mass);
  const total = record[on].mass;
  const rest = others.map((p) => p[on].mass);
  const scale = scaleFor(units.mass, [...masses, total], PLAIN_ROOM);
  const column = (values: number[], remainder: number[], sum: number, decimals: number) =>
    printAddingColumn(
      others.length > 0 ? [...values, remainder.reduce((a, b) => a + b, 0)] : values,
      sum,
      decimals,
    );
  const mass = column(
    masses.map((m) => m / scale.factor),
    rest.map((m) => m / scale.factor),
    total / scale.factor,
    decimalsFor([total / scale.factor], digits),
  );
  const shares = (['mass', 'xx', 'yy', 'zz'] as const).map((key) => {
    const all = record.parts.reduce((sum, p) => sum + p.share[key], 0);
    // A moment that is nothing has no shares; a sum that is not whole is printed as it is.
    const whole = Math.abs(all - 1) < 1e-6 ? 100 : 100 * all;
    return column(
      shown.map((p) => 100 * p.share[key]),
      others.map((p) => 100 * p.share[key]),
      whole,
      1,
    );
  });
  const figures = (i: number): Cell[] => [mass, ...shares].map((c) => ({ text: c.figures[i] ?? c.total }));
  const rows = shown.map((p, i): Cell[] => [
    { text: p.cut ? `${p.path} (cut)` : p.path },
    { text: p.maturity ?? '' },
    ...figures(i),
    { text: place(p.at), paint: sheet.ink.soft },
  ]);
  if (others.length > 0)
    rows.push([
      { text: others.length === 1 ? '1 other' : `${others.length} others` },
      { text: '' },
      ...figures(shown.length),
      { text: '' },
    ]);
  const totals = [mass, ...shares].map((c) => ({ text: c.total }));
  rows.push([{ text: 'total' }, { text: '' }, ...totals, { text: '' }]);
  sheet.table(
    [
      { head: 'part', align: 'left' },
      { head: 'maturity', align: 'left' },
      { head: `mass\n${scale.head}`, align: 'right' },
      ...['mass', 'Ixx', 'Iyy', 'Izz'].map((name) => ({ head: `% of\n${name}`, align: 'right' as const })),
      { head: 'in the file', align: 'left' },
    ],
    rows,
    { totals: 1 },
  );
  for (const note of new Set([mass, ...shares].map((c) => c.note)))
    if (note) sheet.say(note, { paint: sheet.ink.soft });
}

/** The heaviest first, cut-outs by what they take away; all of them in the file's order. */
export function chooseParts(parts: readonly PartRecord[], wanted: 'heaviest' | 'all' | number): PartRecord[] {
  const most = wanted === 'heaviest' ? HEAVIEST : wanted;
  if (most === 'all') return [...parts];
  return [...parts]
    .sort((a, b) => Math.abs(b.predicted.mass) - Math.abs(a.predicted.mass))
    .slice(0, Math.max(0, most));
}
