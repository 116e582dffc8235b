import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Trend, TrendQuantity } from '#core/api/runs.ts';
import { trendQuery } from '#web/api/trend.ts';
import { SectionHead } from '#web/components/section-head.tsx';
import { Choice } from '#web/components/sentence/choice.tsx';
import { type HistoryView, QUANTITY_WORDS } from './history-view.ts';
import { scaleOf } from './trend-layout.ts';
import { TrendPicture } from './trend-picture.tsx';
import { TrendTable } from './trend-table.tsx';

const QUANTITIES = (Object.keys(QUANTITY_WORDS) as TrendQuantity[]).map((value) => ({
  value,
  label: QUANTITY_WORDS[value],
}));

/** One quantity over time above the list, with its limits; the same as a table one click away. */
export function TrendSection({
  project,
  view,
  onQuantity,
}: {
  project: string;
  view: HistoryView;
  onQuantity: (quantity: string) => void;
}) {
  const { data: trend } = useQuery({
    ...trendQuery(project, view.filter, view.quantity),
    placeholderData: keepPreviousData,
  });
  if (!trend || trend.points.length === 0) return null;
  const title = `${trend.on === 'predicted' ? 'Predicted' : 'Basic'} ${QUANTITY_WORDS[trend.quantity]}`;
  return (
    <section aria-label="Trend">
      <SectionHead title={title}>
        {scaleOf(trend).head} · {trend.assembly}, {trend.state}
        {trend.of > trend.points.length &&
          ` · ${trend.points.length} of ${trend.of} runs drawn, every extreme among them`}
        {' · show '}
        <span className="sentence text-sm">
          <Choice
            name="quantity of the trend"
            value={view.quantity}
            options={QUANTITIES}
            onChoose={onQuantity}
          />
        </span>
      </SectionHead>
      <TrendPicture trend={trend} project={project} title={title} />
      <Legend trend={trend} />
      <AsTable trend={trend} project={project} title={title} />
    </section>
  );
}

function Legend({ trend }: { trend: Trend }) {
  const outside = trend.points.some((p) => p.verdict === 'outside');
  const released = trend.points.some((p) => p.released);
  if (!outside && !released) return null;
  return (
    <p className="soft flex flex-wrap gap-x-5 text-sm">
      {outside && (
        <span>
          <svg viewBox="0 0 12 12" className="mr-1.5 inline-block size-3 align-[-1px]" aria-hidden="true">
            <path d="M1.5 1.5l9 9m0-9l-9 9" className="stroke-outside" strokeWidth="2" />
          </svg>
          a run with a limit broken
        </span>
      )}
      {released && (
        <span>
          <i aria-hidden="true" className="released" />
          released
        </span>
      )}
    </p>
  );
}

function AsTable({ trend, project, title }: { trend: Trend; project: string; title: string }) {
  const [open, setOpen] = useState(false);
  return (
    <details className="screen-only mt-1 text-sm" onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary className="soft w-max">The same as a table</summary>
      {open && <TrendTable trend={trend} project={project} title={title} />}
    </details>
  );
}
