import { Outlet, ScrollRestoration } from 'react-router-dom';
import { useSession } from '#web/api/session.ts';
import { Announcer } from './announcer.tsx';
import { Masthead } from './masthead.tsx';
import { ServerAway } from './server-away.tsx';
import { Waiting } from './waiting.tsx';

/** Every page: skip link, masthead, the page, the live region. */
export function Layout() {
  const session = useSession();
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
      <Announcer />
      <ScrollRestoration />
    </div>
  );
}
