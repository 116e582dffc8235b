import { type KeyboardEvent, type PointerEvent, useRef, useState } from 'react';
import { useNavigate } from 'react-router-dom';
import type { Trend } from '#core/api/runs.ts';
import { useWidth } from '#web/components/use-width.ts';
import { formatTime } from '#web/lib/format-time.ts';
import { linkTo } from '#web/paths.ts';
import { Axes, Stops } from './trend-axes.tsx';
import { layOutTrend, nearestPoint, type PlacedPoint } from './trend-layout.ts';
import { PointLink, VERDICT_WORDS } from './trend-point.tsx';

const NARROW = 560;
/** With more points than this, only those that say something are drawn over the line. */
const DOTS_AT_MOST = 160;

/**
 * One quantity over time: its limits as strong lines, runs with a broken limit as crosses, released runs on the brass
 * fulcrum. One stop for the keyboard: arrows move from run to run, Enter opens it.
 */
export function TrendPicture({ trend, project, title }: { trend: Trend; project: string; title: string }) {
  const frame = useRef<HTMLDivElement>(null);
  const picture = useRef<SVGSVGElement>(null);
  const navigate = useNavigate();
  const width = Math.max(260, useWidth(frame, 1280));
  const at = layOutTrend(trend, width, width < NARROW ? 210 : 250);
  const [chosen, setChosen] = useState<number | null>(null);
  const last = at.points.length - 1;
  const current = Math.min(chosen ?? last, last);

  const onKey = (event: KeyboardEvent) => {
    const step = { ArrowRight: 1, ArrowUp: 1, ArrowLeft: -1, ArrowDown: -1, PageUp: 10, PageDown: -10 }[
      event.key
    ];
    const next =
      event.key === 'Home' ? 0 : event.key === 'End' ? last : step === undefined ? null : current + step;
    if (next === null) return;
    event.preventDefault();
    const place = Math.min(last, Math.max(0, next));
    setChosen(place);
    picture.current?.querySelector<SVGElement>(`[data-point="${place}"]`)?.focus();
  };
  const pointed = (event: PointerEvent | React.MouseEvent) =>
    nearestPoint(at.points, event.clientX - frame.current!.getBoundingClientRect().left);

  return (
    <div ref={frame} className="min-w-0">
      {/* biome-ignore lint/a11y/useSemanticElements: a group of links drawn as a picture */}
      <svg
        ref={picture}
        viewBox={`0 0 ${at.width} ${at.height}`}
        width="100%"
        role="group"
        aria-label={`${title}: ${at.points.length} runs; arrow keys move along the line, Enter opens a run`}
        onKeyDown={onKey}
        onPointerMove={(event) => setChosen(pointed(event))}
      >
        <Axes at={at} />
        <Stops at={at} />
        <path
          d={`M${at.points.map((p) => `${p.x.toFixed(1)} ${p.y.toFixed(1)}`).join('L')}`}
          className="fill-none stroke-ink"
          strokeWidth="1.6"
          strokeLinejoin="round"
        />
        {/* biome-ignore lint/a11y/noStaticElementInteractions: the points are links with keys of their own */}
        <rect
          x={at.left}
          y={0}
          width={Math.max(0, at.right - at.left)}
          height={at.bottom}
          className="cursor-pointer fill-transparent"
          onClick={(event) => navigate(linkTo.run(project, at.points[pointed(event)]!.point.run))}
        />
        {at.points.map((p, i) => (
          <PointLink
            key={p.point.run}
            placed={p}
            index={i}
            project={project}
            head={at.head}
            current={i === current}
            shown={chosen === i}
            dot={at.points.length <= DOTS_AT_MOST || i === 0 || i === last}
            onFocus={() => setChosen(i)}
          />
        ))}
      </svg>
      <p className="soft min-h-[1.5em] text-sm" aria-hidden="true">
        {chosen === null ? '' : <Said placed={at.points[current]!} head={at.head} />}
      </p>
      {at.off.length > 0 && (
        <p className="soft text-sm">
          Too far off to be drawn: {at.off.join('; ')} {at.head}.
        </p>
      )}
    </div>
  );
}

const Said = ({ placed: { point, text }, head }: { placed: PlacedPoint; head: string }) => (
  <>
    <span className="code text-ink">{point.label}</span> · {formatTime(point.at)} ·{' '}
    <span className="code text-ink">{text}</span> {head} · {VERDICT_WORDS[point.verdict]}
    {point.released ? ' · released' : ''}
  </>
);
