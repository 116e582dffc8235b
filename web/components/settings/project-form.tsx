import { useQueryClient } from '@tanstack/react-query';
import type { Project } from '#core/api/projects.ts';
import { request } from '#web/api/client.ts';
import { projectQuery, projectsQuery } from '#web/api/projects.ts';
import { Field, TextField } from '#web/components/field.tsx';
import { Form } from '#web/components/form.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { useDone } from '#web/components/use-done.tsx';
import { faultsOf, textOf } from '#web/lib/form-values.ts';

const BRANCHES_AT_MOST = 20;

/** A project's name, and the branches on which a newly broken limit is told by mail. */
export function ProjectForm({ project }: { project: Project }) {
  const client = useQueryClient();
  const [done, say] = useDone();
  return (
    <section aria-labelledby="name-and-branches">
      <SectionHead title="Name and watched branches" id="name-and-branches" />
      <Form
        act="Keep the settings"
        check={(values) =>
          faultsOf({
            name: textOf(values, 'name') === '' && 'Write a name.',
            branches:
              branchesOf(values).length > BRANCHES_AT_MOST && `Watch at most ${BRANCHES_AT_MOST} branches.`,
          })
        }
        submit={async (values) => {
          await request('changeProject', {
            places: { project: project.slug },
            body: { name: textOf(values, 'name'), watchedBranches: branchesOf(values) },
          });
          await Promise.all([
            client.invalidateQueries({ queryKey: projectsQuery.queryKey }),
            client.invalidateQueries({ queryKey: projectQuery(project.slug).queryKey }),
          ]);
          say('The settings are kept.');
        }}
        beside={done}
      >
        <Field name="name" label="Name" defaultValue={project.name} maxLength={100} />
        <TextField
          name="branches"
          label="Watched branches"
          why="One a line. A limit that is newly broken on one of them is told by mail to everyone who wants it."
          defaultValue={project.watchedBranches.join('\n')}
          spellCheck={false}
          rows={4}
        />
      </Form>
    </section>
  );
}

function branchesOf(values: FormData): string[] {
  const lines = textOf(values, 'branches')
    .split('\n')
    .map((line) => line.trim());
  return [...new Set(lines)].filter((line) => line !== '');
}
