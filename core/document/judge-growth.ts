import type { YamlMapping, YamlValue } from '../yaml/value.ts';
import { blameKey, isMapping, type Judge } from './judge.ts';

/** Judges that a growth table has one form: by maturity, or by category and maturity. */
export function judgeGrowth(judge: Judge, growth: YamlValue | undefined): void {
  if (!isMapping(growth)) return;
  const entries = Object.entries(growth);
  const odd = entries.find(([, value]) => isMapping(value) !== isMapping(entries[0]![1]));
  if (odd === undefined) return;
  blameMixed(judge, growth, odd[0]);
}

function blameMixed(judge: Judge, growth: YamlMapping, key: string): void {
  blameKey(
    judge,
    {
      code: 'MODEL_MIXED_GROWTH',
      message: "'growth' mixes maturities with categories",
      hint: 'write { estimated: 20 % } for all, or { structure: { estimated: 18 % } } for each category',
    },
    growth,
    key,
  );
}
