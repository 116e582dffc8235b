import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { request } from '#web/api/client.ts';
import { projectsQuery } from '#web/api/projects.ts';
import { announce } from '#web/lib/announce.ts';
import { faultsOf, textOf } from '#web/lib/form-values.ts';
import { slugFault, slugOf } from '#web/lib/slug.ts';
import { linkTo } from '#web/paths.ts';
import { Field } from './field.tsx';
import { Form } from './form.tsx';
import { SectionHead } from './section-head.tsx';

/** Starts a project; its part of addresses follows its name until it is written by hand. */
export function NewProject() {
  const client = useQueryClient();
  const navigate = useNavigate();
  const [slug, setSlug] = useState<{ text: string; byHand: boolean }>({ text: '', byHand: false });
  return (
    <section aria-labelledby="new-project">
      <SectionHead title="Start a project" id="new-project" />
      <Form
        act="Start it"
        acting="Starting…"
        kind="quiet"
        check={(values) =>
          faultsOf({
            name: textOf(values, 'name') === '' && 'Write a name.',
            slug: slugFault(textOf(values, 'slug')),
          })
        }
        submit={async (values) => {
          const body = { name: textOf(values, 'name'), slug: textOf(values, 'slug') };
          const project = await request('createProject', { body });
          await client.invalidateQueries({ queryKey: projectsQuery.queryKey });
          announce(`${project.name} is started`);
          await navigate(linkTo.history(project.slug));
        }}
      >
        <Field
          name="name"
          label="Name"
          maxLength={100}
          onChange={(event) => slug.byHand || setSlug({ text: slugOf(event.target.value), byHand: false })}
        />
        <Field
          name="slug"
          label="In addresses and in STEELYARD_PROJECT"
          why="Small letters, digits and hyphens. It stays as it is."
          maxLength={60}
          spellCheck={false}
          value={slug.text}
          onChange={(event) => setSlug({ text: event.target.value, byHand: event.target.value !== '' })}
        />
      </Form>
    </section>
  );
}
