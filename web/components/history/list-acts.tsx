import { Link, useNavigate } from 'react-router-dom';
import type { RunRow } from '#core/api/runs.ts';
import { runsCsvAddress } from '#web/api/runs.ts';
import { Button, DownloadLink } from '#web/components/button.tsx';
import { linkTo } from '#web/paths.ts';
import type { HistoryView, Sort } from './history-view.ts';
import { inOrder, runName } from './run-name.ts';

const FURTHER: Record<Sort, string> = {
  newest: 'Older runs',
  oldest: 'Newer runs',
  heaviest: 'Lighter runs',
  lightest: 'Heavier runs',
};

/** Below the list: on to its next page or back to its start, compare two, download what is shown. */
export function ListActs({
  project,
  view,
  next,
  chosen,
  toPlace,
}: {
  project: string;
  view: HistoryView;
  next: string | null;
  chosen: readonly RunRow[];
  /** The address of another place in the list. */
  toPlace: (cursor: string | null) => string;
}) {
  const navigate = useNavigate();
  const [one, other] = chosen;
  const both = one && other ? inOrder(one, other) : null;
  return (
    <>
      {(view.cursor !== undefined || next !== null) && (
        <nav aria-label="Places in the list" className="screen-only mt-3 flex gap-6">
          {next !== null && <Link to={toPlace(next)}>{FURTHER[view.sort]}</Link>}
          {view.cursor !== undefined && <Link to={toPlace(null)}>From the start</Link>}
        </nav>
      )}
      <div className="acts">
        <Button
          aria-disabled={both === null}
          onClick={() => both && navigate(linkTo.compare(project, both[0].id, both[1].id))}
        >
          Compare the two chosen
        </Button>
        <DownloadLink href={runsCsvAddress(project, view)}>Download as CSV</DownloadLink>
        <span className="soft screen-only text-sm">
          {both
            ? `A ${runName(both[0])} · B ${runName(both[1])}`
            : one
              ? `${runName(one)} is chosen; choose another to compare it with`
              : 'Choose two runs in the list to compare them'}
        </span>
      </div>
    </>
  );
}
