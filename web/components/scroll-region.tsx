import type { ReactNode } from 'react';

/** A region that scrolls sideways on its own, labelled and reachable by keyboard, for tables and drawings that are wide. */
export function ScrollRegion({
  label,
  keepFirst = false,
  children,
}: {
  label: string;
  /** The first column stands still. */
  keepFirst?: boolean;
  children: ReactNode;
}) {
  return (
    <section
      aria-label={`${label}: table`}
      // biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must take the focus to scroll by keyboard.
      tabIndex={0}
      className={`scroll ${keepFirst ? 'keep-first' : ''}`}
    >
      {children}
    </section>
  );
}
