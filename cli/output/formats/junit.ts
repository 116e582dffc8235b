import { isBroken, waiverState } from '#core/record/waiver-state.ts';
import {
  displayUnits,
  formatSignificant,
  plainText,
  printLimit,
  unitOfLimit,
} from '../../../core/figures/index.ts';
import type { LimitResult, RollUpRecord } from '../../../core/record/record.ts';
import { place } from '../report-context.ts';

/** A suite a state, a case a limit: what build servers read. A waived limit counts as skipped, with its reason. */
export function formatJunit(
  records: readonly RollUpRecord[],
  { today, units }: { today: string; units?: string },
): string {
  const count = (list: readonly LimitResult[], test: (l: LimitResult) => boolean) => list.filter(test).length;
  const broken = (l: LimitResult) => isBroken(l, today);
  const waived = (l: LimitResult) => waiverState(l, today) === 'in effect';
  const all = records.flatMap((r) => r.limits);
  const lines = ['<?xml version="1.0" encoding="UTF-8"?>'];
  lines.push(
    `<testsuites name="limits" tests="${all.length}" failures="${count(all, broken)}" errors="0" skipped="${count(all, waived)}">`,
  );
  for (const record of records) {
    const { limits } = record;
    const name = attribute(`${record.assembly}, ${record.state}`);
    lines.push(
      `  <testsuite name="${name}" tests="${limits.length}" failures="${count(limits, broken)}" errors="0" skipped="${count(limits, waived)}">`,
    );
    lines.push(
      '    <properties>',
      `      <property name="stamp" value="${attribute(record.stamp)}"/>`,
      '    </properties>',
    );
    for (const limit of limits) lines.push(...caseLines(record, limit, today, units));
    lines.push('  </testsuite>');
  }
  lines.push('</testsuites>');
  return `${lines.join('\n')}\n`;
}

function caseLines(record: RollUpRecord, limit: LimitResult, today: string, units?: string): string[] {
  const name = limit.id === null ? limit.name : `${limit.id} ${limit.name}`;
  const open = `    <testcase classname="${attribute(`${record.assembly}.${record.state}`)}" name="${attribute(name)}" file="${attribute(limit.at.file)}" line="${limit.at.line}"`;
  if (waiverState(limit, today) === 'in effect') {
    const { until, by, reason } = limit.waiver!;
    return [
      `${open}>`,
      `      <skipped message="${attribute(`waived until ${until} by ${by}: ${reason}`)}"/>`,
      '    </testcase>',
    ];
  }
  if (!isBroken(limit, today)) return [`${open}/>`];
  const text = failureText(record, limit, units);
  return [
    `${open}>`,
    `      <failure type="limit" message="${attribute(text[0]!)}">${text.map(content).join('\n')}</failure>`,
    '    </testcase>',
  ];
}

/** First line for a list; then the parts that weigh most and the place of the limit. */
export function failureText(
  record: Pick<RollUpRecord, 'conventions'>,
  limit: LimitResult,
  units?: string,
): string[] {
  const unit = unitOfLimit(limit, displayUnits(record, units));
  const printed = printLimit(limit, unit);
  const in_ = (text: string) => `${text}${unit.text ? ` ${unit.text}` : ''}`;
  const stops = [
    printed.min === null ? '' : `min ${in_(printed.min)}`,
    printed.max === null ? '' : `max ${in_(printed.max)}`,
  ];
  const value = limit.value === null ? printed.value : in_(printed.value);
  const lines = [
    `${limit.name}: ${value} is outside ${stops.filter(Boolean).join(', ')}; ${printed.words} (${limit.on})`,
  ];
  if (limit.waiver !== null)
    lines.push(`waiver expired ${limit.waiver.until} by ${limit.waiver.by}: ${limit.waiver.reason}`);
  for (const part of limit.heaviest)
    lines.push(`${part.path}: ${in_(formatSignificant(part.value / unit.factor, 4))} (${place(part.at)})`);
  lines.push(`limit at ${place(limit.at)}`);
  return lines.map(plainText);
}

const content = (text: string): string =>
  plainText(text).replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;');
const attribute = (text: string): string => content(text).replaceAll('"', '&quot;').replaceAll("'", '&apos;');
