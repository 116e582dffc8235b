import { Link } from 'react-router-dom';
import type { RunRow } from '#core/api/runs.ts';
import { DataTable } from '#web/components/data-table.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { VerdictMark } from '#web/components/verdict-mark.tsx';
import { linkTo } from '#web/paths.ts';

/** What came of an upload: a run for each state, with its verdict. */
export function UploadedRuns({ project, runs }: { project: string; runs: readonly RunRow[] }) {
  return (
    <section aria-labelledby="uploaded">
      <SectionHead
        title={runs.length === 1 ? 'One run is kept' : `${runs.length} runs are kept`}
        id="uploaded"
      >
        <Link to={linkTo.history(project)}>see the history</Link>
      </SectionHead>
      <DataTable
        caption="Runs of this upload"
        rows={runs}
        keyOf={({ id }) => id}
        columns={[
          {
            key: 'state',
            head: 'run',
            cell: ({ id, assembly, state }) => (
              <Link to={linkTo.run(project, id)}>
                {assembly}, {state}
              </Link>
            ),
          },
          { key: 'verdict', head: 'verdict', cell: ({ verdict }) => <VerdictMark verdict={verdict} /> },
          {
            key: 'outside',
            head: 'broken limits',
            cell: ({ outside }) => (outside.length === 0 ? 'none' : outside.join(', ')),
          },
        ]}
      />
    </section>
  );
}
