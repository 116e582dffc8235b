import { useQueryClient } from '@tanstack/react-query';
import type { Member } from '#core/api/people.ts';
import type { Project } from '#core/api/projects.ts';
import { request } from '#web/api/client.ts';
import { membersQuery } from '#web/api/members.ts';
import { Confirm } from '#web/components/confirm.tsx';
import { type Column, DataTable } from '#web/components/data-table.tsx';
import { RoleChanger } from './role-changer.tsx';

/** The members of a project; administrators change roles and take them away in place. */
export function MemberTable({ project, members }: { project: Project; members: readonly Member[] }) {
  const client = useQueryClient();
  const administrator = project.role === 'administrator';
  const load = () => client.invalidateQueries({ queryKey: membersQuery(project.slug).queryKey });
  const columns: Column<Member>[] = [
    {
      key: 'name',
      head: 'name',
      cell: ({ name, active }) => (
        <>
          {name}
          {!active && <span className="soft font-normal"> · account shut</span>}
        </>
      ),
    },
    { key: 'email', head: 'e-mail', cell: ({ email }) => email },
    {
      key: 'role',
      head: 'role',
      cell: (member) =>
        administrator ? <RoleChanger project={project.slug} member={member} changed={load} /> : member.role,
    },
  ];
  if (administrator)
    columns.push({
      key: 'acts',
      head: '',
      cell: ({ person, name, role }) => (
        <Confirm
          act="Take the role away"
          name={`Take the role of ${name} away`}
          question={`${name} then sees nothing of ${project.name}.`}
          yes={`Take ${role} away`}
          done={`${name} is no longer ${role}`}
          run={async () => {
            await request('removeMember', { places: { project: project.slug, person: String(person) } });
            await load();
          }}
        />
      ),
    });
  return (
    <DataTable
      caption={`Members of ${project.name}`}
      columns={columns}
      rows={members}
      keyOf={({ person }) => person}
    />
  );
}
