import { useRef } from 'react';
import type { Difference, Split } from '#core/difference/index.ts';
import type { DisplayUnits } from '#core/figures/index.ts';
import { useWidth } from '#web/components/use-width.ts';
import type { Attribution, AttributionRow } from './attribution-rows.ts';
import { type Bars, barPieces, scaleBars } from './bar-scale.ts';
import { happenedTo } from './part-words.ts';

const MOST = 15;
const FIGURE = 8.2;

const CLASS: Record<keyof Split, string> = {
  mass: 'fill-ink',
  place: 'fill-brass-fill',
  shapeAndTurn: 'fill-paper',
};
export const CAUSE_WORDS: Record<keyof Split, string> = {
  mass: 'mass',
  place: 'place',
  shapeAndTurn: 'shape and turn',
};

/** A bar for every part that moved the quantity most: ink for mass, brass for place, open for shape and turn. */
export function AttributionBars({
  attribution,
  difference,
  units,
  label,
}: {
  attribution: Attribution;
  difference: Difference;
  units: DisplayUnits;
  label: string;
}) {
  const frame = useRef<HTMLDivElement>(null);
  const width = Math.max(200, useWidth(frame, 900));
  const rows = attribution.rows.filter((r) => r.contribution.status !== 'unchanged').slice(0, MOST);
  const more = attribution.rows.length - rows.length;
  if (rows.length === 0) return null;
  const room = Math.max(...rows.map((r) => r.figures.total.length)) * FIGURE + 18;
  const bars = scaleBars(
    rows.map((r) => r.contribution),
    width,
    room,
  );
  return (
    <figure className="mt-4" aria-label={label}>
      <Legend />
      <div aria-hidden="true" className="mt-3 grid gap-x-4 md:grid-cols-[minmax(9rem,17rem)_minmax(0,1fr)]">
        <div className="max-md:hidden" />
        <div ref={frame} className="h-0" />
        {rows.map((row) => (
          <div
            key={row.path}
            className="col-span-full grid grid-cols-subgrid items-center max-md:block max-md:py-1.5"
          >
            <div className="min-w-0 leading-tight md:py-2 md:text-right">
              <span className="break-words font-semibold">{row.path}</span>
              <span className="soft block text-sm max-md:ml-2 max-md:inline">
                {happenedTo(row.contribution, difference, units)}
              </span>
            </div>
            <Bar row={row} bars={bars} width={width} />
          </div>
        ))}
      </div>
      {more > 0 && (
        <figcaption className="soft mt-1 text-sm">
          The {rows.length} largest are drawn; all {attribution.rows.length} stand in the table.
        </figcaption>
      )}
    </figure>
  );
}

function Bar({ row, bars, width }: { row: AttributionRow; bars: Bars; width: number }) {
  const { pieces, left, right } = barPieces(row.contribution, bars);
  const falls = row.contribution.total < 0;
  return (
    <div className="relative self-stretch content-center">
      <i className="absolute inset-y-0 w-[1.2px] bg-ink" style={{ left: bars.zero - 0.6 }} />
      <svg viewBox={`0 0 ${width} 30`} width="100%" className="relative block" aria-hidden="true">
        {pieces.map(({ cause, x, width: w }) => (
          <rect
            key={cause}
            x={x}
            y={2}
            width={w}
            height={26}
            className={`${CLASS[cause]} stroke-ink`}
            strokeWidth="1"
          />
        ))}
        <text x={falls ? left - 9 : right + 9} y={20} textAnchor={falls ? 'end' : 'start'} className="fig">
          {row.figures.total}
        </text>
      </svg>
    </div>
  );
}

const Legend = () => (
  <ul className="flex flex-wrap gap-x-6 gap-y-1 text-sm">
    {(['mass', 'place', 'shapeAndTurn'] as const).map((cause) => (
      <li key={cause} className="flex items-center gap-2">
        <svg viewBox="0 0 18 14" className="h-3.5 w-[18px]" aria-hidden="true">
          <rect x=".5" y=".5" width="17" height="13" className={`${CLASS[cause]} stroke-ink`} />
        </svg>
        {CAUSE_WORDS[cause]}
      </li>
    ))}
  </ul>
);
