import { isBroken, waiverState } from '#core/record/waiver-state.ts';
import {
  decimalsFor,
  displayUnits,
  formatFixed,
  inUnit,
  PLAIN_ROOM,
  type ProductsSign,
  plainText,
  printAddingColumn,
  printLimit,
  printMoments,
  printTensor,
  scaleFor,
  TENSOR_ROOM,
  tensorRows,
  unitOfLimit,
} from '../../../core/figures/index.ts';
import { fromRows } from '../../../core/linalg/symmetric3.ts';
import type { RollUpRecord, Totals } from '../../../core/record/record.ts';
import type { PartSelection } from '../../../core/record/select-part.ts';
import { axesText, CAUTION, sourceText, verdictText } from '../identification.ts';
import { chooseParts } from '../parts-section.ts';
import { place, productsText } from '../report-context.ts';
import { failureText } from './junit.ts';

export interface MarkdownOptions {
  today: string;
  units?: string;
  products?: ProductsSign;
  parts?: number;
}

/** A summary for the page of a build: the verdict first, then limits, totals, the heaviest parts, warnings. */
export const formatMarkdown = (
  records: readonly RollUpRecord[],
  options: MarkdownOptions,
  selections: readonly PartSelection[] | null = null,
): string =>
  records
    .map((record, i) =>
      selections ? partSummary(record, selections[i]!, options) : summary(record, options),
    )
    .join('\n');

/** One part's or group's own numbers in place of the whole's. */
function partSummary(record: RollUpRecord, part: PartSelection, options: MarkdownOptions): string {
  const lines = [
    `## ${text(`${record.assembly}, ${record.state}: ${part.path}`)}`,
    '',
    ...totalLines(record, part, options),
    ...sourceLines(record, options),
  ];
  return `${lines.join('\n')}\n`;
}

const sourceLines = (record: RollUpRecord, { products = 'negative' }: MarkdownOptions): string[] => [
  `${text(sourceText(record))}<br>`,
  `${text(axesText(record.conventions))}; ${text(productsText(products))}`,
  '',
  `_${text(CAUTION)}_`,
];

function summary(record: RollUpRecord, options: MarkdownOptions): string {
  const broken = record.limits.filter((l) => isBroken(l, options.today));
  const lines = [
    `## ${text(`${record.assembly}, ${record.state}`)}`,
    '',
    `**${broken.length > 0 ? '✕' : '○'} ${text(verdictText(record, options.today))}**`,
    '',
    ...broken.flatMap((limit) => {
      const [first, ...rest] = failureText(record, limit, options.units);
      return [`- ${text(first!)}`, ...rest.map((line) => `  - ${text(line)}`)];
    }),
    ...(broken.length > 0 ? [''] : []),
    ...limitLines(record, options),
    ...totalLines(record, record, options),
    ...partLines(record, options),
    ...remarkLines(record),
    ...sourceLines(record, options),
  ];
  return `${lines.join('\n')}\n`;
}

function limitLines(record: RollUpRecord, { units, today }: MarkdownOptions): string[] {
  if (record.limits.length === 0) return [];
  const shown = displayUnits(record, units);
  const rows = record.limits.map((limit) => {
    const p = printLimit(limit, unitOfLimit(limit, shown));
    const waived =
      waiverState(limit, today) === 'in effect'
        ? `, waived until ${limit.waiver!.until} by ${limit.waiver!.by}`
        : '';
    const verdict = `${limit.verdict === 'within' ? '○ within' : '✕ outside'}${waived}`;
    return [limit.name, p.unit, limit.on, p.value, p.min ?? '', p.max ?? '', verdict, p.words];
  });
  return table(['limit', 'unit', 'on', 'value', 'min', 'max', 'verdict', 'margin'], 'lllrrrll', rows);
}

/** @param both the whole of the record, or a part of it */
function totalLines(
  record: RollUpRecord,
  both: { basic: Totals; predicted: Totals },
  { units, products = 'negative' }: MarkdownOptions,
): string[] {
  const shown = displayUnits(record, units);
  const { growth } = record.conventions;
  const sides = growth ? (['basic', 'predicted'] as const) : (['basic'] as const);
  const on = growth ? 'predicted' : 'basic';
  const rows: string[][] = [];
  const add = (names: string[], unit: { text: string; factor: number }, values: (number | null)[][]) => {
    const scale = scaleFor(
      unit,
      values.flat().map((x) => x ?? 0),
      PLAIN_ROOM,
    );
    const decimals = decimalsFor(values.flat().map((x) => (x ?? 0) / scale.factor));
    names.forEach((name, i) => {
      rows.push([
        name,
        scale.head,
        ...values[i]!.map((x) => formatFixed(x === null ? null : x / scale.factor, decimals)),
      ]);
    });
  };
  add(['mass'], shown.mass, [sides.map((s) => both[s].mass)]);
  add(
    ['centre x', 'centre y', 'centre z'],
    shown.length,
    [0, 1, 2].map((k) => sides.map((s) => both[s].centre?.[k] ?? null)),
  );
  const lines = table(['total', 'unit', ...sides], `ll${'r'.repeat(sides.length)}`, rows);
  const { inertia, principal } = both[on];
  if (!inertia || !principal) return lines;
  for (const [point, tensor] of [
    ['the centre of mass', inertia.aboutCentre],
    ['the origin', inertia.aboutOrigin],
  ] as const) {
    const six = fromRows(tensor);
    const scale = scaleFor(shown.inertia, six, TENSOR_ROOM);
    const printed = printTensor(inUnit(six, scale));
    const matrix = tensorRows(printed, products);
    lines.push(
      text(
        `Inertia tensor about ${point}, body axes, ${scale.head}, products ${products}, ${on}${printed.note ? `; ${printed.note}` : ''}:`,
      ),
      '',
    );
    lines.push(
      ...table(
        ['', 'x', 'y', 'z'],
        'lrrr',
        matrix.map((row, i) => ['xyz'[i]!, ...row]),
      ),
    );
  }
  const scale = scaleFor(shown.inertia, principal.moments, TENSOR_ROOM);
  const moments = printMoments(principal.moments.map((m) => m / scale.factor));
  const named = moments.texts.map((m, i) => `near ${principal.nearest[i]} ${m}`).join(', ');
  lines.push(text(`Principal moments about the centre of mass, ${scale.head}, ${on}: ${named}.`), '');
  return lines;
}

function partLines(record: RollUpRecord, { units, parts = 10 }: MarkdownOptions): string[] {
  const shown = chooseParts(record.parts, parts);
  if (shown.length === 0) return [];
  const on = record.conventions.growth ? 'predicted' : 'basic';
  const others = record.parts.filter((p) => !shown.includes(p)).reduce((sum, p) => sum + p[on].mass, 0);
  const total = record[on].mass;
  const scale = scaleFor(
    displayUnits(record, units).mass,
    [total, ...shown.map((p) => p[on].mass)],
    PLAIN_ROOM,
  );
  const hidden = record.parts.length - shown.length;
  const masses = [...shown.map((p) => p[on].mass), ...(hidden > 0 ? [others] : [])];
  const column = printAddingColumn(
    masses.map((m) => m / scale.factor),
    total / scale.factor,
    decimalsFor([total / scale.factor]),
  );
  const shares = printAddingColumn(
    masses.map((m) => (100 * m) / total),
    100,
    1,
  );
  const rows = shown.map((p, i) => [
    p.cut ? `${p.path} (cut)` : p.path,
    p.maturity ?? '',
    column.figures[i]!,
    shares.figures[i]!,
    place(p.at),
  ]);
  if (hidden > 0)
    rows.push([
      hidden === 1 ? '1 other' : `${hidden} others`,
      '',
      column.figures.at(-1)!,
      shares.figures.at(-1)!,
      '',
    ]);
  rows.push(['total', '', column.total, shares.total, '']);
  const notes = [...new Set([column.note, shares.note])].filter((note) => note !== null);
  return [
    ...table(['part', 'maturity', `${on} mass ${scale.head}`, '% of mass', 'in the file'], 'llrrl', rows),
    ...notes.flatMap((n) => [text(n), '']),
  ];
}

function remarkLines(record: RollUpRecord): string[] {
  const kg = (x: number) => `${formatFixed(x, Math.max(3, decimalsFor([x])))} kg`;
  const overrides = record.overrides.map(
    (o) => `- override ${text(`${o.path}: ${kg(o.from)} → ${kg(o.to)}: ${o.reason} (${place(o.at)})`)}`,
  );
  const warnings = record.warnings.map(
    (w) => `- warning ${text(`${w.at ? `${place(w.at)} ` : ''}${w.code}: ${w.message}`)}`,
  );
  const all = [...overrides, ...warnings];
  return all.length > 0 ? [...all, ''] : [];
}

function table(head: string[], align: string, rows: string[][]): string[] {
  const row = (cells: string[]) => `| ${cells.map(text).join(' | ')} |`;
  return [
    row(head),
    `| ${[...align].map((a) => (a === 'r' ? '--:' : '---')).join(' | ')} |`,
    ...rows.map(row),
    '',
  ];
}

/** Text that means itself in Markdown and in the HTML it may carry. */
export const text = (raw: string): string =>
  plainText(raw)
    .replace(/[\\`*_{}[\]()#+!|~$-]/g, '\\$&')
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('@', '&#64;');
