import { useQueryClient } from '@tanstack/react-query';
import type { Account } from '#core/api/people.ts';
import { accountQuery } from '#web/api/account.ts';
import { request } from '#web/api/client.ts';
import { Tick } from '#web/components/field.tsx';
import { Form } from '#web/components/form.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { useDone } from '#web/components/use-done.tsx';

/** Which mail one wants. */
export function MailChoices({ mail }: { mail: Account['mail'] }) {
  const client = useQueryClient();
  const [done, say] = useDone();
  return (
    <section aria-labelledby="mail">
      <SectionHead title="Mail" id="mail">
        every message has a link that stops it
      </SectionHead>
      <Form
        act="Keep the choice"
        kind="quiet"
        submit={async (values) => {
          const choice = { limits: values.has('limits'), releases: values.has('releases') };
          await request('changeAccount', { body: { mail: choice } });
          await client.invalidateQueries({ queryKey: accountQuery.queryKey });
          say('The choice is kept.');
        }}
        beside={done}
      >
        <fieldset>
          <legend>Write to me when</legend>
          <Tick
            name="limits"
            defaultChecked={mail.limits}
            label="a limit is newly broken on a branch that a project of mine watches"
          />
          <Tick
            name="releases"
            defaultChecked={mail.releases}
            label="a release is asked for, made or withdrawn in a project of mine"
          />
        </fieldset>
        <p className="soft">Invitations and links for a new password always come.</p>
      </Form>
    </section>
  );
}
