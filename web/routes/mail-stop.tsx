import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { request } from '#web/api/client.ts';
import { ActionLink } from '#web/components/button.tsx';
import { PageHead } from '#web/components/page-head.tsx';
import { ProblemNotice } from '#web/components/problem-notice.tsx';
import { Waiting } from '#web/components/waiting.tsx';
import { PATHS } from '#web/paths.ts';

/** Stops mail with the one click that led here: the request is sent as the page opens, once. */
export function Component() {
  const { link = '' } = useParams();
  const stopped = useQuery({
    queryKey: ['stopMail', link],
    queryFn: () => request('stopMail', { places: { link } }),
    staleTime: Infinity,
    refetchOnWindowFocus: false,
  });
  if (stopped.error)
    return (
      <>
        <PageHead title="The mail could not be stopped" />
        <ProblemNotice error={stopped.error} retry={() => void stopped.refetch()} />
        <Choose />
      </>
    );
  if (!stopped.isSuccess)
    return (
      <>
        <PageHead title="Stopping your mail" />
        <Waiting rows={2} what="Stopping" />
      </>
    );
  return (
    <>
      <PageHead title="The mail is stopped">
        No more mail about limits and releases comes to you. Invitations and links for a new password still
        do.
      </PageHead>
      <Choose />
    </>
  );
}

function Choose() {
  return (
    <p className="acts">
      <ActionLink kind="quiet" to={PATHS.account}>
        Choose your mail in your account
      </ActionLink>
    </p>
  );
}
