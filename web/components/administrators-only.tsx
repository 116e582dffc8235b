import { Outlet, useOutletContext } from 'react-router-dom';
import type { Session } from '#core/api/people.ts';
import { NoPermission } from './problem-page.tsx';

/** Pages for administrators. */
export function AdministratorsOnly() {
  const session = useOutletContext<Session>();
  if (!session.person?.administrator)
    return (
      <NoPermission
        detail="This page is for administrators of the server."
        hint="If you need something from it, ask one of them."
      />
    );
  return <Outlet context={session} />;
}
