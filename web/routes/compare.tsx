import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { Link, useSearchParams } from 'react-router-dom';
import type { Comparison } from '#core/api/runs.ts';
import { comparisonQuery } from '#web/api/comparison.ts';
import { AttributionSection } from '#web/components/compare/attribution.tsx';
import { totalsRows } from '#web/components/compare/change-rows.ts';
import { ChangeTable } from '#web/components/compare/change-table.tsx';
import { type CompareView, readCompareView } from '#web/components/compare/compare-view.ts';
import { ConventionsDiffer } from '#web/components/compare/conventions-differ.tsx';
import { LimitsChangeSection } from '#web/components/compare/limits-change.tsx';
import { ParametersChangeSection } from '#web/components/compare/parameters-change.tsx';
import { PrincipalChangeSection } from '#web/components/compare/principal-change.tsx';
import { QuantityName } from '#web/components/compare/quantity-name.tsx';
import { SidesLine } from '#web/components/compare/sides-line.tsx';
import { TextsChangeSection } from '#web/components/compare/texts-change.tsx';
import { withKeys } from '#web/components/history/history-view.ts';
import { unitsOfRow } from '#web/components/history/runs-units.ts';
import { PageHead } from '#web/components/page-head.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { Choice } from '#web/components/sentence/choice.tsx';
import { View } from '#web/components/view.tsx';
import { useChangeAddress } from '#web/hooks/use-change-address.ts';
import { useProject } from '#web/hooks/use-project.ts';
import { linkTo } from '#web/paths.ts';

/** What moved between two runs, and which part moved it; the address reproduces the view. */
export function Component() {
  const project = useProject();
  const [search] = useSearchParams();
  const change = useChangeAddress({ replace: true });
  const view = readCompareView(search);
  if (view.a === '' || view.b === '') return <NoSides project={project.slug} />;
  return (
    <Compared
      project={project.slug}
      projectName={project.name}
      view={view}
      change={change}
      swapped={(a, b) => `?${withKeys(search, { a: b, b: a })}`}
    />
  );
}

function Compared({
  project,
  projectName,
  view,
  change,
  swapped,
}: {
  project: string;
  projectName: string;
  view: CompareView;
  change: (changes: Record<string, string | null>) => void;
  swapped: (a: string, b: string) => string;
}) {
  const comparison = useQuery({
    ...comparisonQuery(project, view.a, view.b, view.on),
    placeholderData: keepPreviousData,
  });
  const baseline = view.a === 'baseline';
  return (
    <>
      <PageHead
        title={baseline ? 'What moved since the baseline' : 'What moved from A to B'}
        of={projectName}
      >
        {comparison.data && (
          <SidesLine
            comparison={comparison.data}
            project={project}
            baseline={baseline}
            swapped={swapped(comparison.data.a.id, comparison.data.b.id)}
          />
        )}
      </PageHead>
      <View query={comparison} rows={12}>
        {(data) => <Sections comparison={data} view={view} change={change} />}
      </View>
    </>
  );
}

function Sections({
  comparison,
  view,
  change,
}: {
  comparison: Comparison;
  view: CompareView;
  change: (changes: Record<string, string | null>) => void;
}) {
  const { difference, b } = comparison;
  const units = unitsOfRow(b, 'file');
  return (
    <>
      <ConventionsDiffer conventions={difference.conventions} />
      {difference.a.stamp === difference.b.stamp && (
        <p className="mt-4 font-semibold">
          Nothing moved: both sides have one stamp, so they are one record.
        </p>
      )}
      <section aria-labelledby="totals">
        <SectionHead title="Totals" id="totals">
          <span className="sentence text-sm">
            <Choice
              name="masses"
              value={difference.on}
              options={[
                { value: 'predicted', label: 'predicted', hint: 'with the growth allowance' },
                { value: 'basic', label: 'basic', hint: 'as the parts are' },
              ]}
              onChoose={(on) => change({ on })}
            />
          </span>{' '}
          masses, each about its own centre
        </SectionHead>
        <ChangeTable
          label="Totals"
          rows={totalsRows(difference, units).map((row) => ({
            ...row,
            head: <QuantityName name={row.name} />,
          }))}
        />
      </section>
      <PrincipalChangeSection difference={difference} units={units} />
      <LimitsChangeSection difference={difference} units={units} />
      <AttributionSection difference={difference} units={units} view={view} change={change} />
      <ParametersChangeSection parameters={difference.parameters} />
      <TextsChangeSection comparison={comparison} />
    </>
  );
}

const NoSides = ({ project }: { project: string }) => (
  <>
    <PageHead title="Nothing to compare yet">The address names no two runs.</PageHead>
    <p className="mt-4">
      Choose two runs in the <Link to={linkTo.history(project)}>history</Link> to see what moved between them.
    </p>
  </>
);
