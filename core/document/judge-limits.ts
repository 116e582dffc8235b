import type { YamlMapping, YamlValue } from '../yaml/value.ts';
import { isDay } from './is-day.ts';
import { blameValue, isMapping, itemsOf, type Judge } from './judge.ts';
import { judgeNamesDiffer } from './judge-name.ts';
import { shorten } from './words.ts';

/** Judges the limits: names that differ, real dates. */
export function judgeLimits(judge: Judge, limits: YamlValue | undefined): void {
  const list = itemsOf(limits);
  judgeNamesDiffer(judge, list, 'limits');
  for (const limit of list) if (isMapping(limit)) judgeLimit(judge, limit);
}

function judgeLimit(judge: Judge, limit: YamlMapping): void {
  const { waiver } = limit;
  if (!isMapping(waiver) || typeof waiver.until !== 'string' || isDay(waiver.until)) return;
  const message = `'until' is '${shorten(waiver.until)}'; expected a day of the calendar as YYYY-MM-DD`;
  blameValue(judge, { code: 'MODEL_BAD_DATE', message, hint: 'such as 2031-03-31' }, waiver, 'until');
}
