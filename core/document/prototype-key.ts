import type { Fault } from '../errors.ts';
import type { Places } from '../yaml/places.ts';
import type { PathStep, YamlValue } from '../yaml/value.ts';

const NAME = '__proto__';

/**
 * Faults of keys called `__proto__`. The schema passes over them where any name is allowed, and as a parameter
 * or a state the name would trip every plain object it is put into.
 */
export function prototypeKeyFaults(root: YamlValue, places: Places): Fault[] {
  const faults: Fault[] = [];
  const seen = new Set<object>();
  const visit = (value: YamlValue, path: PathStep[]) => {
    if (typeof value === 'string' || seen.has(value)) return;
    seen.add(value);
    for (const [key, child] of Object.entries(value)) {
      const inner = [...path, Array.isArray(value) ? Number(key) : key];
      if (key === NAME) faults.push({ ...WORDS, ...places.markOfKey(inner) });
      visit(child, inner);
    }
  };
  visit(root, []);
  return faults;
}

const WORDS = {
  code: 'MODEL_UNKNOWN_KEY',
  message: `no key and no name can be '${NAME}'`,
  hint: 'choose another name',
};
