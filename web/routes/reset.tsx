import { useNavigate, useParams } from 'react-router-dom';
import { request } from '#web/api/client.ts';
import { Form } from '#web/components/form.tsx';
import { NewPasswordFields, newPasswordFaults } from '#web/components/new-password-fields.tsx';
import { PageHead } from '#web/components/page-head.tsx';
import { exactTextOf } from '#web/lib/form-values.ts';
import { PATHS } from '#web/paths.ts';

/** Set a new password by the link that came by mail. */
export function Component() {
  const { link = '' } = useParams();
  const navigate = useNavigate();
  return (
    <>
      <PageHead title="Set a new password">It ends every session you have, here and elsewhere.</PageHead>
      <Form
        act="Set the password"
        acting="Setting…"
        check={newPasswordFaults}
        submit={async (values) => {
          await request('resetPassword', {
            places: { link },
            body: { password: exactTextOf(values, 'password') },
          });
          await navigate(`${PATHS.signIn}?set`, { replace: true });
        }}
      >
        <NewPasswordFields />
      </Form>
    </>
  );
}
