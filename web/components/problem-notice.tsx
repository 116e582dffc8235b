import type { Ref } from 'react';
import { asProblem } from '#web/api/api-problem.ts';
import { asSentence } from '#web/lib/sentence.ts';
import { Button } from './button.tsx';
import { Notice } from './notice.tsx';

/** A failed request in words: what, why, how to mend it, its code, and a retry where that can help. */
export function ProblemNotice({
  error,
  retry,
  ref,
}: {
  error: unknown;
  retry?: (() => void) | undefined;
  ref?: Ref<HTMLDivElement>;
}) {
  const problem = asProblem(error);
  return (
    <Notice kind="bad" title={problem.title} ref={ref}>
      <p>{asSentence(problem.detail)}</p>
      {problem.hint !== undefined && <p>{asSentence(problem.hint)}</p>}
      <p className="soft code">
        {problem.code}
        {problem.requestId !== undefined && ` · request ${problem.requestId}`}
      </p>
      {retry && (
        <p className="acts">
          <Button kind="quiet" onClick={retry}>
            Try again
          </Button>
        </p>
      )}
    </Notice>
  );
}
