import { useEffect, useRef } from 'react';
import { plainText } from '#core/figures/index.ts';
import { lineAnchor } from './line-anchor.ts';

/** What is said about one line. */
export interface Remark {
  readonly line: number;
  readonly text: string;
}

/**
 * A text with line numbers, each an anchor. Lines with remarks bear a rule and the remark below.
 *
 * @param wanted the line to come to; it is marked and takes the focus
 */
export function NumberedText({
  path,
  text,
  remarks,
  wanted,
}: {
  path: string;
  text: string;
  remarks: readonly Remark[];
  wanted: number | null;
}) {
  const frame = useRef<HTMLElement>(null);
  useEffect(() => {
    if (wanted === null) return;
    const line = frame.current?.querySelector<HTMLElement>(`[data-line="${wanted}"]`);
    line?.scrollIntoView({ block: 'center' });
    line?.focus({ preventScroll: true });
  }, [wanted]);
  const lines = text.replace(/\n$/, '').split('\n');
  return (
    <section
      ref={frame}
      aria-label={`Text of ${path}`}
      // biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must be reachable by keyboard
      tabIndex={0}
      className="my-2 max-h-[70vh] overflow-auto"
    >
      <pre className="w-max min-w-full">
        {lines.map((line, i) => {
          const number = i + 1;
          const said = remarks.filter((r) => r.line === number);
          const here = wanted === number;
          return (
            <div
              key={number}
              id={lineAnchor({ file: path, line: number })}
              data-line={number}
              tabIndex={-1}
              className={`-outline-offset-2 border-l-[3px] pr-4 ${said.length > 0 ? 'border-outside' : here ? 'border-brass' : 'border-transparent'} ${here || said.length > 0 ? 'bg-paper-deep' : ''}`}
            >
              <span className="soft mr-4 inline-block w-12 select-none text-right">{number}</span>
              {plainText(line.replaceAll('\t', '  '))}
              {said.map((r) => (
                <span key={r.text} className="ml-16 block whitespace-normal font-text text-sm text-outside">
                  {r.text}
                </span>
              ))}
            </div>
          );
        })}
      </pre>
    </section>
  );
}
