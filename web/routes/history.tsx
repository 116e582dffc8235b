import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { Link, useSearchParams } from 'react-router-dom';
import { choicesQuery } from '#web/api/choices.ts';
import { runsQuery } from '#web/api/runs.ts';
import { EmptyHistory } from '#web/components/history/empty-history.tsx';
import { HistorySentence } from '#web/components/history/history-sentence.tsx';
import { isFiltered, readHistoryView, withKeys } from '#web/components/history/history-view.ts';
import { ListActs } from '#web/components/history/list-acts.tsx';
import { RunsTable } from '#web/components/history/runs-table.tsx';
import { TrendSection } from '#web/components/history/trend.tsx';
import { useTwoChosen } from '#web/components/history/use-two-chosen.ts';
import { PageHead } from '#web/components/page-head.tsx';
import { View } from '#web/components/view.tsx';
import { useChangeAddress } from '#web/hooks/use-change-address.ts';
import { useProject } from '#web/hooks/use-project.ts';
import { atLeast } from '#web/lib/roles.ts';

/** A project's runs: filters as a sentence, the trend of a quantity, the list; all of it in the address. */
export function Component() {
  const project = useProject();
  const [search] = useSearchParams();
  const change = useChangeAddress();
  const view = readHistoryView(search);
  const runs = useQuery({ ...runsQuery(project.slug, view), placeholderData: keepPreviousData });
  const choices = useQuery(choicesQuery(project.slug));
  const { chosen, choose } = useTwoChosen();
  const none = runs.data?.rows.length === 0 && !isFiltered(view) && view.cursor === undefined;
  return (
    <>
      <PageHead title={`Runs of ${project.name}`} of={project.name} />
      {none ? (
        <EmptyHistory project={project.slug} mayPush={atLeast(project.role, 'engineer')} />
      ) : (
        <>
          <HistorySentence view={view} choices={choices.data} change={change} />
          <TrendSection
            project={project.slug}
            view={view}
            onQuantity={(quantity) => change({ quantity: quantity === 'mass' ? null : quantity })}
          />
          <View
            query={runs}
            rows={12}
            isEmpty={(page) => page.rows.length === 0}
            empty={<NoneFits filtered={isFiltered(view)} />}
          >
            {(page) => (
              <div aria-busy={runs.isPlaceholderData}>
                <RunsTable
                  project={project.slug}
                  rows={page.rows}
                  sort={view.sort}
                  onSort={(sort) => change({ sort: sort === 'newest' ? null : sort })}
                  chosen={chosen}
                  onChoose={choose}
                />
                <ListActs
                  project={project.slug}
                  view={view}
                  next={page.next}
                  chosen={chosen}
                  toPlace={(cursor) => `?${withKeys(search, { cursor })}`}
                />
              </div>
            )}
          </View>
        </>
      )}
    </>
  );
}

const NoneFits = ({ filtered }: { filtered: boolean }) => (
  <p className="mt-8">
    No run {filtered ? 'fits this sentence' : 'stands beyond this place in the list'}.{' '}
    <Link to="?">Start over</Link>
  </p>
);
