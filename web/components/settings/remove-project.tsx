import { useQueryClient } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import type { Project } from '#core/api/projects.ts';
import { request } from '#web/api/client.ts';
import { projectsQuery } from '#web/api/projects.ts';
import { Field } from '#web/components/field.tsx';
import { Form } from '#web/components/form.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { announce } from '#web/lib/announce.ts';
import { faultsOf, textOf } from '#web/lib/form-values.ts';
import { PATHS } from '#web/paths.ts';

/** Removes a project with everything in it, once its name in addresses is typed by hand. */
export function RemoveProject({ project }: { project: Project }) {
  const client = useQueryClient();
  const navigate = useNavigate();
  return (
    <section aria-labelledby="remove">
      <SectionHead title="Remove the project" id="remove">
        cannot be undone
      </SectionHead>
      <p>
        {project.runs === 0
          ? 'It has no runs.'
          : `Its ${project.runs.toLocaleString('en-GB')} runs go with it, the released ones too, with their comments, tokens and roles.`}{' '}
        The audit trail keeps that it was removed, and by whom.
      </p>
      <Form
        act={`Remove ${project.name} for good`}
        acting="Removing…"
        kind="grave"
        check={(values) =>
          faultsOf({ slug: textOf(values, 'slug') !== project.slug && `Type ${project.slug}, exactly.` })
        }
        submit={async () => {
          await request('removeProject', {
            places: { project: project.slug },
            body: { slug: project.slug },
          });
          await navigate(`${PATHS.projects}?all`, { replace: true });
          await client.invalidateQueries({ queryKey: projectsQuery.queryKey });
          announce(`${project.name} is removed`);
        }}
      >
        <Field
          name="slug"
          label={
            <>
              To remove it, type <span className="code">{project.slug}</span>
            </>
          }
          autoComplete="off"
          spellCheck={false}
        />
      </Form>
    </section>
  );
}
