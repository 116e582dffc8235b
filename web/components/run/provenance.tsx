import type { ReactNode } from 'react';
import type { RunDetail } from '#core/api/runs.ts';
import { formatShort, unitText } from '#core/figures/index.ts';
import { SectionHead } from '#web/components/section-head.tsx';
import { Time } from '#web/components/time.tsx';
import { WideTable } from '#web/components/wide-table.tsx';

/** Where the run came from and what it was computed with. */
export function ProvenanceSection({ detail: { run, record } }: { detail: RunDetail }) {
  const { provenance: p, conventions } = record;
  const rows: [string, ReactNode][] = [
    ['commit', p.commit ? <Code key="c">{p.commit}</Code> : 'not in git'],
    ['branch', p.branch && <Code key="b">{p.branch}</Code>],
    ['tag', p.tag && <Code key="t">{p.tag}</Code>],
    ['author of the commit', p.author],
    ['working tree', p.dirty === undefined ? null : p.dirty ? 'not as committed' : 'as committed'],
    ['pipeline', p.ci && [p.ci.name, p.ci.run].filter(Boolean).join(', ')],
    ['computed', <Time key="a" at={p.at} />],
    ['came here', <Time key="w" at={run.at} />],
    ['pushed by', run.pushedBy],
    [
      'with',
      [p.tool, `core ${conventions.coreVersion}`, p.node && `Node ${p.node}`].filter(Boolean).join(', '),
    ],
    ['stamp', <Code key="s">{record.stamp}</Code>],
    ['recomputed here', recomputationText(run.recomputation)],
  ];
  return (
    <section aria-labelledby="provenance">
      <SectionHead title="Provenance" id="provenance" />
      <dl className="grid grid-cols-[9.5rem_minmax(0,1fr)] gap-x-4 max-sm:grid-cols-1">
        {rows.map(([name, value]) =>
          value ? (
            <div key={name} className="col-span-full grid grid-cols-subgrid border-b border-rule py-1.5">
              <dt className="soft text-sm leading-6">{name}</dt>
              <dd className="min-w-0 break-words">{value}</dd>
            </div>
          ) : null,
        )}
      </dl>
    </section>
  );
}

const Code = ({ children }: { children: string }) => <span className="code break-all">{children}</span>;

function recomputationText({ status, detail }: RunDetail['run']['recomputation']): string {
  const words = {
    recomputed: 'to the same bits',
    waiting: 'waiting for its turn',
    differs: 'with another result',
    'not recomputable': 'cannot be',
  }[status];
  return detail ? `${words}: ${detail}` : words;
}

/** Parameters with their values in SI. */
export function ParametersSection({ detail: { record } }: { detail: RunDetail }) {
  const entries = Object.entries(record.parameters);
  if (entries.length === 0) return null;
  return (
    <section aria-labelledby="parameters">
      <SectionHead title="Parameters" id="parameters">
        SI
      </SectionHead>
      <WideTable label="Parameters">
        <table>
          <caption className="sr-only">Parameters and their values in SI</caption>
          <thead className="sr-only">
            <tr>
              <th scope="col">parameter</th>
              <th scope="col">value</th>
            </tr>
          </thead>
          <tbody>
            {entries.map(([name, { value, unit }]) => (
              <tr key={name}>
                <th scope="row" className="break-all">
                  {name}
                </th>
                <td className="n">
                  {formatShort(value)} <span className="u">{unitText(unit)}</span>
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </WideTable>
    </section>
  );
}
