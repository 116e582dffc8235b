/**
 * Where two JSON values first differ, as a path with both sides; null where they are equal. Numbers must be the same to
 * the last bit; the order of keys does not matter.
 */
export function firstDifference(stored: unknown, computed: unknown, path = ''): string | null {
  if (Object.is(stored, computed)) return null;
  if (isBranch(stored) && isBranch(computed) && Array.isArray(stored) === Array.isArray(computed)) {
    const [a, b] = [stored as Record<string, unknown>, computed as Record<string, unknown>];
    for (const key of new Set([...Object.keys(a), ...Object.keys(b)])) {
      const found = firstDifference(a[key], b[key], path ? `${path}.${key}` : key);
      if (found) return found;
    }
    return null;
  }
  return `${path}: pushed ${shown(stored)}, computed here ${shown(computed)}`;
}

const isBranch = (value: unknown): value is object => typeof value === 'object' && value !== null;

const shown = (value: unknown): string => {
  const text = value === undefined ? 'nothing' : JSON.stringify(value);
  return text.length > 80 ? `${text.slice(0, 79)}…` : text;
};
