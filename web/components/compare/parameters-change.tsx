import type { Difference, ValueChange } from '#core/difference/index.ts';
import { formatShort, unitText } from '#core/figures/index.ts';
import { SectionHead } from '#web/components/section-head.tsx';
import { WideTable } from '#web/components/wide-table.tsx';
import { signed } from './change-rows.ts';

/** Parameters whose value differs. */
export function ParametersChangeSection({ parameters }: Pick<Difference, 'parameters'>) {
  return (
    <section aria-labelledby="parameters">
      <SectionHead title="Parameters" id="parameters">
        {parameters.length === 0 ? 'none changed' : `${parameters.length} changed · SI`}
      </SectionHead>
      {parameters.length > 0 && (
        <WideTable label="Parameters">
          <table className="max-w-3xl">
            <caption className="sr-only">Parameters in A and in B, SI</caption>
            <thead>
              <tr>
                <th scope="col">parameter</th>
                <th scope="col" className="n">
                  A
                </th>
                <th scope="col" className="n">
                  B
                </th>
                <th scope="col" className="n">
                  change
                </th>
              </tr>
            </thead>
            <tbody>
              {parameters.map((p) => (
                <tr key={p.name}>
                  <th scope="row">{p.name}</th>
                  <td className="n">{valueText(p.a)}</td>
                  <td className="n">{valueText(p.b)}</td>
                  <td className="n">{changeText(p)}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </WideTable>
      )}
    </section>
  );
}

const changeText = ({ change, b }: ValueChange): string =>
  change === null ? '' : `${signed(formatShort(change))} ${unitText(b?.unit ?? '')}`.trim();

const valueText = (value: ValueChange['a']): string =>
  value === null ? '—' : `${formatShort(value.value)} ${unitText(value.unit)}`.trim();
