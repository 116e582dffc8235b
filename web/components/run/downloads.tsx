import type { RunDetail } from '#core/api/runs.ts';
import { drawingAddress, partsAddress, recordAddress, urdfAddress } from '#web/api/run.ts';
import { ActionLink, Button, DownloadLink } from '#web/components/button.tsx';
import { linkTo } from '#web/paths.ts';

/** The run as files, as a report, and beside its baseline. */
export function RunActs({
  detail: { run, baseline, hasDrawing },
  project,
}: {
  detail: RunDetail;
  project: string;
}) {
  return (
    <div className="acts screen-only">
      {baseline && (
        <ActionLink kind="quiet" to={linkTo.compare(project, 'baseline', run.id)}>
          Compare with the baseline
        </ActionLink>
      )}
      <Button kind="quiet" onClick={() => window.print()}>
        Report
      </Button>
      <span className="flex flex-wrap items-center gap-x-4 gap-y-1 sm:ml-3">
        <span className="soft">Download</span>
        <DownloadLink kind="word" href={recordAddress(project, run.id)}>
          record JSON
        </DownloadLink>
        <DownloadLink kind="word" href={partsAddress(project, run.id)}>
          parts CSV
        </DownloadLink>
        <DownloadLink kind="word" href={urdfAddress(project, run.id)}>
          URDF &lt;inertial&gt;
        </DownloadLink>
        {hasDrawing && (
          <DownloadLink kind="word" href={drawingAddress(project, run.id)}>
            drawing SVG
          </DownloadLink>
        )}
      </span>
    </div>
  );
}
