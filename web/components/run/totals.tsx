import { Fragment } from 'react';
import {
  type DisplayUnit,
  decimalsFor,
  formatFixed,
  formatPercent,
  PLAIN_ROOM,
  scaleFor,
} from '#core/figures/index.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { SectionHead } from '#web/components/section-head.tsx';
import { WideTable } from '#web/components/wide-table.tsx';
import type { RunView } from './run-view.ts';

const AXES = ['x', 'y', 'z'] as const;

/** Mass, centre and radii of gyration, basic and predicted; the caution stands right under them. */
export function TotalsSection({ record, view }: { record: RollUpRecord; view: RunView }) {
  const { growth } = record.conventions;
  const sides = growth ? (['basic', 'predicted'] as const) : (['basic'] as const);
  const of = (pick: (side: 'basic' | 'predicted') => number | null | undefined) =>
    sides.map((side) => pick(side) ?? null);
  const groups = [
    group('Mass', view.units.mass, [of((s) => record[s].mass)]),
    group(
      'Centre',
      view.units.length,
      AXES.map((_, k) => of((s) => record[s].centre?.[k])),
    ),
    group(
      'Radius of gyration',
      view.units.length,
      AXES.map((_, k) => of((s) => record[s].gyration?.[k])),
    ),
  ];
  return (
    <section aria-labelledby="totals">
      <SectionHead title="Totals" id="totals">
        {growth ? 'basic · predicted with growth allowance' : 'basic; the file has no growth table'}
      </SectionHead>
      <WideTable label="Totals">
        <table>
          <caption className="sr-only">Mass, centre of mass and radii of gyration about the centre</caption>
          <thead>
            <tr>
              <th scope="col">
                <span className="sr-only">quantity</span>
              </th>
              {sides.map((side) => (
                <th key={side} scope="col" className="n">
                  {side}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {groups.map(({ name, unit, rows, decimals }) => (
              <Fragment key={name}>
                {rows.map((texts, k) => (
                  <tr key={AXES[k]}>
                    <th scope="row">
                      {name} {rows.length > 1 && AXES[k]} <span className="u">{unit}</span>
                    </th>
                    {texts.map((text, i) => (
                      <td key={sides[i]} className="n">
                        {text}
                        <Aligned decimals={decimals} most={Math.max(...groups.map((g) => g.decimals))} />
                      </td>
                    ))}
                  </tr>
                ))}
              </Fragment>
            ))}
          </tbody>
        </table>
      </WideTable>
      {growth && record.basic.mass !== 0 && (
        <p className="soft mt-2 text-sm">
          The growth allowance adds {formatPercent(record.predicted.mass / record.basic.mass - 1)} % of the
          basic mass.
        </p>
      )}
      {record[view.on].centre === null && (
        <p className="mt-2">No mass remains in this state: there is no centre, tensor or axis.</p>
      )}
      <p className="mt-2 border-l-[3px] border-brass-fill py-0.5 pl-3 text-sm">
        These figures do not replace licensed engineering judgement or the applicable codes: weigh before you
        rely on them.
      </p>
    </section>
  );
}

/** Rows of one kind share their unit and their decimals. */
function group(name: string, unit: DisplayUnit, values: readonly (number | null)[][]) {
  const all = values.flat().map((x) => x ?? 0);
  const scale = scaleFor(unit, all, PLAIN_ROOM);
  const decimals = decimalsFor(all.map((x) => x / scale.factor));
  const rows = values.map((row) =>
    row.map((x) => formatFixed(x === null ? null : x / scale.factor, decimals)),
  );
  return { name, unit: scale.head, rows, decimals };
}

/** Room after a figure with fewer decimals than its neighbours, so that the marks stand in one line. */
const Aligned = ({ decimals, most }: { decimals: number; most: number }) => {
  const missing = most - decimals + (decimals === 0 && most > 0 ? 1 : 0);
  return missing > 0 ? <span style={{ paddingRight: `${missing}ch` }} /> : null;
};
