import { useState } from 'react';
import { Link } from 'react-router-dom';
import { request } from '#web/api/client.ts';
import { ActionLink } from '#web/components/button.tsx';
import { Field } from '#web/components/field.tsx';
import { Form } from '#web/components/form.tsx';
import { Notice } from '#web/components/notice.tsx';
import { PageHead } from '#web/components/page-head.tsx';
import { useSessionHere } from '#web/hooks/use-session-here.ts';
import { emailFault, faultsOf, textOf } from '#web/lib/form-values.ts';
import { PATHS } from '#web/paths.ts';

/** Ask for a link that sets a new password. The answer is the same whether or not there is such an account. */
export function Component() {
  const { demo } = useSessionHere();
  const [sentTo, setSentTo] = useState<string | null>(null);
  return (
    <>
      <PageHead title="A new password">A link comes by mail. It works once, for a short time.</PageHead>
      {sentTo === null ? (
        <Form
          act="Send the link"
          acting="Sending…"
          check={(values) => faultsOf({ email: emailFault(textOf(values, 'email')) })}
          submit={async (values) => {
            const email = textOf(values, 'email');
            await request('askReset', { body: { email } });
            setSentTo(email);
          }}
          beside={<Link to={PATHS.signIn}>Back to sign in</Link>}
        >
          <Field name="email" label="E-mail of your account" type="email" autoComplete="username" />
        </Form>
      ) : (
        <>
          <Notice kind="good" title="On its way, if there is such an account">
            <p>
              If {sentTo} has an account here, a link is on its way to it. Nothing after some minutes? Look
              whether the address is the one you were invited under.
            </p>
          </Notice>
          <p className="acts">
            {demo && <ActionLink to={PATHS.mail}>Read the demo’s mail</ActionLink>}
            <ActionLink kind="quiet" to={PATHS.signIn}>
              Back to sign in
            </ActionLink>
          </p>
        </>
      )}
    </>
  );
}
