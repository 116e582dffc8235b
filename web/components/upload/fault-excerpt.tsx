import { useLayoutEffect, useRef } from 'react';
import { plainText } from '#core/figures/plain-text.ts';

const AROUND = 2;
const CARETS = '^'.repeat(400);

/**
 * Some lines of a file around a fault, numbered, with carets under the faulty text. The carets hang on the text itself,
 * so that they stand under it whatever its characters measure.
 */
export function FaultExcerpt({
  lines,
  line,
  column,
  length,
}: {
  lines: readonly string[] | undefined;
  /** From 1, as `column`, which counts UTF-16 code units. */
  line: number;
  column: number;
  length: number;
}) {
  const region = useRef<HTMLElement>(null);
  // biome-ignore lint/correctness/useExhaustiveDependencies: another fault stands elsewhere in its line.
  useLayoutEffect(() => showBlamed(region.current), [line, column]);
  if (lines?.[line - 1] === undefined) return null;
  const first = Math.max(1, line - AROUND);
  const shown = lines.slice(first - 1, line + AROUND);
  const width = String(first + shown.length - 1).length;
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must take the focus to scroll by keyboard.
    <section ref={region} className="excerpt" tabIndex={0} aria-label={`Line ${line} in its place`}>
      <pre>
        {shown.map((text, i) => {
          const number = first + i;
          return (
            <span key={number} className={number === line ? 'blamed-line' : 'soft'}>
              <span className="soft">{String(number).padStart(width)} | </span>
              {number === line ? <Blamed text={text} column={column} length={length} /> : printable(text)}
            </span>
          );
        })}
      </pre>
    </section>
  );
}

/** Scrolls a narrow region sideways until the faulty text is seen. */
function showBlamed(region: HTMLElement | null): void {
  const blamed = region?.querySelector<HTMLElement>('.blamed');
  if (!region || !blamed) return;
  const past = blamed.getBoundingClientRect().right - region.getBoundingClientRect().right;
  if (past > 0) region.scrollLeft += past + 24;
}

function Blamed({ text, column, length }: { text: string; column: number; length: number }) {
  const from = Math.min(Math.max(0, column - 1), text.length);
  const to = Math.min(text.length, from + Math.max(1, length));
  const blamed = printable(text.slice(from, to));
  return (
    <>
      {printable(text.slice(0, from))}
      <mark className="blamed">
        {blamed === '' ? ' ' : blamed}
        <span className="carets" aria-hidden="true">
          {CARETS}
        </span>
      </mark>
      {printable(text.slice(to))}
    </>
  );
}

const printable = (text: string): string => plainText(text.replaceAll('\t', '    '));
