import { addressOf } from '#core/api/routes.ts';
import type { HistoryView } from '#web/components/history/history-view.ts';
import { queryOf } from './client.ts';

const parametersOf = ({ filter, sort, cursor }: HistoryView) => ({ ...filter, sort, cursor });

/** One page of the history. */
export const runsQuery = (project: string, view: HistoryView) =>
  queryOf('listRuns', { places: { project }, query: parametersOf(view) });

/** Where the same page is to be had as CSV. */
export const runsCsvAddress = (project: string, view: HistoryView): string =>
  addressOf('listRunsAsCsv', { project }, parametersOf(view));
