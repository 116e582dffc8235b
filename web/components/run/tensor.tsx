import { inUnit, printTensor, scaleFor, TENSOR_ROOM, tensorRows } from '#core/figures/index.ts';
import { fromRows } from '#core/linalg/symmetric3.ts';
import type { RollUpRecord, Rows3 } from '#core/record/record.ts';
import { Matrix } from '#web/components/matrix.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import type { RunView } from './run-view.ts';

/** One more than elsewhere: products are small beside moments. */
export const TENSOR_DIGITS = 6;

/** The inertia tensor about the chosen point, in body axes. */
export function TensorSection({ record, view }: { record: RollUpRecord; view: RunView }) {
  const { inertia } = record[view.on];
  if (!inertia) return null;
  const about = view.about === 'centre' ? 'about the centre of mass' : 'about the origin';
  const printed = printRows(view.about === 'centre' ? inertia.aboutCentre : inertia.aboutOrigin, view);
  return (
    <section aria-labelledby="tensor">
      <SectionHead title="Inertia tensor" id="tensor">
        {printed.head}, {record.conventions.growth ? view.on : 'basic'}, {about}, body axes, products{' '}
        {view.products}
      </SectionHead>
      <Matrix
        rows={printed.rows}
        label={`Inertia tensor ${about}, ${printed.head}, products ${view.products}`}
      />
      {printed.note && <p className="soft mt-2 text-sm">{printed.note}</p>}
    </section>
  );
}

/**
 * A tensor as it is printed: its unit with a power of ten, nine figures that a body can still have.
 *
 * @param rows [kg·m²], products negative
 */
export function printRows(
  rows: Rows3,
  { units, products }: Pick<RunView, 'units' | 'products'>,
): { head: string; rows: string[][]; note: string | null } {
  const six = fromRows(rows);
  const scale = scaleFor(units.inertia, six, TENSOR_ROOM);
  const printed = printTensor(inUnit(six, scale), TENSOR_DIGITS);
  return { head: scale.head, rows: tensorRows(printed, products), note: printed.note };
}
