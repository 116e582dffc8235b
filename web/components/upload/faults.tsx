import type { Fault } from '#web/api/api-problem.ts';
import { SectionHead } from '#web/components/section-head.tsx';
import { FaultExcerpt } from './fault-excerpt.tsx';

/** Faults as the command prints them: code and message, place, the line with carets under what is wrong, how to mend it. */
export function Faults({
  faults,
  texts,
}: {
  faults: readonly Fault[];
  texts: readonly { path: string; text: string }[];
}) {
  const lines = new Map(texts.map(({ path, text }) => [path, text.split(/\r\n|\r|\n/)]));
  return (
    <section aria-labelledby="faults">
      <SectionHead
        title={
          faults.length === 1 ? 'One fault; nothing is kept' : `${faults.length} faults; nothing is kept`
        }
        id="faults"
      >
        mend the files, choose them again, roll up again
      </SectionHead>
      <ol className="faults">
        {faults.map((fault, i) => (
          // biome-ignore lint/suspicious/noArrayIndexKey: faults come as one list that never changes.
          <li key={i}>
            <p>
              <span className="code outside">{fault.code}</span> {fault.message}
            </p>
            {fault.at && (
              <>
                <p className="code soft">
                  {fault.at.file}:{fault.at.line}:{fault.at.column}
                </p>
                <FaultExcerpt
                  lines={lines.get(fault.at.file)}
                  line={fault.at.line}
                  column={fault.at.column}
                  length={fault.length ?? 1}
                />
              </>
            )}
            {fault.hint !== undefined && (
              <p>
                <b>hint:</b> {fault.hint}
              </p>
            )}
          </li>
        ))}
      </ol>
    </section>
  );
}
