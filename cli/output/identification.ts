import { isBroken, waiverState } from '#core/record/waiver-state.ts';
import type { Conventions, Provenance, RollUpRecord } from '../../core/record/record.ts';
import { place, productsText, type ReportContext } from './report-context.ts';

/** Whose figures these are, from which text, in which axes, units and signs. */
export function writeIdentification({ record, sheet, units, products, today }: ReportContext): void {
  sheet.say(`${record.assembly}, ${record.state}`, { paint: sheet.ink.strong });
  sheet.say(sourceText(record), { hang: 2 });
  sheet.say(axesText(record.conventions), { hang: 2 });
  sheet.say(
    `${productsText(products)} · units ${[units.length, units.mass, units.inertia, units.angle].map((u) => u.text).join(', ')}`,
    { hang: 2 },
  );
  const verdict = verdictText(record, today);
  const broken = record.limits.some((l) => isBroken(l, today));
  sheet.say(verdict, { hang: 2, paint: broken ? sheet.ink.outside : undefined });
}

/** `4e1c09b on main, not as committed · stamp 9f2c81aa03d1 · steelyard 0.1.0`. */
export function sourceText(record: RollUpRecord): string {
  return `${commitText(record.provenance)} · stamp ${record.stamp.slice(0, 12)} · ${record.provenance.tool}`;
}

export function commitText(provenance: Provenance): string {
  if (!provenance.commit) return 'not in git';
  const branch = provenance.branch ? ` on ${provenance.branch}` : '';
  const tag = provenance.tag ? `, ${provenance.tag}` : '';
  return `${provenance.commit.slice(0, 7)}${branch}${tag}${provenance.dirty ? ', not as committed' : ''}`;
}

export function axesText({ frame }: Conventions): string {
  return frame
    ? `body axes x ${frame.x}, y ${frame.y}, z ${frame.z}; origin at ${frame.origin}`
    : 'body axes and origin as in the file, which names no frame';
}

/** `4 limits: 2 within, 1 outside, 1 waived`. */
export function verdictText(record: Pick<RollUpRecord, 'limits'>, today: string): string {
  const { limits } = record;
  if (limits.length === 0) return 'no limits';
  const within = limits.filter((l) => l.verdict === 'within').length;
  const broken = limits.filter((l) => isBroken(l, today)).length;
  const waived = limits.length - within - broken;
  const counts = [
    within > 0 ? `${within} within` : '',
    broken > 0 ? `${broken} outside` : '',
    waived > 0 ? `${waived} outside and waived` : '',
  ];
  return `${limits.length === 1 ? '1 limit' : `${limits.length} limits`}: ${counts.filter(Boolean).join(', ')}`;
}

/** Waivers that count today stand before any figure. */
export function writeWaivers({ record, sheet, today }: ReportContext): void {
  const waived = record.limits.filter((l) => waiverState(l, today) === 'in effect');
  if (waived.length === 0) return;
  sheet.head('Waivers in effect', `on ${today}`);
  for (const { name, waiver, at } of waived)
    sheet.say(`${name}: until ${waiver!.until} by ${waiver!.by}: ${waiver!.reason} (${place(at)})`, {
      hang: 2,
    });
}

export const CAUTION =
  'These figures support engineering judgement and do not replace it. What flies, lifts or turns falls under local ' +
  'codes and licensed practice; weigh it before it does.';
