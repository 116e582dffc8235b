import { useEffect, useRef } from 'react';
import type { CreatedToken } from '#core/api/people.ts';
import { Button } from '#web/components/button.tsx';
import { CopyBlock } from '#web/components/copy-block.tsx';

/** A new token's secret, shown this once, with the lines that put it to use. */
export function TokenSecret({
  created: { token, secret },
  project,
  done,
}: {
  created: CreatedToken;
  project: string;
  done: () => void;
}) {
  const root = useRef<HTMLElement>(null);
  // biome-ignore lint/correctness/useExhaustiveDependencies: another secret takes the focus again.
  useEffect(() => {
    root.current?.focus();
    root.current?.scrollIntoView({ block: 'nearest' });
  }, [secret]);
  const lines = [
    `export STEELYARD_SERVER=${location.origin}`,
    `export STEELYARD_TOKEN=${secret}`,
    `export STEELYARD_PROJECT=${project}`,
  ].join('\n');
  return (
    <section ref={root} tabIndex={-1} className="notice good" aria-label={`The secret of ${token.label}`}>
      <p className="font-semibold">“{token.label}” is made. Copy its secret now: it is not shown again.</p>
      <CopyBlock text={secret} what="secret" />
      <p className="mt-3">
        {token.kind === 'machine' ? 'In CI, set these three, the token among its secrets:' : 'In your shell:'}
      </p>
      <CopyBlock text={lines} what="lines" />
      <p className="acts">
        <Button kind="quiet" onClick={done}>
          I have kept it
        </Button>
      </p>
    </section>
  );
}
