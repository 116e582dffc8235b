import { PageHead } from '#web/components/page-head.tsx';
import { NoPermission } from '#web/components/problem-page.tsx';
import { ProjectForm } from '#web/components/settings/project-form.tsx';
import { RemoveProject } from '#web/components/settings/remove-project.tsx';
import { useProject } from '#web/hooks/use-project.ts';

/** A project's name and watched branches, and its end; for administrators. */
export function Component() {
  const project = useProject();
  if (project.role !== 'administrator')
    return (
      <NoPermission
        detail={`The settings of ${project.name} are for administrators of the server.`}
        hint="If something in them should be otherwise, ask one of them."
      />
    );
  return (
    <>
      <PageHead title="Settings" shown={`Settings of ${project.name}`} of={project.name}>
        In addresses and in <code>STEELYARD_PROJECT</code> it is <b className="code">{project.slug}</b>, for
        good.
      </PageHead>
      <ProjectForm key={project.slug} project={project} />
      <RemoveProject project={project} />
    </>
  );
}
