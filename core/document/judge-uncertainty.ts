import type { YamlValue } from '../yaml/value.ts';
import { clash, isMapping, type Judge } from './judge.ts';

/** Judges that a quantity written as a mapping gives its uncertainty in one way. */
export function judgeUncertain(judge: Judge, value: YamlValue | undefined, noun: string): void {
  if (typeof value === 'string' || value === undefined) return;
  if (Array.isArray(value)) for (const item of value) judgeUncertain(judge, item, noun);
  else if ('u' in value && 'tol' in value) clash(judge, value, 'u', 'tol', noun);
}

/** Judges that a material gives its uncertainty once, and in one way. */
export function judgeMaterial(judge: Judge, value: YamlValue): void {
  if (!isMapping(value)) return;
  judgeUncertain(judge, value, 'a material');
  const { density } = value;
  judgeUncertain(judge, density, "'density'");
  if (!isMapping(density)) return;
  for (const key of ['u', 'tol']) {
    if (key in value && ('u' in density || 'tol' in density)) {
      clash(
        judge,
        value,
        'density',
        key,
        'a material',
        "write the uncertainty in 'density' or beside it, not both",
      );
    }
  }
}
