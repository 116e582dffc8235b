import { ActionLink } from '#web/components/button.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { linkTo } from '#web/paths.ts';

/** A project without runs: the commands that send the first one, with its name in them. */
export function EmptyHistory({ project, mayPush }: { project: string; mayPush: boolean }) {
  const server = window.location.origin;
  return (
    <section>
      <SectionHead title="No run yet" />
      <p className="max-w-[72ch]">
        A run comes here from the command line, or from a pipeline on every commit. Where the command is
        installed:
      </p>
      <pre className="my-4 whitespace-pre-wrap break-words border-l-[3px] border-ink py-1 pl-4 leading-relaxed">
        <code>{`steelyard sign-in --server ${server} --project ${project}\nsteelyard run assembly.yaml --push --project ${project}`}</code>
      </pre>
      <p className="max-w-[72ch]">In a pipeline, with a token of this project in its secrets:</p>
      <pre className="my-4 whitespace-pre-wrap break-words border-l-[3px] border-ink py-1 pl-4 leading-relaxed">
        <code>
          {`export STEELYARD_SERVER=${server}\nexport STEELYARD_PROJECT=${project}\nexport STEELYARD_TOKEN=…\nsteelyard check assembly.yaml --push`}
        </code>
      </pre>
      <p className="acts">
        {mayPush && <ActionLink to={linkTo.tokens(project)}>Make a token</ActionLink>}
        {mayPush && (
          <ActionLink kind="quiet" to={linkTo.upload(project)}>
            Upload files instead
          </ActionLink>
        )}
      </p>
    </section>
  );
}
