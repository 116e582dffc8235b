import { useRef } from 'react';
import type { RunDetail } from '#core/api/runs.ts';
import { useAddComment, useRemoveComment } from '#web/api/comments.ts';
import { Button } from '#web/components/button.tsx';
import { TextField } from '#web/components/field.tsx';
import { Form } from '#web/components/form.tsx';
import { ProblemNotice } from '#web/components/problem-notice.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { Time } from '#web/components/time.tsx';
import { announce } from '#web/lib/announce.ts';

/** What people said about a run; one can take back one's own words. */
export function CommentsSection({ detail, project }: { detail: RunDetail; project: string }) {
  const { run, comments, may } = detail;
  const add = useAddComment(project, run.id);
  const remove = useRemoveComment(project, run.id);
  const head = useRef<HTMLDivElement>(null);
  return (
    <section aria-labelledby="comments" className={comments.length === 0 ? 'screen-only' : ''}>
      <SectionHead title="Comments" id="comments">
        {comments.length === 0 ? 'none yet' : comments.length}
      </SectionHead>
      <div ref={head} tabIndex={-1} className="outline-none">
        {remove.error && <ProblemNotice error={remove.error} />}
        {comments.map((comment) => (
          <article key={comment.id} className="border-b border-rule py-3">
            <p className="soft text-sm">
              <b className="text-ink">{comment.by}</b>, <Time at={comment.at} />
              {comment.mine && (
                <Button
                  kind="word"
                  className="screen-only ml-3"
                  disabled={remove.isPending}
                  aria-label={`Remove your comment: ${comment.text.slice(0, 40)}`}
                  onClick={() =>
                    remove.mutate(comment.id, {
                      onSuccess: () => {
                        announce('Comment removed');
                        head.current?.focus();
                      },
                    })
                  }
                >
                  Remove
                </Button>
              )}
            </p>
            <p className="mt-1 max-w-[80ch] whitespace-pre-wrap break-words">{comment.text}</p>
          </article>
        ))}
      </div>
      {may.comment.allowed ? (
        <div className="screen-only">
          <Form
            act="Comment"
            kind="quiet"
            name="Comment on this run"
            check={(values) =>
              String(values.get('text')).trim() === ''
                ? { text: 'Write something first.' }
                : ({} as Record<string, string>)
            }
            submit={async (values, form) => {
              await add.mutateAsync(String(values.get('text')).trim());
              form.reset();
              announce('Comment added');
            }}
          >
            <TextField name="text" label="Your comment" maxLength={4000} rows={3} />
          </Form>
        </div>
      ) : (
        may.comment.why && <p className="soft screen-only mt-3 text-sm">{may.comment.why}</p>
      )}
    </section>
  );
}
