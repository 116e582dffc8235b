import type { TrendQuantity } from '#core/api/runs.ts';
import type { HistoryView } from '#web/components/history/history-view.ts';
import { queryOf } from './client.ts';

/** One quantity over time, of the runs that a filter leaves. */
export const trendQuery = (project: string, filter: HistoryView['filter'], quantity: TrendQuantity) =>
  queryOf('showTrend', { places: { project }, query: { ...filter, quantity } });
