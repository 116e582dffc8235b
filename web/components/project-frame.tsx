import { useQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import { Outlet, useMatches, useParams } from 'react-router-dom';
import { projectQuery, useProjects } from '#web/api/projects.ts';
import { keepLastProject } from '#web/lib/last-project.ts';
import { Caution } from './caution.tsx';
import { ProblemPage } from './problem-page.tsx';
import { Waiting } from './waiting.tsx';

/** What a route says of itself. */
export interface RouteHandle {
  /** Numbers are read there: the cautionary line stands at its foot. */
  readonly figures?: boolean;
}

/** Pages of one project; hands it to them (`useProject`). A project that is not in one's list is asked for by name. */
export function ProjectFrame() {
  const slug = useParams().project ?? '';
  const projects = useProjects();
  const figures = useMatches().some(({ handle }) => (handle as RouteHandle | undefined)?.figures);
  const listed = projects.data?.find((project) => project.slug === slug);
  const asked = useQuery({
    ...projectQuery(slug),
    enabled: (projects.data !== undefined || projects.error !== null) && listed === undefined,
  });
  const project = listed ?? asked.data;
  useEffect(() => {
    if (project) keepLastProject(project.slug);
  }, [project]);
  if (project)
    return (
      <>
        <Outlet context={project} />
        {figures && <Caution />}
      </>
    );
  if (asked.error) return <ProblemPage error={asked.error} retry={() => void asked.refetch()} />;
  return (
    <div className="pt-10">
      <Waiting />
    </div>
  );
}
