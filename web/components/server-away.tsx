import { asProblem } from '#web/api/api-problem.ts';
import { PageHead } from './page-head.tsx';
import { ProblemNotice } from './problem-notice.tsx';

/** The whole page where nothing can be shown because the server does not answer. */
export function ServerAway({ error, retry }: { error: unknown; retry: () => void }) {
  const away = asProblem(error).code === 'SERVER_AWAY';
  return (
    <>
      <PageHead title={away ? 'The server is away' : 'This page could not be loaded'} />
      <ProblemNotice error={error} retry={retry} />
      {away && (
        <p className="conv">
          Runs that are pushed meanwhile wait in the tray of whoever pushes them: <code>steelyard push</code>{' '}
          sends them later, and sending twice changes nothing.
        </p>
      )}
    </>
  );
}
