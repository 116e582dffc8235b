import type { RunRow } from '#core/api/runs.ts';

/** What a run is called: its tag or short commit, or outside git the beginning of its stamp. */
export const runName = ({ commit, stamp }: Pick<RunRow, 'commit' | 'stamp'>): string =>
  (commit ?? stamp).slice(0, 7);

/** The two sides of a comparison in the order in which they came: A the earlier. */
export function inOrder<T extends Pick<RunRow, 'at'>>(one: T, other: T): [T, T] {
  return Date.parse(one.at) <= Date.parse(other.at) ? [one, other] : [other, one];
}
