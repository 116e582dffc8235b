import type { Difference } from '#core/difference/index.ts';
import type { DisplayUnits } from '#core/figures/index.ts';
import { WideTable } from '#web/components/wide-table.tsx';
import { CAUSE_WORDS } from './attribution-bars.tsx';
import { type Attribution, CAUSES } from './attribution-rows.ts';
import { happenedTo } from './part-words.ts';

/** Every contribution by cause; each column adds up, the last one to the change. */
export function AttributionTable({
  attribution,
  difference,
  units,
  label,
}: {
  attribution: Attribution;
  difference: Difference;
  units: DisplayUnits;
  label: string;
}) {
  const columns = [...CAUSES, 'total'] as const;
  return (
    <div className="mt-5">
      <WideTable label={`${label} as a table`}>
        <table>
          <caption className="sr-only">
            {label}, in {attribution.unit}
          </caption>
          <thead>
            <tr>
              <th scope="col">part</th>
              <th scope="col">what happened</th>
              {CAUSES.map((cause) => (
                <th key={cause} scope="col" className="n">
                  {CAUSE_WORDS[cause]} <i>{attribution.unit}</i>
                </th>
              ))}
              <th scope="col" className="n">
                sum <i>{attribution.unit}</i>
              </th>
            </tr>
          </thead>
          <tbody>
            {attribution.rows.map((row) => (
              <tr key={row.path}>
                <th scope="row">{row.path}</th>
                <td>{happenedTo(row.contribution, difference, units)}</td>
                {columns.map((key) => (
                  <td key={key} className={`n ${row.contribution[key] === 0 ? 'soft' : ''}`}>
                    {row.figures[key]}
                  </td>
                ))}
              </tr>
            ))}
            <tr>
              <th scope="row" className="font-semibold">
                Change
              </th>
              <td />
              {columns.map((key) => (
                <td key={key} className="n font-semibold">
                  {attribution.totals[key]}
                </td>
              ))}
            </tr>
          </tbody>
        </table>
      </WideTable>
      {attribution.notes.map((note) => (
        <p key={note} className="soft mt-2 text-sm">
          {note}
        </p>
      ))}
    </div>
  );
}
