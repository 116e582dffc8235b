import type { Account } from '#core/api/people.ts';
import { signOut } from '#web/api/session.ts';
import { Confirm } from '#web/components/confirm.tsx';
import { DataTable } from '#web/components/data-table.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { Time } from '#web/components/time.tsx';
import { agentName } from '#web/lib/agent-name.ts';

/** Where one is signed in, and the way to end it all. */
export function Sessions({ sessions }: { sessions: Account['sessions'] }) {
  return (
    <section aria-labelledby="sessions">
      <SectionHead title="Where you are signed in" id="sessions">
        one you do not know? Sign out everywhere, then change the password
      </SectionHead>
      <DataTable
        caption="Your sessions"
        rows={sessions}
        keyOf={({ since, agent }) => since + agent}
        columns={[
          {
            key: 'agent',
            head: 'with',
            cell: ({ agent, here }) => (
              <>
                <span title={agent}>{agentName(agent)}</span>
                {here && <b> · this one</b>}
              </>
            ),
          },
          { key: 'since', head: 'since', cell: ({ since }) => <Time at={since} /> },
          { key: 'seen', head: 'last seen', cell: ({ lastSeen }) => <Time at={lastSeen} /> },
        ]}
      />
      <div className="acts">
        <Confirm
          act="Sign out everywhere"
          kind="quiet"
          question="This ends every session, this one too."
          yes="Sign out everywhere"
          run={() => signOut(true)}
        />
      </div>
    </section>
  );
}
