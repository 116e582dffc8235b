import type { Release, RunDetail } from '#core/api/runs.ts';
import { ReleasedMark } from '#web/components/released-mark.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { Time } from '#web/components/time.tsx';
import { ReleaseActs } from './release-acts.tsx';

/** Who prepared, checked and approved a run, and what may be done with it next. */
export function ReleaseSection({ detail, project }: { detail: RunDetail; project: string }) {
  const { release, run } = detail;
  return (
    <section aria-labelledby="release">
      <SectionHead title="Release" id="release">
        <StateWords release={release} />
      </SectionHead>
      <Names release={release} pushedBy={run.pushedBy} at={run.at} />
      {release?.reason && (
        <p className="mt-3 max-w-[80ch]">
          <b>Released with a broken limit because:</b> {release.reason}
        </p>
      )}
      {release?.state === 'withdrawn' && (
        <p className="mt-3 max-w-[80ch]">
          <b>Withdrawn</b> by {release.withdrawnBy}
          {release.withdrawnAt && (
            <>
              , <Time at={release.withdrawnAt} />
            </>
          )}
          {release.withdrawnReason && `: ${release.withdrawnReason}`}
        </p>
      )}
      <ReleaseActs detail={detail} project={project} />
    </section>
  );
}

function StateWords({ release }: { release: Release | null }) {
  if (!release) return 'not asked for';
  if (release.state === 'asked') return release.checkedBy ? 'asked for and checked' : 'asked for';
  return (
    <>
      <ReleasedMark withdrawn={release.state === 'withdrawn'} />
      {release.state === 'released' ? 'released as the baseline' : 'withdrawn'}
    </>
  );
}

function Names({ release, pushedBy, at }: { release: Release | null; pushedBy: string; at: string }) {
  const rows = [
    { what: 'Prepared', by: release?.preparedBy ?? pushedBy, at: release?.preparedAt ?? at },
    { what: 'Checked', by: release?.checkedBy ?? null, at: release?.checkedAt ?? null },
    { what: 'Approved', by: release?.approvedBy ?? null, at: release?.approvedAt ?? null },
  ];
  return (
    <table className="max-w-xl">
      <caption className="sr-only">Prepared, checked and approved</caption>
      <thead className="sr-only">
        <tr>
          <th scope="col">step</th>
          <th scope="col">by</th>
          <th scope="col">when</th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.what}>
            <th scope="row" className="w-28">
              {row.what}
            </th>
            <td>{row.by ?? <span className="soft whitespace-nowrap">not yet</span>}</td>
            <td className="text-right">{row.at && <Time at={row.at} />}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
