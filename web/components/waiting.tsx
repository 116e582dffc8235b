import type { CSSProperties } from 'react';

const WIDTHS = ['62%', '48%', '71%', '55%', '66%', '43%'];

/** Keeps the room of a view that is still loading: rules where its rows will stand. */
export function Waiting({ rows = 6, what = 'Loading' }: { rows?: number; what?: string }) {
  return (
    <div className="waiting" role="status">
      <em className="sr-only">{what}…</em>
      {Array.from({ length: rows }, (_, i) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: the rows are alike and never move.
        <span key={i} aria-hidden="true" style={{ '--w': WIDTHS[i % WIDTHS.length] } as CSSProperties} />
      ))}
    </div>
  );
}
