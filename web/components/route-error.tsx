import { isRouteErrorResponse, useRouteError } from 'react-router-dom';
import { NotFound } from './problem-page.tsx';
import { ServerAway } from './server-away.tsx';

/** What stands where a page failed to load or to draw itself. */
export function RouteError() {
  const error = useRouteError();
  return (
    <div className="sheet">
      <main className="pt-10">
        {isRouteErrorResponse(error) && error.status === 404 ? (
          <NotFound />
        ) : (
          <ServerAway error={error} retry={() => location.reload()} />
        )}
      </main>
    </div>
  );
}
