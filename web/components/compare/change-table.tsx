import type { ReactNode } from 'react';
import { WideTable } from '#web/components/wide-table.tsx';
import type { ChangeRow } from './change-rows.ts';

/** A, B, their change, and the change as a share of A. */
export function ChangeTable({
  label,
  rows,
  remark,
}: {
  label: string;
  rows: readonly (ChangeRow & { readonly head: ReactNode; readonly remark?: ReactNode })[];
  /** The head of the remarks, where there are any. */
  remark?: string;
}) {
  return (
    <WideTable label={label}>
      <table>
        <caption className="sr-only">{label}: A, B and the change from A to B</caption>
        <thead>
          <tr>
            <th scope="col">
              <span className="sr-only">quantity</span>
            </th>
            <th scope="col" className="n">
              A
            </th>
            <th scope="col" className="n">
              B
            </th>
            <th scope="col" className="n">
              change
            </th>
            <th scope="col" className="n">
              of A
            </th>
            {remark !== undefined && <th scope="col">{remark}</th>}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => {
            const still = /^[0.]*$/.test(row.change);
            return (
              <tr key={row.name} className={still ? 'text-ink-soft' : ''}>
                <th scope="row">
                  {row.head} <span className="u">{row.unit}</span>
                </th>
                <td className="n">{row.a}</td>
                <td className="n">{row.b}</td>
                <td className={`n ${still ? '' : 'font-semibold'}`}>{row.change}</td>
                <td className="n">{row.ofA}</td>
                {remark !== undefined && <td>{row.remark}</td>}
              </tr>
            );
          })}
        </tbody>
      </table>
    </WideTable>
  );
}
