import { useQuery } from '@tanstack/react-query';
import { useParams, useSearchParams } from 'react-router-dom';
import type { RunDetail } from '#core/api/runs.ts';
import { asProblem } from '#web/api/api-problem.ts';
import { runQuery } from '#web/api/run.ts';
import { Notice } from '#web/components/notice.tsx';
import { PageHead } from '#web/components/page-head.tsx';
import { ProblemPage } from '#web/components/problem-page.tsx';
import { CommentsSection } from '#web/components/run/comments.tsx';
import { ConventionsLine } from '#web/components/run/conventions-line.tsx';
import { RunActs } from '#web/components/run/downloads.tsx';
import { FramesSection } from '#web/components/run/frames.tsx';
import { GroupsSection } from '#web/components/run/groups.tsx';
import { InputsSection } from '#web/components/run/input-texts.tsx';
import { LimitsSection } from '#web/components/run/limits.tsx';
import { OrientationSection } from '#web/components/run/orientation.tsx';
import { PartsSection } from '#web/components/run/parts.tsx';
import type { PartsSort } from '#web/components/run/parts-tree.ts';
import { PrincipalSection } from '#web/components/run/principal.tsx';
import { ParametersSection, ProvenanceSection } from '#web/components/run/provenance.tsx';
import { ReleaseSection } from '#web/components/run/release.tsx';
import { OverridesSection, WarningsSection } from '#web/components/run/remarks.tsx';
import { readRunView } from '#web/components/run/run-view.ts';
import { TensorSection } from '#web/components/run/tensor.tsx';
import { ThreeViewSection } from '#web/components/run/three-view.tsx';
import { TotalsSection } from '#web/components/run/totals.tsx';
import { ViewSentence } from '#web/components/run/view-sentence.tsx';
import { View } from '#web/components/view.tsx';
import { useChangeAddress } from '#web/hooks/use-change-address.ts';
import { useProject } from '#web/hooks/use-project.ts';

/** One run: what it is, its figures in the reader's own conventions, its limits, its parts, and its release. */
export function Component() {
  const project = useProject();
  const id = useParams().run ?? '';
  const run = useQuery({
    ...runQuery(project.slug, id),
    // While the server recomputes it, its verdict on the run is looked for again.
    refetchInterval: (query) => (query.state.data?.run.recomputation.status === 'waiting' ? 4000 : false),
  });
  if (run.error && !run.data && [403, 404].includes(asProblem(run.error).status))
    return <ProblemPage error={run.error} retry={() => void run.refetch()} />;
  return (
    <View query={run} rows={14}>
      {(detail) => <RunPage detail={detail} project={project.slug} projectName={project.name} />}
    </View>
  );
}

const SORTS: readonly PartsSort[] = ['file', 'mass', 'xx', 'yy', 'zz'];

function RunPage({
  detail,
  project,
  projectName,
}: {
  detail: RunDetail;
  project: string;
  projectName: string;
}) {
  const { record, run } = detail;
  const [search] = useSearchParams();
  const change = useChangeAddress({ replace: true });
  const view = readRunView(search, record);
  const sort = SORTS.find((s) => s === search.get('sort')) ?? 'mass';
  return (
    <>
      <PageHead title={`${record.assembly}, ${record.state}`} of={projectName}>
        <ConventionsLine detail={detail} view={view} />
      </PageHead>
      <ViewSentence record={record} view={view} change={change} />
      {view.unitsFault && (
        <Notice kind="bad" title="The address names units that cannot be shown">
          <p>{view.unitsFault}; figures are in the file’s units.</p>
        </Notice>
      )}
      <div className="cols print:block">
        <div className="min-w-0">
          <TotalsSection record={record} view={view} />
          <TensorSection record={record} view={view} />
          <PrincipalSection record={record} view={view} />
          <OrientationSection record={record} view={view} />
        </div>
        <div className="min-w-0">
          <ThreeViewSection detail={detail} project={project} view={view} />
          <ReleaseSection detail={detail} project={project} />
        </div>
      </div>
      <LimitsSection record={record} view={view} baseline={detail.baselineLimits} />
      <OverridesSection record={record} view={view} />
      <WarningsSection record={record} />
      <PartsSection
        record={record}
        view={view}
        sort={sort}
        onSort={(next) => change({ sort: next === 'mass' ? null : next })}
      />
      <RunActs detail={detail} project={project} />
      <div className="cols print:block">
        <div className="min-w-0">
          <GroupsSection record={record} view={view} title="By category" groups={record.byCategory} />
          <GroupsSection record={record} view={view} title="By basis" groups={record.byBasis} />
          <CommentsSection detail={detail} project={project} key={run.id} />
        </div>
        <div className="min-w-0">
          <ProvenanceSection detail={detail} />
          <ParametersSection detail={detail} />
        </div>
      </div>
      <FramesSection record={record} view={view} />
      <InputsSection record={record} project={project} run={run.id} />
    </>
  );
}
