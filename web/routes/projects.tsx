import { Link, Navigate, useSearchParams } from 'react-router-dom';
import type { Project } from '#core/api/projects.ts';
import { useProjects } from '#web/api/projects.ts';
import { DataTable } from '#web/components/data-table.tsx';
import { NewProject } from '#web/components/new-project.tsx';
import { PageHead } from '#web/components/page-head.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { Time } from '#web/components/time.tsx';
import { View } from '#web/components/view.tsx';
import { usePerson } from '#web/hooks/use-session-here.ts';
import { linkTo } from '#web/paths.ts';

/** One's projects; whoever has one goes straight on to it, unless `?all` asks for the list. */
export function Component() {
  const person = usePerson();
  const projects = useProjects();
  const [search] = useSearchParams();
  const only = projects.data?.length === 1 ? projects.data[0] : undefined;
  if (only && !search.has('all')) return <Navigate to={linkTo.history(only.slug)} replace />;
  return (
    <>
      <PageHead title="Projects">
        A project holds the runs of the machines that one team answers for.
      </PageHead>
      <SectionHead title="Yours">your role decides what you may do in each</SectionHead>
      <View
        query={projects}
        rows={3}
        isEmpty={(list) => list.length === 0}
        empty={
          <p>
            You are in no project yet.{' '}
            {person.administrator
              ? 'Start the first one below.'
              : 'An administrator invites people to projects: ask one of yours.'}
          </p>
        }
      >
        {(list) => <ProjectTable projects={list} />}
      </View>
      {person.administrator && <NewProject />}
    </>
  );
}

function ProjectTable({ projects }: { projects: readonly Project[] }) {
  return (
    <DataTable
      caption="Your projects"
      rows={projects}
      keyOf={({ slug }) => slug}
      columns={[
        {
          key: 'name',
          head: 'project',
          cell: ({ slug, name }) => <Link to={linkTo.history(slug)}>{name}</Link>,
        },
        { key: 'slug', head: 'in addresses', cell: ({ slug }) => <span className="code">{slug}</span> },
        { key: 'role', head: 'your role', cell: ({ role }) => role },
        { key: 'runs', head: 'runs', numeric: true, cell: ({ runs }) => runs.toLocaleString('en-GB') },
        {
          key: 'latest',
          head: 'last run',
          cell: ({ latest }) => (latest === null ? 'none yet' : <Time at={latest} />),
        },
      ]}
    />
  );
}
