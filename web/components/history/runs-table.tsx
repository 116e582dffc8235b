import type { RunRow } from '#core/api/runs.ts';
import type { Sort } from './history-view.ts';
import { RunLine } from './run-line.tsx';
import { columnsOf, type FigureColumn, unitsOfRows } from './runs-units.ts';
import { SortHead } from './sort-head.tsx';

/**
 * The runs of one page of the history; on a narrow screen each becomes pairs of label and value. Roles are written out
 * because `display` would take them away.
 */
export function RunsTable({
  project,
  rows,
  sort,
  onSort,
  chosen,
  onChoose,
}: {
  project: string;
  rows: readonly RunRow[];
  sort: Sort;
  onSort: (sort: Sort) => void;
  chosen: readonly RunRow[];
  onChoose: (row: RunRow) => void;
}) {
  const { units, mixed } = unitsOfRows(rows);
  const columns = columnsOf(rows, units);
  const { mass, centre, moments } = columns;
  const on = new Set(rows.map((r) => r.on));
  return (
    <>
      {/* biome-ignore-start lint/a11y/noRedundantRoles: reflow sets display, which removes a table's own roles. */}
      {/* biome-ignore-start lint/a11y/useSemanticElements: the same. */}
      <table className="pairs mt-4" role="table">
        <caption className="sr-only">Runs, {SORT_WORDS[sort]} first</caption>
        <thead role="rowgroup">
          <tr role="row">
            <th role="columnheader" scope="col">
              <span className="sr-only">chosen to compare</span>
            </th>
            <th role="columnheader" scope="col">
              run
            </th>
            <th role="columnheader" scope="col">
              assembly, state
            </th>
            <th role="columnheader" scope="col">
              branch
            </th>
            <SortHead sort={sort} down="heaviest" up="lightest" onSort={onSort} numeric>
              mass <i>{mass.scale.head}</i>
            </SortHead>
            <UnitHead name="centre x" column={centre} />
            <UnitHead name="principal moments" column={moments} />
            <th role="columnheader" scope="col">
              verdict
            </th>
            <th role="columnheader" scope="col">
              pushed by
            </th>
            <SortHead sort={sort} down="newest" up="oldest" onSort={onSort}>
              when
            </SortHead>
          </tr>
        </thead>
        <tbody role="rowgroup">
          {rows.map((row) => (
            <RunLine
              key={row.id}
              project={project}
              row={row}
              columns={columns}
              chosen={chosen.some((c) => c.id === row.id)}
              onChoose={() => onChoose(row)}
            />
          ))}
        </tbody>
      </table>
      {/* biome-ignore-end lint/a11y/useSemanticElements: the same. */}
      {/* biome-ignore-end lint/a11y/noRedundantRoles: reflow sets display, which removes a table's own roles. */}
      <p className="soft mt-2 text-sm">
        {on.size === 1
          ? `${[...on][0]} masses`
          : 'masses as each run is judged: predicted where its file has growth'}
        ; principal moments ascending, about the centre
        {mixed && '; SI, because the files on this page are written in different units'}
      </p>
    </>
  );
}

const SORT_WORDS: Record<Sort, string> = {
  newest: 'the newest',
  oldest: 'the oldest',
  heaviest: 'the heaviest',
  lightest: 'the lightest',
};

const UnitHead = ({ name, column }: { name: string; column: FigureColumn }) => (
  // biome-ignore lint/a11y/noRedundantRoles: reflow sets display, which removes a table's own roles.
  <th role="columnheader" scope="col" className="n">
    {name} <i>{column.scale.head}</i>
  </th>
);
