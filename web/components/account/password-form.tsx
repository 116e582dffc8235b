import { request } from '#web/api/client.ts';
import { Field } from '#web/components/field.tsx';
import { Form } from '#web/components/form.tsx';
import { NewPasswordFields, newPasswordFaults } from '#web/components/new-password-fields.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { useDone } from '#web/components/use-done.tsx';
import { exactTextOf, faultsOf } from '#web/lib/form-values.ts';

/** Changes the password; other sessions end by it. */
export function PasswordForm({ email }: { email: string }) {
  const [done, say] = useDone();
  return (
    <section aria-labelledby="password">
      <SectionHead title="Password" id="password">
        changing it ends your other sessions
      </SectionHead>
      <Form
        act="Change the password"
        acting="Changing…"
        kind="quiet"
        check={(values) => ({
          ...faultsOf({ current: exactTextOf(values, 'current') === '' && 'Write your present password.' }),
          ...newPasswordFaults(values),
        })}
        submit={async (values, form) => {
          const body = { current: exactTextOf(values, 'current'), password: exactTextOf(values, 'password') };
          await request('changePassword', { body });
          form.reset();
          say('The password is changed.');
        }}
        beside={done}
      >
        <input type="hidden" name="username" autoComplete="username" value={email} readOnly />
        <Field name="current" label="Present password" type="password" autoComplete="current-password" />
        <NewPasswordFields />
      </Form>
    </section>
  );
}
