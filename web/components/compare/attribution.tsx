import type { Difference } from '#core/difference/index.ts';
import type { DisplayUnits } from '#core/figures/index.ts';
import { SectionHead } from '#web/components/section-head.tsx';
import { Choice } from '#web/components/sentence/choice.tsx';
import { AttributionBars } from './attribution-bars.tsx';
import { attributionOf } from './attribution-rows.ts';
import { AttributionTable } from './attribution-table.tsx';
import { changeRows } from './change-rows.ts';
import { attributed, type CompareView, chosenQuantity } from './compare-view.ts';
import { quantityWords } from './quantity-words.ts';

/** Which part moved one quantity, by how much and by which cause. */
export function AttributionSection({
  difference,
  units,
  view,
  change,
}: {
  difference: Difference;
  units: DisplayUnits;
  view: CompareView;
  change: (changes: Record<string, string | null>) => void;
}) {
  const quantity = chosenQuantity(difference, view.quantity);
  if (!quantity) return null;
  const attribution = attributionOf(difference, quantity, units, view);
  const label = `Who moved the ${quantityWords(quantity.name)}`;
  const things = view.by === 'group' ? 'groups' : 'parts';
  return (
    <section aria-labelledby="attribution">
      <SectionHead title="Who moved it" id="attribution">
        sums to {attribution.totals.total} {attribution.unit}
        {attribution.still > 0 && ` · ${attribution.still} ${things} contribute nothing`}
      </SectionHead>
      <p className="sentence">
        Show the change of{' '}
        <Choice
          name="quantity"
          value={quantity.name}
          options={attributed(difference).map((q) => {
            const [row] = changeRows([q], units);
            return { value: q.name, label: quantityWords(q.name), hint: `${row!.change} ${row!.unit}` };
          })}
          onChoose={(name) => change({ quantity: name })}
        />{' '}
        split by{' '}
        <Choice
          name="split by"
          value={view.by}
          options={[
            { value: 'part', label: 'part and cause' },
            {
              value: 'group',
              label: 'group and cause',
              hint: 'the first level of the path, copies together',
            },
          ]}
          onChoose={(by) => change({ by: by === 'part' ? null : by })}
        />
        ,{' '}
        <Choice
          name="which parts"
          value={view.show}
          options={[
            { value: 'changed', label: 'only what changed' },
            { value: 'all', label: 'also what did not change' },
          ]}
          onChoose={(show) => change({ show: show === 'changed' ? null : show })}
        />
        .
      </p>
      {attribution.rows.length === 0 ? (
        <p className="soft">No part moved it.</p>
      ) : (
        <>
          <AttributionBars attribution={attribution} difference={difference} units={units} label={label} />
          <AttributionTable attribution={attribution} difference={difference} units={units} label={label} />
        </>
      )}
    </section>
  );
}
