import type { Option } from '#web/components/sentence/option.ts';

const DAY = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'short',
  year: 'numeric',
  timeZone: 'UTC',
});
const MONTH = new Intl.DateTimeFormat('en-GB', { month: 'long', year: 'numeric', timeZone: 'UTC' });

/** `2026-11-14` → `14 Nov 2026`. */
export const dayText = (day: string): string => DAY.format(new Date(`${day}T00:00:00Z`));

const MONTHS_BACK = 12;

/** From when a history can begin: always, some days back, and the first of each of the last months; days are UTC. */
export function sinceOptions(today: Date): Option<string>[] {
  const [year, month, day] = [today.getUTCFullYear(), today.getUTCMonth(), today.getUTCDate()];
  const iso = (y: number, m: number, d: number) => new Date(Date.UTC(y, m, d)).toISOString().slice(0, 10);
  const back = ([7, 30, 90] as const).map((days) => {
    const value = iso(year, month, day - days);
    return { value, label: `${days} days ago`, hint: dayText(value) };
  });
  const taken = new Set(back.map((option) => option.value));
  const firsts = Array.from({ length: MONTHS_BACK }, (_, k) => iso(year, month - k, 1))
    .filter((value) => !taken.has(value))
    .map((value) => ({ value, label: MONTH.format(new Date(`${value}T00:00:00Z`)) }));
  return [{ value: '', label: 'the beginning' }, ...back, ...firsts];
}
