import { InputError } from '#core/errors.ts';
import { displayUnits } from '#core/figures/index.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { formatCsv } from '#core/record/record-csv.ts';
import type { PartSelection } from '#core/record/select-part.ts';
import { formatJson, formatNdjson } from '../output/formats/json.ts';
import { formatJunit } from '../output/formats/junit.ts';
import { formatMarkdown } from '../output/formats/markdown.ts';
import { type About, renderRun } from '../output/run-report.ts';
import type { Context } from './context.ts';
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
      return formatCsv(records);
    case 'markdown':
      return formatMarkdown(records, { today, products: options.products, ...units });
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
            about: aboutOf(options.about, record),
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

function partsOf(text: string): 'all' | number {
  if (text === 'all') return 'all';
  const count = Number(text);
  if (Number.isInteger(count) && count >= 0) return count;
  throw new InputError([
    {
      code: 'CALL_PARTS',
      message: `expected all or a number of parts, found '${text}'`,
      hint: 'for instance --parts all',
    },
  ]);
}

/** `centre`, `origin`, `both`, or a point in body axes in the unit of length that is shown. */
function aboutOf(text: string, record: RollUpRecord): About {
  if (text === 'both' || text === 'centre' || text === 'origin') return text;
  const items = text.split(',').map((x) => Number(x.trim()));
  if (items.length === 3 && items.every(Number.isFinite) && text.split(',').every((x) => x.trim() !== '')) {
    const unit = displayUnits(record).length;
    return {
      name: `[${text
        .split(',')
        .map((x) => x.trim())
        .join(', ')}] ${unit.text}`,
      point: [items[0]! * unit.factor, items[1]! * unit.factor, items[2]! * unit.factor],
    };
  }
  throw new InputError([
    {
      code: 'CALL_ABOUT',
      message: `expected centre, origin or a point x,y,z, found '${text}'`,
      hint: "a point is in the file's unit of length, for instance --about 120,0,-30",
    },
  ]);
}
