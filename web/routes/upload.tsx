import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import { Link } from 'react-router-dom';
import type { Uploaded } from '#core/api/push.ts';
import { PageHead } from '#web/components/page-head.tsx';
import { Faults } from '#web/components/upload/faults.tsx';
import { UploadForm } from '#web/components/upload/upload-form.tsx';
import { UploadedRuns } from '#web/components/upload/uploaded-runs.tsx';
import { useProject } from '#web/hooks/use-project.ts';
import { announce } from '#web/lib/announce.ts';
import { atLeast } from '#web/lib/roles.ts';
import { linkTo } from '#web/paths.ts';

/** Roll up an assembly on the server from files of one's own; faults stand against their text. */
export function Component() {
  const project = useProject();
  const client = useQueryClient();
  const [answer, setAnswer] = useState<Uploaded | null>(null);
  const result = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (answer) result.current?.focus();
  }, [answer]);
  const may = atLeast(project.role, 'engineer');
  return (
    <>
      <PageHead title="Upload" of={project.name}>
        {may ? (
          <>
            An assembly’s YAML file with what it includes and its meshes. The server rolls it up as the
            command does; nothing is kept until every file is sound. From git, <code>steelyard push</code>{' '}
            also brings the commit.
          </>
        ) : (
          <>
            You read {project.name} as <b>{project.role}</b>. Engineers and approvers upload: an administrator
            gives roles. What was pushed is in the <Link to={linkTo.history(project.slug)}>history</Link>.
          </>
        )}
      </PageHead>
      {may && (
        <UploadForm
          project={project.slug}
          answered={(uploaded) => {
            setAnswer(uploaded);
            if (!uploaded) return;
            announce(
              uploaded.faults.length > 0
                ? `${uploaded.faults.length} faults found, nothing kept`
                : `${uploaded.runs.length} runs kept`,
            );
            void client.invalidateQueries({ queryKey: ['listRuns'] });
            void client.invalidateQueries({ queryKey: ['showTrend'] });
            void client.invalidateQueries({ queryKey: ['listChoices'] });
            void client.invalidateQueries({ queryKey: ['listProjects'] });
          }}
        />
      )}
      <div ref={result} tabIndex={-1} className="outline-none">
        {answer && answer.faults.length > 0 && <Faults faults={answer.faults} texts={answer.texts} />}
        {answer && answer.faults.length === 0 && <UploadedRuns project={project.slug} runs={answer.runs} />}
      </div>
    </>
  );
}
