import type { AxisChange, Difference } from '#core/difference/index.ts';
import { type DisplayUnits, formatSignificant } from '#core/figures/index.ts';
import { SectionHead } from '#web/components/section-head.tsx';
import { changeRows } from './change-rows.ts';
import { ChangeTable } from './change-table.tsx';

/** Principal moments matched by the direction of their axes, not by rank; swaps, turns and free planes are said. */
export function PrincipalChangeSection({
  difference,
  units,
}: {
  difference: Difference;
  units: DisplayUnits;
}) {
  const { principal } = difference;
  if (!principal) return null;
  const rows = changeRows(
    principal.axes.map((axis, i) => ({
      name: `principal.${i}`,
      unit: 'kg*m^2' as const,
      a: axis.moment.a,
      b: axis.moment.b,
      ofA: axis.moment.a === 0 ? null : (axis.moment.b - axis.moment.a) / Math.abs(axis.moment.a),
    })),
    units,
  );
  return (
    <section aria-labelledby="principal">
      <SectionHead title="Principal moments" id="principal">
        axes matched by direction, not by rank
      </SectionHead>
      <ChangeTable
        label="Principal moments"
        remark="axis"
        rows={rows.map((row, i) => ({
          ...row,
          head: `Near ${nearText(principal.axes[i]!)}`,
          remark: <Remark axis={principal.axes[i]!} units={units} />,
        }))}
      />
      {principal.ranksSwapped && (
        <p className="mt-2 font-semibold">
          Two moments passed each other: their axes kept their directions and changed their places in the
          order.
        </p>
      )}
    </section>
  );
}

const nearText = ({ nearest: { a, b } }: AxisChange): string => (a === b ? b : `${a} in A, near ${b} in B`);

function Remark({ axis, units }: { axis: AxisChange; units: DisplayUnits }) {
  const turned =
    axis.turned === null
      ? 'free to turn in a plane of equal moments'
      : `turned ${formatSignificant(axis.turned / units.angle.factor, 3)}${units.angle.text === '°' ? '' : ' '}${units.angle.text}`;
  return (
    <>
      {turned}
      {axis.swapped && (
        <b>
          , place {axis.rank.a + 1} → {axis.rank.b + 1}
        </b>
      )}
    </>
  );
}
