import { useQueryClient } from '@tanstack/react-query';
import type { Invitation } from '#core/api/people.ts';
import type { Project } from '#core/api/projects.ts';
import { request } from '#web/api/client.ts';
import { invitationsQuery, useInvitations } from '#web/api/members.ts';
import { Confirm } from '#web/components/confirm.tsx';
import { DataTable } from '#web/components/data-table.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { Time } from '#web/components/time.tsx';
import { View } from '#web/components/view.tsx';
import { InviteForm } from './invite-form.tsx';

/** Invitations that nobody has accepted yet, and a form for another. */
export function Invitations({ project }: { project: Project }) {
  const client = useQueryClient();
  const invitations = useInvitations(project.slug);
  const load = () => client.invalidateQueries({ queryKey: invitationsQuery(project.slug).queryKey });
  const withdraw = async ({ id }: Invitation) => {
    await request('withdrawInvitation', { places: { project: project.slug, invitation: String(id) } });
    await load();
  };
  return (
    <>
      <section aria-labelledby="invitations">
        <SectionHead title="Invitations" id="invitations">
          not yet accepted
        </SectionHead>
        <View
          query={invitations}
          rows={2}
          isEmpty={(list) => list.length === 0}
          empty={<p className="soft">None is open.</p>}
        >
          {(list) => (
            <DataTable
              caption="Open invitations"
              rows={list}
              keyOf={({ id }) => id}
              columns={[
                { key: 'email', head: 'e-mail', cell: ({ email }) => email },
                { key: 'role', head: 'role', cell: ({ role }) => role },
                { key: 'by', head: 'invited by', cell: ({ invitedBy }) => invitedBy },
                { key: 'at', head: 'on', cell: ({ at }) => <Time at={at} dayOnly /> },
                {
                  key: 'expires',
                  head: 'holds until',
                  cell: ({ expiresAt, state }) =>
                    state === 'expired' ? <span className="soft">expired</span> : <Time at={expiresAt} />,
                },
                {
                  key: 'acts',
                  head: '',
                  cell: (invitation) => (
                    <Confirm
                      act="Withdraw"
                      name={`Withdraw the invitation of ${invitation.email}`}
                      question="Its link stops working."
                      yes="Withdraw it"
                      done={`The invitation of ${invitation.email} is withdrawn`}
                      run={() => withdraw(invitation)}
                    />
                  ),
                },
              ]}
            />
          )}
        </View>
      </section>
      <InviteForm project={project} invited={load} />
    </>
  );
}
