import { type ReactNode, useEffect, useRef, useState } from 'react';
import { asProblem } from '#web/api/api-problem.ts';
import { announce } from '#web/lib/announce.ts';
import { asSentence } from '#web/lib/sentence.ts';
import { Button } from './button.tsx';

/** A button that asks once, in its own place, before it does what is hard to undo. */
export function Confirm({
  act,
  name,
  kind = 'grave word',
  question,
  yes,
  done,
  run,
}: {
  act: string;
  /** For screen readers, where the button alone does not say what it is about. */
  name?: string;
  kind?: 'quiet' | 'grave' | 'word' | 'grave word';
  question: ReactNode;
  /** On the button that does it. */
  yes: string;
  /** Said when it is done. */
  done?: string;
  run: () => Promise<unknown>;
}) {
  const [asking, setAsking] = useState(false);
  const [busy, setBusy] = useState(false);
  const [fault, setFault] = useState<string | null>(null);
  const first = useRef<HTMLButtonElement>(null);
  const again = useRef<HTMLButtonElement>(null);
  const asked = useRef(false);
  useEffect(() => {
    if (asking) first.current?.focus();
    else if (asked.current) again.current?.focus();
    asked.current = asking;
  }, [asking]);
  const go = async () => {
    setBusy(true);
    setFault(null);
    try {
      await run();
      if (done !== undefined) announce(done);
      setAsking(false);
    } catch (error) {
      setFault(asSentence(asProblem(error).detail));
    } finally {
      setBusy(false);
    }
  };
  if (!asking)
    return (
      <Button ref={again} kind={kind} aria-label={name} onClick={() => setAsking(true)}>
        {act}
      </Button>
    );
  return (
    // biome-ignore lint/a11y/useSemanticElements: a question with its two answers, not a set of fields.
    <span
      role="group"
      aria-label={name ?? act}
      className="inline-flex flex-wrap items-baseline gap-x-4 gap-y-1"
      onKeyDown={(event) => event.key === 'Escape' && setAsking(false)}
    >
      <span>{question}</span>
      <Button ref={first} kind="grave word" disabled={busy} onClick={() => void go()}>
        {yes}
      </Button>
      <Button kind="word" onClick={() => setAsking(false)}>
        Leave it
      </Button>
      {fault !== null && (
        <span role="alert" className="outside">
          {fault}
        </span>
      )}
    </span>
  );
}
