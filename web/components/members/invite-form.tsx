import type { Member } from '#core/api/people.ts';
import type { Project } from '#core/api/projects.ts';
import { request } from '#web/api/client.ts';
import { Field, SelectField } from '#web/components/field.tsx';
import { Form } from '#web/components/form.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { useDone } from '#web/components/use-done.tsx';
import { emailFault, faultsOf, textOf } from '#web/lib/form-values.ts';
import { MEMBER_ROLES } from '#web/lib/roles.ts';

/** Invites by mail. Who has an account already takes the role with it. */
export function InviteForm({ project, invited }: { project: Project; invited: () => Promise<unknown> }) {
  const [done, say] = useDone();
  return (
    <section aria-labelledby="invite">
      <SectionHead title="Invite" id="invite">
        a link goes out by mail; it works once
      </SectionHead>
      <Form
        act="Send the invitation"
        acting="Sending…"
        check={(values) => faultsOf({ email: emailFault(textOf(values, 'email')) })}
        submit={async (values, form) => {
          const email = textOf(values, 'email');
          const role = textOf(values, 'role') as Member['role'];
          await request('invite', { places: { project: project.slug }, body: { email, role } });
          form.reset();
          await invited();
          say(`Sent to ${email}.`);
        }}
        beside={done}
      >
        <Field name="email" label="E-mail" type="email" autoComplete="off" />
        <SelectField name="role" label="Role" defaultValue="engineer">
          {MEMBER_ROLES.map(({ role, may }) => (
            <option key={role} value={role}>
              {role} – {may}
            </option>
          ))}
        </SelectField>
      </Form>
    </section>
  );
}
