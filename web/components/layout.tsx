import { Outlet, ScrollRestoration, useMatches } from 'react-router-dom';
import { useSession } from '#web/api/session.ts';
import { Announcer } from './announcer.tsx';
import { Caution } from './caution.tsx';
import { Masthead } from './masthead.tsx';
import { ServerAway } from './server-away.tsx';
import { Waiting } from './waiting.tsx';

/** What a route says of itself. */
export interface RouteHandle {
  /** Numbers are read there: the cautionary line stands at its foot. */
  readonly figures?: boolean;
}

/** Every page: skip link, masthead, the page, its foot. */
export function Layout() {
  const session = useSession();
  const figures = useMatches().some(({ handle }) => (handle as RouteHandle | undefined)?.figures);
  return (
    <div className="sheet">
      <a className="skip" href="#main">
        Skip to the page
      </a>
      <Masthead session={session.data} />
      <main id="main" tabIndex={-1} className="outline-none">
        {session.data ? (
          <Outlet context={session.data} />
        ) : session.error ? (
          <ServerAway error={session.error} retry={() => void session.refetch()} />
        ) : (
          <div className="pt-10">
            <Waiting />
          </div>
        )}
      </main>
      {figures && session.data?.person && <Caution />}
      <Announcer />
      <ScrollRestoration />
    </div>
  );
}
