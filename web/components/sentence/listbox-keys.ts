/** The next place for a key of a listbox, or null where the key means nothing to it. */
export function placeAfter(key: string, at: number, count: number): number | null {
  const last = count - 1;
  if (key === 'ArrowDown') return Math.min(last, at + 1);
  if (key === 'ArrowUp') return Math.max(0, at - 1);
  if (key === 'PageDown') return Math.min(last, at + 10);
  if (key === 'PageUp') return Math.max(0, at - 10);
  if (key === 'Home') return 0;
  if (key === 'End') return last;
  return null;
}

/** The next option that begins with what was typed, from `at` on and round again. */
export function placeTyped(labels: readonly string[], typed: string, at: number): number | null {
  const wanted = typed.toLowerCase();
  const from = typed.length > 1 ? at : at + 1;
  for (let k = 0; k < labels.length; k++) {
    const i = (from + k) % labels.length;
    if (labels[i]!.toLowerCase().startsWith(wanted)) return i;
  }
  return null;
}
