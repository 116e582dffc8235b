import { useState } from 'react';
import { displayUnits } from '#core/figures/index.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { Choice } from '#web/components/sentence/choice.tsx';
import { Entry } from '#web/components/sentence/entry.tsx';
import { type RunView, unitsInWords } from './run-view.ts';

/** How the figures are shown, as a sentence; each choice goes to the address. */
export function ViewSentence({
  record,
  view,
  change,
}: {
  record: RollUpRecord;
  view: RunView;
  change: (changes: Record<string, string | null>) => void;
}) {
  return (
    <p className="sentence screen-only">
      Show{' '}
      {record.conventions.growth && (
        <>
          <Choice
            name="masses"
            value={view.on}
            options={[
              { value: 'predicted', label: 'predicted', hint: 'with the growth allowance' },
              { value: 'basic', label: 'basic', hint: 'as the parts are' },
            ]}
            onChoose={(on) => change({ on: on === 'predicted' ? null : on })}
          />{' '}
        </>
      )}
      figures about{' '}
      <Choice
        name="reference point"
        value={view.about}
        options={[
          { value: 'centre', label: 'the centre of mass' },
          { value: 'origin', label: 'the origin' },
        ]}
        onChoose={(about) => change({ about: about === 'centre' ? null : about })}
      />
      , products of inertia{' '}
      <Choice
        name="sign of the products"
        value={view.products}
        options={[
          { value: 'negative', label: 'negative', hint: 'Ixy = −∫xy dm' },
          { value: 'positive', label: 'positive', hint: 'Pxy = +∫xy dm' },
        ]}
        onChoose={(products) => change({ products: products === 'negative' ? null : products })}
      />
      , in <Units record={record} view={view} change={change} />.
    </p>
  );
}

const ANOTHER = 'another';
const USUAL = ['file', 'si', 'kg,mm', 'g,mm', 'kg,m,deg', 'lb,in'];

function Units({
  record,
  view,
  change,
}: {
  record: RollUpRecord;
  view: RunView;
  change: (changes: Record<string, string | null>) => void;
}) {
  const [writing, setWriting] = useState(false);
  const set = (units: string) => change({ units: units === 'file' ? null : units });
  if (writing)
    return (
      <Entry
        name="units of mass, length, angle and moment of inertia"
        type="text"
        first={view.unitsText}
        placeholder="mm,g,deg"
        onDone={(units) => {
          setWriting(false);
          if (units !== null) set(units);
        }}
      />
    );
  const names = { file: 'the file’s own units', si: 'SI' } as Record<string, string>;
  const values = USUAL.includes(view.unitsText) ? USUAL : [...USUAL, view.unitsText];
  return (
    <Choice
      name="units"
      value={view.unitsText}
      options={[
        ...values.map((value) => {
          const words = unitsInWords(displayUnits(record, value));
          return { value, label: names[value] ?? words, ...(names[value] && { hint: words }) };
        }),
        { value: ANOTHER, label: 'other units …' },
      ]}
      onChoose={(value) => (value === ANOTHER ? setWriting(true) : set(value))}
    />
  );
}
