import { queryOf } from './client.ts';

/** What moved between two runs; `a` is a run or `baseline`. */
export const comparisonQuery = (project: string, a: string, b: string, on?: 'basic' | 'predicted') =>
  queryOf('compareRuns', { places: { project }, query: { a, b, ...(on && { on }) } });
