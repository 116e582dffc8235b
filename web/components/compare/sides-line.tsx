import { Link } from 'react-router-dom';
import type { Comparison, RunRow } from '#core/api/runs.ts';
import { runName } from '#web/components/history/run-name.ts';
import { ReleasedMark } from '#web/components/released-mark.tsx';
import { Time } from '#web/components/time.tsx';
import { linkTo } from '#web/paths.ts';

/** Which runs stand on which side, and how their figures are to be read. */
export function SidesLine({
  comparison: { a, b, difference },
  project,
  baseline,
  swapped,
}: {
  comparison: Comparison;
  project: string;
  /** Whether A was asked for as the baseline. */
  baseline: boolean;
  /** The address of the same view with the sides swapped. */
  swapped: string;
}) {
  const alike = a.assembly === b.assembly && a.state === b.state;
  return (
    <p>
      <b>A</b> <Side row={a} project={project} baseline={baseline} named={!alike} /> · <b>B</b>{' '}
      <Side row={b} project={project} baseline={false} named={!alike} /> ·{' '}
      {alike && (
        <>
          {b.assembly}, state <b>{b.state}</b>,{' '}
        </>
      )}
      <b>{difference.on}</b> masses, body axes, about each run’s own centre, products <b>negative</b>; change
      = B − A.{' '}
      <Link to={swapped} className="screen-only">
        Swap sides
      </Link>
    </p>
  );
}

function Side({
  row,
  project,
  baseline,
  named,
}: {
  row: RunRow;
  project: string;
  baseline: boolean;
  named: boolean;
}) {
  return (
    <>
      {row.release === 'released' && <ReleasedMark />}
      {baseline && 'baseline '}
      <Link to={linkTo.run(project, row.id)} className="code">
        {runName(row)}
      </Link>
      {row.branch && (
        <>
          {' '}
          on <span className="code break-all">{row.branch}</span>
        </>
      )}
      {named && ` (${row.assembly}, ${row.state})`}, <Time at={row.at} dayOnly />
    </>
  );
}
