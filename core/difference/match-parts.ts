import type { PartRecord } from '../record/record.ts';

export interface PartPair {
  a: PartRecord | null;
  b: PartRecord | null;
}

/**
 * Pairs the parts of two records: by path; of those left, by content (same kind, mass, centre and inertia to the
 * last bit), the first with the first, which makes a rename. The rest is on one side only. Swapping the sides swaps
 * every pair.
 *
 * @returns in the order of A, then what only B has in its order
 */
export function matchParts(
  a: readonly PartRecord[],
  b: readonly PartRecord[],
  on: 'basic' | 'predicted',
): PartPair[] {
  const partner = new Map<PartRecord, PartRecord>();
  const taken = new Set<PartRecord>();
  const pair = (key: (part: PartRecord) => string) => {
    const waiting = new Map<string, PartRecord[]>();
    for (const part of b) {
      if (taken.has(part)) continue;
      const queue = waiting.get(key(part));
      if (queue) queue.push(part);
      else waiting.set(key(part), [part]);
    }
    for (const queue of waiting.values()) queue.reverse();
    for (const part of a) {
      if (partner.has(part)) continue;
      const found = waiting.get(key(part))?.pop();
      if (!found) continue;
      partner.set(part, found);
      taken.add(found);
    }
  };
  pair((part) => part.path);
  pair((part) => content(part, on));
  return [
    ...a.map((part): PartPair => ({ a: part, b: partner.get(part) ?? null })),
    ...b.filter((part) => !taken.has(part)).map((part): PartPair => ({ a: null, b: part })),
  ];
}

const content = (part: PartRecord, on: 'basic' | 'predicted'): string =>
  JSON.stringify([part.kind, part.cut, part[on].mass, part[on].centre, part[on].inertia]);
