import { decimalsFor, PLAIN_ROOM, printAddingColumn, scaleFor } from '#core/figures/index.ts';
import type { GroupTotals, RollUpRecord } from '#core/record/record.ts';
import { SectionHead } from '#web/components/section-head.tsx';
import { WideTable } from '#web/components/wide-table.tsx';
import type { RunView } from './run-view.ts';

/** Masses by category or by basis; every column adds up to its total as printed. */
export function GroupsSection({
  record,
  view,
  title,
  groups,
}: {
  record: RollUpRecord;
  view: RunView;
  title: string;
  groups: readonly GroupTotals[];
}) {
  // One group without a name says nothing.
  if (groups.length === 0 || (groups.length === 1 && groups[0]!.name === null)) return null;
  const sides = record.conventions.growth ? (['basic', 'predicted'] as const) : (['basic'] as const);
  const scale = scaleFor(view.units.mass, [record.basic.mass, record.predicted.mass], PLAIN_ROOM);
  const decimals = decimalsFor([record[view.on].mass / scale.factor]);
  const columns = [
    ...sides.map((side) => ({
      head: side,
      unit: scale.head,
      ...printAddingColumn(
        groups.map((g) => g[side].mass / scale.factor),
        record[side].mass / scale.factor,
        decimals,
      ),
    })),
    {
      head: `share of ${view.on}`,
      unit: '%',
      ...printAddingColumn(
        groups.map((g) => 100 * g.share[view.on]),
        100,
        1,
      ),
    },
  ];
  const notes = new Set(columns.flatMap((c) => c.note ?? []));
  return (
    <section>
      <SectionHead title={title}>adds up to the total</SectionHead>
      <WideTable label={title}>
        <table>
          <caption className="sr-only">Mass {title.toLowerCase()}</caption>
          <thead>
            <tr>
              <th scope="col">
                <span className="sr-only">group</span>
              </th>
              {columns.map((c) => (
                <th key={c.head} scope="col" className="n">
                  {c.head} <i>{c.unit}</i>
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {groups.map((g, i) => (
              <tr key={g.name}>
                <th scope="row">{g.name ?? 'none stated'}</th>
                {columns.map((c) => (
                  <td key={c.head} className="n">
                    {c.figures[i]}
                  </td>
                ))}
              </tr>
            ))}
            <tr className="border-t border-rule-strong">
              <th scope="row" className="font-semibold">
                Total
              </th>
              {columns.map((c) => (
                <td key={c.head} className="n font-semibold">
                  {c.total}
                </td>
              ))}
            </tr>
          </tbody>
        </table>
      </WideTable>
      {[...notes].map((note) => (
        <p key={note} className="soft mt-2 text-sm">
          {note}
        </p>
      ))}
    </section>
  );
}
