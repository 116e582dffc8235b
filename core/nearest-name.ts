/**
 * The known name nearest to a mistyped one by edit distance, for "did you mean".
 *
 * @returns undefined when nothing is within a third of the name's length (at least 2 edits)
 */
export function nearestName(name: string, known: Iterable<string>): string | undefined {
  const bound = Math.max(2, Math.floor(name.length / 3));
  let best: string | undefined;
  let bestDistance = bound + 1;
  const wanted = name.slice(0, 64).toLowerCase();
  for (const candidate of known) {
    if (Math.abs(candidate.length - name.length) >= bestDistance) continue;
    const distance = editDistance(wanted, candidate.toLowerCase());
    if (distance < bestDistance) {
      best = candidate;
      bestDistance = distance;
    }
  }
  return best;
}

/** Levenshtein distance with swaps of neighbours counted as one edit. */
function editDistance(a: string, b: string): number {
  let beforeLast: number[] = [];
  let last = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i++) {
    const row = [i];
    for (let j = 1; j <= b.length; j++) {
      const same = a[i - 1] === b[j - 1] ? 0 : 1;
      let d = Math.min(row[j - 1]! + 1, last[j]! + 1, last[j - 1]! + same);
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1])
        d = Math.min(d, beforeLast[j - 2]! + 1);
      row.push(d);
    }
    beforeLast = last;
    last = row;
  }
  return last[b.length]!;
}
