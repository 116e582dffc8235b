import { type Difference, isAttributed, type QuantityChange } from '#core/difference/index.ts';

/** What the comparison shows, as its address says it. */
export interface CompareView {
  /** A run or `baseline`; empty where the address names none. */
  readonly a: string;
  readonly b: string;
  readonly on: 'basic' | 'predicted' | undefined;
  readonly quantity: string | null;
  readonly show: 'changed' | 'all';
  readonly by: 'part' | 'group';
}

export function readCompareView(search: URLSearchParams): CompareView {
  const on = search.get('on');
  return {
    a: search.get('a') ?? '',
    b: search.get('b') ?? '',
    on: on === 'basic' || on === 'predicted' ? on : undefined,
    quantity: search.get('quantity'),
    show: search.get('show') === 'all' ? 'all' : 'changed',
    by: search.get('by') === 'group' ? 'group' : 'part',
  };
}

/** The quantities whose change is attributed to parts. */
export const attributed = (d: Difference): QuantityChange[] =>
  d.quantities.filter((q) => q.change !== null && isAttributed(q.name));

/** The quantity that was asked for; else mass where it moved, else the first that moved. */
export function chosenQuantity(d: Difference, wanted: string | null): QuantityChange | undefined {
  const all = attributed(d);
  return (
    all.find((q) => q.name === wanted) ??
    all.find((q) => q.name === 'mass' && q.change !== 0) ??
    all.find((q) => q.change !== 0) ??
    all[0]
  );
}
