import { formatSignificant } from '../../core/figures/index.ts';
import { place, type ReportContext } from './report-context.ts';

/** Overrides, always listed where the totals are. */
export function writeOverrides({ record, sheet, units }: ReportContext): void {
  if (record.overrides.length === 0) return;
  sheet.head('Overrides', `net mass as built → as stated, ${units.mass.text}`);
  const mass = (kg: number) => formatSignificant(kg / units.mass.factor);
  for (const o of record.overrides)
    sheet.say(`${o.path}: ${mass(o.from)} → ${mass(o.to)}: ${o.reason} (${place(o.at)})`, { hang: 2 });
}

export function writeWarnings({ record, sheet }: ReportContext): void {
  if (record.warnings.length === 0) return;
  sheet.head('Warnings', String(record.warnings.length));
  for (const w of record.warnings)
    sheet.say(`${w.at === null ? '' : `${place(w.at)} `}${w.code}: ${w.message}`, { hang: 2 });
}
