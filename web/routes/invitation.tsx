import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useNavigate, useParams } from 'react-router-dom';
import type { OpenInvitation } from '#core/api/people.ts';
import { asProblem } from '#web/api/api-problem.ts';
import { queryOf, request } from '#web/api/client.ts';
import { enter } from '#web/api/session.ts';
import { ActionLink } from '#web/components/button.tsx';
import { Field } from '#web/components/field.tsx';
import { Form } from '#web/components/form.tsx';
import { NewPasswordFields, newPasswordFaults } from '#web/components/new-password-fields.tsx';
import { PageHead } from '#web/components/page-head.tsx';
import { ServerAway } from '#web/components/server-away.tsx';
import { Waiting } from '#web/components/waiting.tsx';
import { exactTextOf, faultsOf, textOf } from '#web/lib/form-values.ts';
import { MEMBER_ROLES } from '#web/lib/roles.ts';
import { PATHS } from '#web/paths.ts';

/** Accept an invitation by the link that came by mail. */
export function Component() {
  const { link = '' } = useParams();
  const invitation = useQuery({ ...queryOf('showInvitation', { places: { link } }), staleTime: Infinity });
  if (invitation.data) return <Accept link={link} invitation={invitation.data} />;
  if (!invitation.error)
    return (
      <div className="pt-10">
        <Waiting rows={4} />
      </div>
    );
  const problem = asProblem(invitation.error);
  if (problem.status !== 404 && problem.status !== 410)
    return <ServerAway error={invitation.error} retry={() => void invitation.refetch()} />;
  return (
    <>
      <PageHead title="This invitation no longer holds">
        It was accepted, withdrawn or has expired. Whoever invited you can send another.
      </PageHead>
      <p className="acts">
        <ActionLink to={PATHS.signIn}>Sign in</ActionLink>
      </p>
    </>
  );
}

function Accept({ link, invitation }: { link: string; invitation: OpenInvitation }) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const may = MEMBER_ROLES.find(({ role }) => role === invitation.role)?.may;
  return (
    <>
      <PageHead title={`Join ${invitation.project}`}>
        <b>{invitation.email}</b> is invited to {invitation.project} as <b>{invitation.role}</b>: {may}.
      </PageHead>
      <Form
        act={`Join ${invitation.project}`}
        acting="Joining…"
        check={(values) =>
          invitation.hasAccount
            ? {}
            : {
                ...faultsOf({ name: textOf(values, 'name') === '' && 'Write your name.' }),
                ...newPasswordFaults(values),
              }
        }
        submit={async (values) => {
          const body = invitation.hasAccount
            ? {}
            : { name: textOf(values, 'name'), password: exactTextOf(values, 'password') };
          const session = await request('acceptInvitation', { places: { link }, body });
          enter(client, session);
          await navigate(session.person ? `${PATHS.projects}?all` : PATHS.signIn, { replace: true });
        }}
      >
        {invitation.hasAccount ? (
          <p>Your account takes the role; its name and password stay.</p>
        ) : (
          <>
            <Field
              name="name"
              label="Your name"
              why="As it shall stand on runs and releases."
              autoComplete="name"
              maxLength={100}
            />
            <input type="hidden" name="username" autoComplete="username" value={invitation.email} readOnly />
            <NewPasswordFields label="Password" />
          </>
        )}
      </Form>
    </>
  );
}
