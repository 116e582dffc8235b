import { Link } from 'react-router-dom';
import type { RunRow } from '#core/api/runs.ts';
import { ReleasedMark } from '#web/components/released-mark.tsx';
import { Time } from '#web/components/time.tsx';
import { VerdictMark } from '#web/components/verdict-mark.tsx';
import { linkTo } from '#web/paths.ts';
import { runName } from './run-name.ts';
import type { columnsOf } from './runs-units.ts';

/** One run of the list. Roles are written out because `display` would take them away. */
export function RunLine({
  project,
  row,
  columns: { mass, centre, moments },
  chosen,
  onChoose,
}: {
  project: string;
  row: RunRow;
  columns: ReturnType<typeof columnsOf>;
  chosen: boolean;
  onChoose: () => void;
}) {
  return (
    // biome-ignore-start lint/a11y/noRedundantRoles: reflow sets display, which removes a table's own roles.
    // biome-ignore-start lint/a11y/useSemanticElements: the same.
    <tr role="row" className="relative">
      <td role="cell" data-label="" className="max-[720px]:absolute max-[720px]:right-0 max-[720px]:top-2.5">
        <input
          type="checkbox"
          aria-label={`choose ${runName(row)}, ${row.assembly}, ${row.state}`}
          checked={chosen}
          onChange={onChoose}
        />
      </td>
      <th role="rowheader" scope="row" className="whitespace-nowrap">
        <ReleaseState row={row} />
        <Link to={linkTo.run(project, row.id)} className="code">
          {runName(row)}
        </Link>
        {row.dirty && <span className="soft block text-sm">not as committed</span>}
        {row.tag && <span className="soft block text-sm">{row.tag}</span>}
      </th>
      <td role="cell" data-label="assembly, state">
        <span>
          {row.assembly}, {row.state}
        </span>
      </td>
      <td role="cell" data-label="branch">
        {row.branch === null ? (
          <span className="soft text-sm">{row.commit === null ? 'not in git' : 'no branch'}</span>
        ) : (
          <span className="code max-w-44 break-words md:inline-block">{row.branch}</span>
        )}
      </td>
      <td role="cell" className="n" data-label={`mass ${mass.scale.head}`}>
        <span>{mass.text(row.mass)}</span>
      </td>
      <td role="cell" className="n" data-label={`centre x ${centre.scale.head}`}>
        <span>{centre.text(row.centre?.[0])}</span>
      </td>
      <td role="cell" className="n" data-label={`moments ${moments.scale.head}`}>
        <span>{row.moments ? <Moments texts={row.moments.map(moments.text)} /> : '—'}</span>
      </td>
      <td role="cell" data-label="verdict">
        <span>
          <VerdictMark verdict={row.verdict} />
          <Recomputed row={row} />
        </span>
      </td>
      <td role="cell" data-label="pushed by">
        <span className="md:whitespace-nowrap">{row.pushedBy}</span>
      </td>
      <td role="cell" data-label="when">
        <Time at={row.at} />
      </td>
    </tr>
    // biome-ignore-end lint/a11y/useSemanticElements: the same.
    // biome-ignore-end lint/a11y/noRedundantRoles: reflow sets display, which removes a table's own roles.
  );
}

const Moments = ({ texts }: { texts: readonly string[] }) =>
  texts.map((text, i) => (
    // biome-ignore lint/suspicious/noArrayIndexKey: in the order of size
    <span key={i}>
      {i > 0 && <span className="soft px-[0.35em] font-text">·</span>}
      {text}
    </span>
  ));

const ReleaseState = ({ row }: { row: RunRow }) => {
  if (row.release === 'released') return <ReleasedMark />;
  if (row.release === 'withdrawn') return <ReleasedMark withdrawn />;
  return null;
};

/** Said only where it is not the usual: that the server came to the same bits. */
function Recomputed({ row: { recomputation, release } }: { row: RunRow }) {
  const said = [
    recomputation.status === 'recomputed'
      ? ''
      : recomputation.status === 'waiting'
        ? 'being recomputed'
        : recomputation.status,
    release === 'asked' ? 'release asked for' : '',
  ].filter(Boolean);
  const bad = recomputation.status === 'differs';
  return said.length === 0 ? null : (
    <span className={`block text-sm ${bad ? 'text-outside' : 'text-ink-soft'}`}>{said.join(' · ')}</span>
  );
}
