import type { RollUpRecord } from '#core/record/record.ts';
import { formatCsv } from '#core/record/record-csv.ts';
import type { PartSelection } from '#core/record/select-part.ts';
import { formatJson, formatNdjson } from '../output/formats/json.ts';
import { formatJunit } from '../output/formats/junit.ts';
import { formatMarkdown } from '../output/formats/markdown.ts';
import { renderRun } from '../output/run-report.ts';
import { aboutIn, aboutOf } from './about.ts';
import type { Context } from './context.ts';
import { partsOf } from './options.ts';
import type { RunOptions } from './run-options.ts';

export interface RenderRequest {
  readonly records: readonly RollUpRecord[];
  /** In step with `records`; null where the whole is shown. */
  readonly selections: readonly PartSelection[] | null;
  readonly options: RunOptions;
  readonly today: string;
}

/**
 * Records in one of the formats.
 *
 * @param context for a terminal; null for a file, which gets plain text of 80 columns
 */
export function renderRecords(format: string, request: RenderRequest, context: Context | null): string {
  const { records, selections, options, today } = request;
  const units = options.units === undefined ? {} : { units: options.units };
  switch (format) {
    case 'json':
      return formatJson(selections ?? records);
    case 'ndjson':
      return formatNdjson(selections ?? records);
    case 'csv':
      return formatCsv(records, selections);
    case 'markdown':
      return formatMarkdown(records, { today, products: options.products, ...units }, selections);
    case 'junit':
      return formatJunit(records, { today, ...units });
    default:
      return records
        .map((record, i) =>
          renderRun(record, {
            width: Math.max(60, Math.min(context?.io.columns ?? 80, 100)),
            colour: context?.colour ?? false,
            unicode: context?.unicode ?? true,
            products: options.products,
            about: aboutIn(aboutOf(options.about), record),
            parts: partsOf(options.parts),
            today,
            ...units,
            ...(options.frame === undefined ? {} : { frame: options.frame }),
            ...(selections ? { of: selections[i]! } : {}),
          }),
        )
        .join('\n');
  }
}
