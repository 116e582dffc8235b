import type { SORTS, TREND_QUANTITIES, TrendQuantity, VERDICTS } from '#core/api/runs.ts';

export type Sort = (typeof SORTS)[number];
export type Verdict = (typeof VERDICTS)[number];

const SORT_WORDS: Record<Sort, true> = { newest: true, oldest: true, heaviest: true, lightest: true };
const VERDICT_WORDS: Record<Verdict, true> = { within: true, outside: true, unlimited: true };

/** A quantity that a trend can show, as it reads in a sentence. */
export const QUANTITY_WORDS: Record<(typeof TREND_QUANTITIES)[number], string> = {
  mass: 'mass',
  'centre.x': 'centre x',
  'centre.y': 'centre y',
  'centre.z': 'centre z',
  'inertia.xx': 'Ixx about the centre',
  'inertia.yy': 'Iyy about the centre',
  'inertia.zz': 'Izz about the centre',
  'principal.x': 'principal moment near x',
  'principal.y': 'principal moment near y',
  'principal.z': 'principal moment near z',
};

/** What the history shows, as its address says it. */
export interface HistoryView {
  readonly filter: {
    readonly assembly?: string;
    readonly state?: string;
    readonly branch?: string;
    readonly verdict?: Verdict;
    /** A day, UTC. */
    readonly since?: string;
  };
  readonly sort: Sort;
  readonly cursor?: string;
  readonly quantity: TrendQuantity;
}

/** Reads an address; what it says wrongly counts as not said. */
export function readHistoryView(search: URLSearchParams): HistoryView {
  const text = (key: string) => search.get(key) || undefined;
  const one = <T extends string>(key: string, words: Record<T, unknown>): T | undefined => {
    const value = search.get(key);
    return value !== null && Object.hasOwn(words, value) ? (value as T) : undefined;
  };
  const since = text('since');
  const isDay = since !== undefined && /^\d{4}-\d\d-\d\d$/.test(since) && !Number.isNaN(Date.parse(since));
  return {
    filter: {
      assembly: text('assembly'),
      state: text('state'),
      branch: text('branch'),
      verdict: one('verdict', VERDICT_WORDS),
      since: isDay ? since : undefined,
    },
    sort: one('sort', SORT_WORDS) ?? 'newest',
    cursor: text('cursor'),
    quantity: one('quantity', QUANTITY_WORDS) ?? 'mass',
  };
}

/** Keys that move the reader to another list, so that a place in the old one means nothing. */
const MOVES = ['assembly', 'state', 'branch', 'verdict', 'since', 'sort'];

/** The address with some keys changed; null takes a key out. A new filter or sort begins at the start of the list. */
export function withKeys(
  search: URLSearchParams,
  changes: Readonly<Record<string, string | null>>,
): URLSearchParams {
  const next = new URLSearchParams(search);
  for (const [key, value] of Object.entries(changes)) {
    if (value === null || value === '') next.delete(key);
    else next.set(key, value);
  }
  if (Object.keys(changes).some((key) => MOVES.includes(key))) next.delete('cursor');
  return next;
}

export const isFiltered = ({ filter }: HistoryView): boolean =>
  Object.values(filter).some((value) => value !== undefined);
