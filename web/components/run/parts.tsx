import { useState } from 'react';
import { decimalsFor, formatPercent, PLAIN_ROOM, scaleFor } from '#core/figures/index.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { Button } from '#web/components/button.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { WideTable } from '#web/components/wide-table.tsx';
import { PartRow } from './part-row.tsx';
import {
  groupKeys,
  openRows,
  type PartsSort,
  partsTree,
  printTreeColumn,
  SHARES,
  type Share,
  sortTree,
} from './parts-tree.ts';
import type { RunView } from './run-view.ts';
import { SortableHead } from './sortable-head.tsx';

const shareHead = (key: Share) =>
  key === 'mass' ? (
    '% mass'
  ) : (
    <>
      % I<sub>{key}</sub>
    </>
  );

/** The parts as a tree with their share of mass and of each moment; every level adds up to the one above it. */
export function PartsSection({
  record,
  view,
  sort,
  onSort,
}: {
  record: RollUpRecord;
  view: RunView;
  sort: PartsSort;
  onSort: (sort: PartsSort) => void;
}) {
  const tree = sortTree(partsTree(record.parts, view.on), sort);
  const groups = groupKeys(tree);
  const [open, setOpen] = useState<ReadonlySet<string>>(
    () => new Set(tree.length <= 3 ? tree.map((n) => n.key) : []),
  );
  const total = record[view.on].mass;
  const scale = scaleFor(view.units.mass, [total], PLAIN_ROOM);
  const mass = printTreeColumn(
    tree,
    (n) => n.mass / scale.factor,
    total / scale.factor,
    decimalsFor([total / scale.factor]),
  );
  const shares = SHARES.map((key) => {
    const all = tree.reduce((sum, n) => sum + n.share[key], 0);
    // A moment that is nothing has no shares; a sum that is not whole is printed as it is.
    const whole = Math.abs(all - 1) < 1e-6 ? 100 : 100 * all;
    return printTreeColumn(tree, (n) => 100 * n.share[key], whole, 1);
  });
  const columns = [mass, ...shares];
  const toggle = (key: string) => {
    const next = new Set(open);
    if (!next.delete(key)) next.add(key);
    setOpen(next);
  };
  const notes = new Set(columns.flatMap((c) => c.notes));
  return (
    <section aria-labelledby="parts">
      <SectionHead title="Parts" id="parts">
        share of the {record.conventions.growth ? 'predicted ' : ''}total · {record.parts.length} parts
        <span className="screen-only">
          {' · '}
          <Button kind="word" onClick={() => setOpen(new Set(groups))} disabled={open.size === groups.length}>
            open all
          </Button>{' '}
          <Button kind="word" onClick={() => setOpen(new Set())} disabled={open.size === 0}>
            close all
          </Button>
        </span>
      </SectionHead>
      <WideTable label="Parts">
        <table>
          <caption className="sr-only">
            Parts with their mass and their share of mass and of each moment
          </caption>
          <thead>
            <tr>
              <SortableHead name="part" value="file" sort={sort} onSort={onSort} />
              <th scope="col">maturity</th>
              <th scope="col" className="n">
                mass <i>{scale.head}</i>
              </th>
              {SHARES.map((key) => (
                <SortableHead
                  key={key}
                  name={shareHead(key)}
                  value={key}
                  sort={sort}
                  onSort={onSort}
                  numeric
                />
              ))}
              <th scope="col">in the file</th>
            </tr>
          </thead>
          <tbody>
            {openRows(tree, (node) => open.has(node.key)).map((node) => (
              <PartRow
                key={node.key}
                node={node}
                figures={columns.map((c) => c.figures.get(node.key)!)}
                open={open.has(node.key)}
                onToggle={() => toggle(node.key)}
              />
            ))}
            <tr>
              <th scope="row" className="font-semibold">
                Total
              </th>
              <td />
              {columns.map((c, i) => (
                <td key={SHARES[i - 1] ?? 'figure'} className="n font-semibold">
                  {c.total}
                </td>
              ))}
              <td />
            </tr>
          </tbody>
        </table>
      </WideTable>
      {record.conventions.growth && view.on === 'basic' && (
        <p className="soft mt-2 text-sm">
          Masses are basic; shares are of the predicted total, which is{' '}
          {formatPercent(record.predicted.mass / total)} % of it.
        </p>
      )}
      {[...notes].map((note) => (
        <p key={note} className="soft mt-2 text-sm">
          {note}
        </p>
      ))}
    </section>
  );
}
