import { Navigate, Outlet, useLocation, useOutletContext } from 'react-router-dom';
import type { Session } from '#core/api/people.ts';
import { linkTo } from '#web/paths.ts';

/** Pages for whoever is signed in; others sign in first and come back here. */
export function SignedIn() {
  const session = useOutletContext<Session>();
  const { pathname, search } = useLocation();
  if (!session.person) return <Navigate to={linkTo.signIn(pathname + search)} replace />;
  return <Outlet context={session} />;
}
