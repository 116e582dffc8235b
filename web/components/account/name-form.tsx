import { useQueryClient } from '@tanstack/react-query';
import { accountQuery } from '#web/api/account.ts';
import { request } from '#web/api/client.ts';
import { sessionQuery } from '#web/api/session.ts';
import { Field } from '#web/components/field.tsx';
import { Form } from '#web/components/form.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { useDone } from '#web/components/use-done.tsx';
import { faultsOf, textOf } from '#web/lib/form-values.ts';

/** One's name as it stands on runs and releases from now on. */
export function NameForm({ name }: { name: string }) {
  const client = useQueryClient();
  const [done, say] = useDone();
  return (
    <section aria-labelledby="name">
      <SectionHead title="Name" id="name">
        stands on what you do from now on
      </SectionHead>
      <Form
        act="Keep the name"
        kind="quiet"
        check={(values) => faultsOf({ name: textOf(values, 'name') === '' && 'Write your name.' })}
        submit={async (values) => {
          await request('changeAccount', { body: { name: textOf(values, 'name') } });
          await Promise.all([
            client.invalidateQueries({ queryKey: accountQuery.queryKey }),
            client.invalidateQueries({ queryKey: sessionQuery.queryKey }),
          ]);
          say('The name is kept.');
        }}
        beside={done}
      >
        <Field name="name" label="Your name" defaultValue={name} autoComplete="name" maxLength={100} />
      </Form>
    </section>
  );
}
