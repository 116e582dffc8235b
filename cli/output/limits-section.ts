import { waiverState } from '#core/record/waiver-state.ts';
import {
  beamOf,
  formatSignificant,
  type PrintedLimit,
  printLimit,
  unitOfLimit,
} from '../../core/figures/index.ts';
import type { LimitResult } from '../../core/record/record.ts';
import { place, type ReportContext } from './report-context.ts';
import { drawBeam, labelWidth } from './terminal-beam.ts';
import { padEnd, padStart, textWidth } from './text-width.ts';

/** Baseline values of one-sided limits by name [SI], where the fulcrum stands. */
export type Baseline = Readonly<Record<string, number>>;

interface Row {
  readonly limit: LimitResult;
  readonly printed: PrintedLimit;
  readonly name: string;
  readonly unit: string;
  readonly value: string;
  readonly min: string | null;
  readonly max: string | null;
}

const BEAM_AT_LEAST = 24;
const VERDICT = '✕ outside';

/** Every limit as a beam, its verdict as mark and word, its margin below. */
export function writeLimits(context: ReportContext, baseline: Baseline = {}): void {
  const { record, sheet, units, digits } = context;
  if (record.limits.length === 0) return;
  const judged = new Set(record.limits.map((l) => l.on));
  sheet.head('Limits', judged.size === 1 ? `judged on ${[...judged][0]}` : 'judged as each says');
  const rows = record.limits.map((limit): Row => {
    const printed = printLimit(limit, unitOfLimit(limit, units), digits);
    const plain = (text: string) => sheet.plain(text);
    const stop = (text: string | null) => (text === null ? null : plain(text));
    return {
      limit,
      printed,
      name: plain(limit.name),
      unit: plain(printed.unit),
      value: plain(printed.value),
      min: stop(printed.min),
      max: stop(printed.max),
    };
  });
  const layout = layOut(rows, sheet.width, textWidth(sheet.plain(VERDICT)));
  for (const row of rows) writeRow(context, row, layout, baseline[row.limit.name] ?? null, judged.size > 1);
}

interface Layout {
  readonly name: number;
  readonly unit: number;
  readonly value: number;
  readonly beam: number;
  readonly sides: { low: number; high: number };
}

/** Names give way first: one longer than its column stands on a line of its own. */
function layOut(rows: readonly Row[], width: number, verdict: number): Layout {
  const most = (of: (row: Row) => number) => Math.max(0, ...rows.map(of));
  const unit = most((r) => textWidth(r.unit));
  const value = Math.min(
    24,
    most((r) => textWidth(r.value)),
  );
  const fixed = unit + value + verdict + 4 * 2;
  const name = Math.max(
    0,
    Math.min(
      most((r) => textWidth(r.name)),
      24,
      width - fixed - BEAM_AT_LEAST - 8,
    ),
  );
  const tips = rows.map((r) => beamOf(r.limit).tips);
  const sides = {
    low: Math.min(10, Math.max(0, ...rows.map((r, i) => labelWidth(r.min, tips[i] === 'low')))),
    high: Math.min(10, Math.max(0, ...rows.map((r, i) => labelWidth(r.max, tips[i] === 'high')))),
  };
  return { name, unit, value, beam: Math.min(44, width - fixed - name), sides };
}

function writeRow(
  context: ReportContext,
  row: Row,
  layout: Layout,
  baseline: number | null,
  sayOn: boolean,
): void {
  const { sheet } = context;
  const { ink } = sheet;
  const { limit } = row;
  const within = limit.verdict === 'within';
  const paint = within ? ink.within : ink.outside;
  const verdict = paint(sheet.plain(within ? '○ within' : VERDICT));
  const beam = beamOf({ ...limit, baseline });
  const own = {
    low: labelWidth(row.min, beam.tips === 'low'),
    high: labelWidth(row.max, beam.tips === 'high'),
  };
  const sides = { low: Math.max(own.low, layout.sides.low), high: Math.max(own.high, layout.sides.high) };
  const drawn = layout.beam >= BEAM_AT_LEAST ? drawBeam(beam, row, sides, layout.beam, ink) : undefined;
  const fits = textWidth(row.name) <= layout.name;
  if (!fits) sheet.say(limit.name);
  const value = within ? padStart(row.value, layout.value) : ink.outside(padStart(row.value, layout.value));
  const lead = `${padEnd(fits ? row.name : '', layout.name)}  ${ink.soft(padEnd(row.unit, layout.unit))}  ${value}  `;
  const indent = layout.name + layout.unit + layout.value + 6;
  if (drawn) sheet.raw(`${lead}${drawn}  ${verdict}`);
  else {
    const value = `${row.printed.value}${row.printed.unit ? ` ${row.printed.unit}` : ''}`;
    sheet.say(`${value} ${within ? '○ within' : VERDICT}; ${spanText(row)}`, { indent: 2, hang: 4, paint });
  }
  const at = drawn && indent <= sheet.width / 2 ? indent : 2;
  sheet.say(detailText(context, row, sayOn), { indent: at, paint: ink.soft });
  const state = waiverState(limit, context.today);
  if (state !== 'none') {
    const { until, by, reason } = limit.waiver!;
    sheet.say(`${state === 'expired' ? 'waiver expired' : 'waived until'} ${until} by ${by}: ${reason}`, {
      indent: at,
    });
  }
  if (!within) writeHeaviest(context, row, at);
}

/** What the beam says, in words. */
function spanText({ printed: { min, max } }: Row): string {
  if (min !== null && max !== null) return `allowed ${min} to ${max}`;
  return min !== null ? `at least ${min}` : `at most ${max}`;
}

function detailText({ units }: ReportContext, { limit, printed }: Row, sayOn: boolean): string {
  const unit = unitOfLimit(limit, units);
  const { basic, predicted } = limit.values;
  const grown = limit.on === 'predicted' && basic !== null && predicted !== null && basic !== predicted;
  const details = [
    printed.words,
    limit.quantity === limit.name ? '' : limit.quantity,
    limit.of === null ? '' : `of ${limit.of}`,
    limit.frame === null ? '' : `in frame ${limit.frame}`,
    sayOn ? `on ${limit.on}` : '',
    grown ? `basic ${formatSignificant(basic! / unit.factor)}` : '',
    limit.id ?? '',
    limit.verdict === 'outside' ? place(limit.at) : '',
    limit.verdict === 'outside' && limit.owner !== null ? `owner ${limit.owner}` : '',
  ];
  return details.filter((text) => text !== '').join(' · ');
}

function writeHeaviest({ sheet, units }: ReportContext, { limit }: Row, indent: number): void {
  const unit = unitOfLimit(limit, units);
  for (const [i, part] of limit.heaviest.entries()) {
    const value = `${formatSignificant(part.value / unit.factor, 4)}${unit.text ? ` ${unit.text}` : ''}`;
    sheet.say(`${i === 0 ? 'weighs most' : 'then'}: ${part.path}, ${value}, ${place(part.at)}`, {
      indent,
      hang: indent + 2,
      paint: sheet.ink.soft,
    });
  }
}
