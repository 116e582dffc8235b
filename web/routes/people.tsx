import { useQueryClient } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { Person } from '#core/api/people.ts';
import { request } from '#web/api/client.ts';
import { peopleQuery, usePeople } from '#web/api/people.ts';
import { Confirm } from '#web/components/confirm.tsx';
import { DataTable } from '#web/components/data-table.tsx';
import { PageHead } from '#web/components/page-head.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { Time } from '#web/components/time.tsx';
import { View } from '#web/components/view.tsx';
import { usePerson } from '#web/hooks/use-session-here.ts';
import { linkTo } from '#web/paths.ts';

/** Everybody on the server; for administrators. */
export function Component() {
  const people = usePeople();
  const me = usePerson();
  return (
    <>
      <PageHead title="Everybody on this server">
        An <b>administrator</b> sees every project, gives roles, and reads the audit trail. New people come by
        invitation, on a project’s page People. Nobody is deleted: what they did keeps their name.
      </PageHead>
      <SectionHead title="Accounts">one administrator always stays</SectionHead>
      <View query={people}>
        {(list) => (
          <DataTable
            caption="Accounts"
            rows={list}
            keyOf={({ id }) => id}
            columns={[
              {
                key: 'name',
                head: 'name',
                cell: ({ name, administrator, active }) => (
                  <>
                    {name}
                    {administrator && <b> · administrator</b>}
                    {!active && <span className="soft font-normal"> · account shut</span>}
                  </>
                ),
              },
              { key: 'email', head: 'e-mail', cell: ({ email }) => email },
              { key: 'projects', head: 'projects', cell: (person) => <Roles of={person} /> },
              {
                key: 'seen',
                head: 'last seen',
                cell: ({ lastSeen }) => (lastSeen === null ? 'never' : <Time at={lastSeen} />),
              },
              {
                key: 'acts',
                head: '',
                cell: (person) =>
                  person.id === me.id ? (
                    <span className="soft">you: another administrator changes it</span>
                  ) : (
                    <Acts person={person} />
                  ),
              },
            ]}
          />
        )}
      </View>
    </>
  );
}

function Roles({ of: { projects, administrator } }: { of: Person }) {
  if (projects.length === 0)
    return <span className="soft">{administrator ? 'all, as administrator' : 'none'}</span>;
  return projects.map(({ project, role }, i) => (
    <span key={project}>
      {i > 0 && ', '}
      <Link to={linkTo.members(project)}>{project}</Link> <span className="soft">{role}</span>
    </span>
  ));
}

function Acts({ person }: { person: Person }) {
  const client = useQueryClient();
  const change = async (body: { administrator?: boolean; active?: boolean }) => {
    await request('changePerson', { places: { person: String(person.id) }, body });
    await client.invalidateQueries({ queryKey: peopleQuery.queryKey });
  };
  return (
    <span className="flex flex-wrap gap-x-4 gap-y-1">
      {person.active && (
        <Confirm
          act={person.administrator ? 'Administrator no more' : 'Make administrator'}
          name={`${person.administrator ? 'Take administrator from' : 'Make administrator:'} ${person.name}`}
          kind="word"
          question={
            person.administrator
              ? 'Roles in projects stay.'
              : 'They will see every project and change everybody’s rights.'
          }
          yes={person.administrator ? 'Take it away' : 'Make administrator'}
          done={`${person.name} is ${person.administrator ? 'no longer' : 'now'} administrator`}
          run={() => change({ administrator: !person.administrator })}
        />
      )}
      <Confirm
        act={person.active ? 'Shut the account' : 'Open the account again'}
        name={`${person.active ? 'Shut' : 'Open again'} the account of ${person.name}`}
        kind={person.active ? 'grave word' : 'word'}
        question={
          person.active
            ? 'Ends their sessions and their own tokens; what they did stays.'
            : 'They sign in again with their password.'
        }
        yes={person.active ? 'Shut it' : 'Open it'}
        done={`The account of ${person.name} is ${person.active ? 'shut' : 'open'}`}
        run={() => change({ active: !person.active })}
      />
    </span>
  );
}
