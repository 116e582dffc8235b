import { Link } from 'react-router-dom';
import { useMembers } from '#web/api/members.ts';
import { Invitations } from '#web/components/members/invitations.tsx';
import { MemberTable } from '#web/components/members/member-table.tsx';
import { PageHead } from '#web/components/page-head.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { View } from '#web/components/view.tsx';
import { useProject } from '#web/hooks/use-project.ts';
import { MEMBER_ROLES } from '#web/lib/roles.ts';
import { PATHS } from '#web/paths.ts';

/** Who works in a project, and for administrators who is invited to it. */
export function Component() {
  const project = useProject();
  const members = useMembers(project.slug);
  const administrator = project.role === 'administrator';
  return (
    <>
      <PageHead title="People" shown={`People of ${project.name}`} of={project.name}>
        {MEMBER_ROLES.map(({ role, may }, i) => (
          <span key={role}>
            {i > 0 && '; '}
            {i === 0 ? 'A' : 'an'} <b>{role}</b> {may}
          </span>
        ))}
        .
      </PageHead>
      <SectionHead title="Members">
        {administrator ? (
          <Link to={PATHS.people}>everybody on this server</Link>
        ) : (
          'administrators give roles and invite'
        )}
      </SectionHead>
      <View
        query={members}
        isEmpty={(list) => list.length === 0}
        empty={
          <p>
            Nobody has a role here yet{administrator ? ': invite the first below' : ''}. Administrators see
            every project without one.
          </p>
        }
      >
        {(list) => <MemberTable project={project} members={list} />}
      </View>
      {administrator && <Invitations project={project} />}
    </>
  );
}
