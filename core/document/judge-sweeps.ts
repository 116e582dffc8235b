import type { YamlValue } from '../yaml/value.ts';
import { entriesOf, isMapping, type Judge, needOne } from './judge.ts';

/** Judges that each range of a sweep has a step or a count. */
export function judgeSweeps(judge: Judge, sweeps: YamlValue | undefined): void {
  for (const [, sweep] of entriesOf(sweeps)) {
    if (!isMapping(sweep)) continue;
    for (const [, values] of entriesOf(sweep.vary)) {
      if (isMapping(values)) needOne(judge, values, ['step', 'count'], 'a range');
    }
  }
}
