import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { CreatedToken, Role } from '#core/api/people.ts';
import { tokensQuery, useTokens } from '#web/api/tokens.ts';
import { PageHead } from '#web/components/page-head.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { NewToken } from '#web/components/tokens/new-token.tsx';
import { TokenSecret } from '#web/components/tokens/token-secret.tsx';
import { TokenTable } from '#web/components/tokens/token-table.tsx';
import { View } from '#web/components/view.tsx';
import { useProject } from '#web/hooks/use-project.ts';
import { atLeast } from '#web/lib/roles.ts';

/** Tokens with which the command and CI speak to the server. */
export function Component() {
  const project = useProject();
  const tokens = useTokens(project.slug);
  const client = useQueryClient();
  const [created, setCreated] = useState<CreatedToken | null>(null);
  const load = () => client.invalidateQueries({ queryKey: tokensQuery(project.slug).queryKey });
  const mayMake = atLeast(project.role, 'engineer');
  return (
    <>
      <PageHead title="Tokens" shown={`Tokens for ${project.name}`} of={project.name}>
        With a token <code>steelyard push</code> sends runs, and scripts read them. It belongs to this project
        alone, expires, and is kept here only as a hash.
      </PageHead>
      {created && <TokenSecret created={created} project={project.slug} done={() => setCreated(null)} />}
      <SectionHead title={titleOf(project.role)}>revoked at once, everywhere</SectionHead>
      <View
        query={tokens}
        rows={3}
        isEmpty={(list) => list.length === 0}
        empty={<p>{mayMake ? 'None yet. Make the first below.' : 'You have none.'}</p>}
      >
        {(list) => <TokenTable project={project.slug} tokens={list} changed={load} />}
      </View>
      {mayMake ? (
        <NewToken
          project={project.slug}
          made={async (made) => {
            setCreated(made);
            await load();
          }}
        />
      ) : (
        <p className="conv mt-6">
          You read {project.name} as <b>{project.role}</b>. Tokens are made by engineers and approvers: an
          administrator gives roles.
        </p>
      )}
    </>
  );
}

/** Machines' tokens are seen by those who may make them. */
function titleOf(role: Role): string {
  if (role === 'administrator') return 'Everybody’s';
  return atLeast(role, 'engineer') ? 'Yours and the machines’' : 'Yours';
}
