import { asProblem } from '#web/api/api-problem.ts';
import { asSentence } from '#web/lib/sentence.ts';
import { PATHS } from '#web/paths.ts';
import { ActionLink } from './button.tsx';
import { PageHead } from './page-head.tsx';
import { ServerAway } from './server-away.tsx';

/** A page that cannot be shown: not found, no permission, or the server away, each with a way on. */
export function ProblemPage({ error, retry }: { error: unknown; retry: () => void }) {
  const problem = asProblem(error);
  if (problem.status === 404) return <NotFound detail={problem.detail} hint={problem.hint} />;
  if (problem.status === 403) return <NoPermission detail={problem.detail} hint={problem.hint} />;
  return <ServerAway error={error} retry={retry} />;
}

export function NotFound({ detail, hint }: { detail?: string | undefined; hint?: string | undefined }) {
  return (
    <>
      <PageHead title="Nothing hangs here">
        <p>{asSentence(detail ?? 'No page has this address')}</p>
        <p>{asSentence(hint ?? 'It may have been mistyped, or what it led to was removed')}</p>
      </PageHead>
      <p className="acts">
        <ActionLink to={PATHS.projects}>To your projects</ActionLink>
      </p>
    </>
  );
}

export function NoPermission({ detail, hint }: { detail?: string | undefined; hint?: string | undefined }) {
  return (
    <>
      <PageHead title="Not yours to see">
        <p>{asSentence(detail ?? 'Your role does not reach this page')}</p>
        <p>{asSentence(hint ?? 'An administrator gives roles: ask one of yours')}</p>
      </PageHead>
      <p className="acts">
        <ActionLink to={PATHS.projects}>To your projects</ActionLink>
      </p>
    </>
  );
}
